import type { Field, Variant } from '@/lib/ui/form/field'
import { column, type KindDescription } from '../kind-description'
import { motorField, tagField } from './fields-for-all'

const factor = (name: string, label: string, hint: string): Field => ({
  kind: 'quantity',
  name,
  label,
  quantity: 'ratio',
  hint,
})

const changes: readonly Variant[] = [
  {
    value: 'voltage-before',
    label: 'voltage before the start',
    fields: [{ kind: 'quantity', name: 'voltage', label: 'Line voltage', quantity: 'voltage' }],
  },
  {
    value: 'voltage-factor',
    label: 'voltage factor inside the level',
    fields: [factor('value', 'Voltage factor', 'For example 1.10.')],
  },
  {
    value: 'transformer-impedance',
    label: 'transformer impedance',
    fields: [
      { kind: 'reference', name: 'transformer', label: 'Transformer', to: 'transformer' },
      factor('impedance', 'Short-circuit impedance', 'For example 8.8 %.'),
    ],
  },
  {
    value: 'motor-admittance',
    label: 'all admittances of a motor',
    fields: [motorField(), factor('factor', 'Multiplied by', '1.2 is a locked-rotor current 20 % higher.')],
  },
  {
    value: 'motor-torque',
    label: 'torque of a motor',
    fields: [motorField(), factor('factor', 'Multiplied by', '0.85 is a torque 15 % lower.')],
  },
  {
    value: 'inertia',
    label: 'inertia of a drive',
    fields: [motorField(), factor('factor', 'Multiplied by', '1.1 is an inertia 10 % higher.')],
  },
]

/** The study's cases; not a word of the language, so the name says what it is. */
export const studyCase: KindDescription = {
  kind: 'case',
  one: 'case',
  many: 'Cases',
  empty: 'Add the weakest supply with all others running, direct-on-line; then the first start, and the other methods.',
  sourced: false,
  fields: [
    tagField(),
    {
      kind: 'choice',
      name: 'role',
      label: 'What it is for',
      initial: 'design',
      hint: 'Design cases count in the verdict; the others are shown beside it.',
      options: [
        { value: 'design', label: 'design' },
        { value: 'sensitivity', label: 'sensitivity' },
        { value: 'comparison', label: 'comparison' },
      ],
    },
    { kind: 'reference', name: 'supply', label: 'Supply condition', to: 'supply' },
    { kind: 'reference', name: 'plantCondition', label: 'Plant condition', to: 'plant-condition' },
    { kind: 'reference', name: 'schedule', label: 'Start schedule', to: 'schedule' },
    { kind: 'reference', name: 'loadCondition', label: 'Load condition', to: 'load-condition' },
    {
      kind: 'choice',
      name: 'model',
      label: 'Model of the machines',
      initial: 'quasi-static',
      hint: 'Fifth order takes one direct start; a machine switched on near synchronous speed is computed so in any case.',
      options: [
        { value: 'quasi-static', label: 'quasi-static' },
        { value: 'third-order', label: 'third order: rotor fluxes of every machine' },
        { value: 'fifth-order', label: 'fifth order: the started machine with its stator' },
      ],
    },
    {
      kind: 'quantity',
      name: 'switchingAngle',
      label: 'Switching angle, degrees',
      quantity: 'number',
      optional: true,
      hint: 'Of the voltage of phase a, for the fifth order; empty for the worst.',
    },
    {
      kind: 'list',
      name: 'changes',
      label: 'Departures from the records',
      item: 'change',
      fields: [{ kind: 'variants', name: '', label: 'What differs', tag: 'kind', options: changes }],
    },
    {
      kind: 'text',
      name: 'reason',
      label: 'Why this case',
      lines: 2,
      optional: true,
      hint: 'Needed for a sensitivity.',
    },
  ],
  columns: [
    column('Role', 'role'),
    column('Supply', 'supply'),
    column('Plant condition', 'plantCondition'),
    column('Start schedule', 'schedule'),
    column('Load condition', 'loadCondition'),
    column('Model', 'model'),
    column('Departures', 'changes'),
  ],
}
