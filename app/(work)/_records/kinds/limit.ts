import type { Field } from '@/lib/ui/form/field'
import { column, type KindDescription } from '../kind-description'
import { noteField } from './fields-for-all'

const appliesTo: Field = {
  kind: 'group',
  name: 'appliesTo',
  label: 'Applies to',
  fields: [
    { kind: 'references', name: 'supplies', label: 'Supply conditions', to: 'supply', all: 'every supply' },
    {
      kind: 'references',
      name: 'plantConditions',
      label: 'Plant conditions',
      to: 'plant-condition',
      all: 'every condition',
    },
    {
      kind: 'references',
      name: 'methods',
      label: 'Starting methods',
      to: 'method',
      all: 'every method',
      options: [
        { value: 'direct', label: 'direct-on-line' },
        { value: 'autotransformer', label: 'autotransformer' },
        { value: 'star-delta', label: 'star-delta' },
        { value: 'reactor', label: 'series reactor' },
        { value: 'resistor', label: 'series resistor' },
        { value: 'soft-starter', label: 'soft starter' },
        { value: 'part-winding', label: 'part winding' },
        { value: 'rotor-resistance', label: 'rotor resistance' },
        { value: 'captive-transformer', label: 'captive transformer' },
        { value: 'drive', label: 'variable-speed drive' },
      ],
    },
    { kind: 'references', name: 'motors', label: 'Motors', to: 'motor', all: 'every motor' },
  ],
}

const startClass: Field = {
  kind: 'group',
  name: 'startClass',
  label: 'Class of starts',
  absent: 'whatever the number of starts',
  hint: 'A rule whose class is not in use is shown and does not count.',
  fields: [
    { kind: 'decimal', name: 'moreThanPerDay', label: 'More than a day', optional: true, inLine: 'more than # a day' },
    { kind: 'decimal', name: 'atMostPerDay', label: 'At most a day', optional: true, inLine: 'at most # a day' },
    {
      kind: 'decimal',
      name: 'moreThanPerHour',
      label: 'More than an hour',
      optional: true,
      inLine: 'more than # an hour',
    },
    { kind: 'decimal', name: 'atMostPerHour', label: 'At most an hour', optional: true, inLine: 'at most # an hour' },
  ],
}

const limitForms: Field = {
  kind: 'variants',
  name: 'limit',
  label: 'Limit',
  tag: 'kind',
  options: [
    {
      value: 'ratio',
      label: 'a ratio',
      fields: [{ kind: 'quantity', name: 'value', label: 'Limit value', quantity: 'ratio' }],
    },
    {
      value: 'time',
      label: 'a time',
      fields: [{ kind: 'quantity', name: 'value', label: 'Limit value', quantity: 'time' }],
    },
    {
      value: 'envelope',
      label: 'an envelope of change against time',
      fields: [
        {
          kind: 'list',
          name: 'steps',
          label: 'Steps',
          hint: 'From each time after switching on, until the next step.',
          item: 'step',
          fields: [
            { kind: 'quantity', name: 'from', label: 'From', quantity: 'time' },
            { kind: 'quantity', name: 'value', label: 'Limit from there', quantity: 'ratio' },
          ],
        },
      ],
    },
  ],
}

export const limit: KindDescription = {
  kind: 'limit',
  one: 'limit',
  many: 'Limits sheet',
  empty: 'Type the rules that the utility, the standards and the owner set, each with its document and clause.',
  sourced: true,
  fields: [
    { kind: 'text', name: 'tag', label: 'Number', hint: 'For example R1.' },
    {
      kind: 'variants',
      name: 'place',
      label: 'Place',
      tag: 'kind',
      options: [
        { value: 'bus', label: 'one bus', fields: [{ kind: 'reference', name: 'bus', label: 'Bus', to: 'bus' }] },
        { value: 'every-bus', label: 'every bus', fields: [] },
        { value: 'starting-motors', label: 'terminals or shaft of a starting motor', fields: [] },
        { value: 'running-motors', label: 'terminals of a running motor', fields: [] },
      ],
    },
    {
      kind: 'choice',
      name: 'quantity',
      label: 'Quantity',
      initial: 'voltage-change',
      options: [
        { value: 'voltage-change', label: 'voltage change' },
        { value: 'remaining-voltage', label: 'remaining voltage' },
        { value: 'highest-voltage', label: 'highest voltage' },
        { value: 'run-up-time', label: 'run-up time' },
        { value: 'accelerating-torque', label: 'least accelerating torque' },
        { value: 'heat-used', label: 'heat used' },
        { value: 'flicker-short-term', label: 'short-term flicker Pst' },
        { value: 'flicker-long-term', label: 'long-term flicker Plt' },
        { value: 'trip-margin', label: 'time the relay leaves a start' },
        { value: 'thermal-margin', label: 'permissible time less time to trip' },
      ],
    },
    {
      kind: 'choice',
      name: 'instant',
      label: 'Instant',
      initial: 'deepest',
      options: [
        { value: 'first', label: 'at switching on' },
        { value: 'deepest', label: 'deepest over the whole run' },
        { value: 'settled-after-start', label: 'settled after the start' },
        { value: 'settled-after-process', label: 'settled with the process on' },
      ],
    },
    {
      kind: 'choice',
      name: 'reference',
      label: 'Reference',
      initial: 'before',
      options: [
        { value: 'before', label: 'of the voltage before the start' },
        { value: 'nominal', label: 'of nominal voltage' },
        { value: 'rated', label: 'of the motor’s rating' },
      ],
    },
    limitForms,
    appliesTo,
    startClass,
    { kind: 'text', name: 'document', label: 'Document', optional: true },
    { kind: 'text', name: 'clause', label: 'Clause', optional: true },
    { kind: 'text', name: 'edition', label: 'Edition', optional: true },
    { kind: 'flag', name: 'verify', label: 'Still to be verified against the edition in force', initial: true },
    noteField,
  ],
  columns: [
    column('Place', 'place'),
    column('Quantity', 'quantity'),
    column('Instant', 'instant'),
    column('Reference', 'reference'),
    column('Limit', 'limit'),
    column('Methods', 'appliesTo', 'methods'),
    column('Class of starts', 'startClass'),
    column('Document', 'document'),
    column('Clause', 'clause'),
    column('To verify', 'verify'),
  ],
}
