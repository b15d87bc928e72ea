import { column, type KindDescription } from '../kind-description'
import { busField, noteField, tagField } from './fields-for-all'
import { generatorForm } from './generator'

const levelForms = [
  {
    value: 'power',
    label: 'power, S_k',
    fields: [
      { kind: 'quantity' as const, name: 'power', label: 'Short-circuit power', quantity: 'apparent-power' as const },
    ],
  },
  {
    value: 'current',
    label: 'current, I_k',
    fields: [
      { kind: 'quantity' as const, name: 'current', label: 'Short-circuit current', quantity: 'current' as const },
    ],
  },
  {
    value: 'impedance',
    label: 'impedance, R + jX',
    fields: [
      { kind: 'quantity' as const, name: 'resistance', label: 'Source resistance R', quantity: 'impedance' as const },
      { kind: 'quantity' as const, name: 'reactance', label: 'Source reactance X', quantity: 'impedance' as const },
    ],
  },
  generatorForm,
]

const voltageField = { kind: 'quantity' as const, name: 'voltage', label: 'Line voltage', quantity: 'voltage' as const }

export const supply: KindDescription = {
  kind: 'supply',
  one: 'supply condition',
  many: 'Supply conditions',
  empty:
    'Enter the weakest supply first, from the utility’s letter: short-circuit level, X/R, voltage before the start.',
  sourced: true,
  fields: [
    tagField('For example weakest, usual, strongest.'),
    busField('bus', 'At bus'),
    { kind: 'text', name: 'meaning', label: 'State of the utility’s network', optional: true },
    { kind: 'variants', name: 'level', label: 'Short-circuit level, or generator', tag: 'form', options: levelForms },
    {
      kind: 'quantity',
      name: 'xOverR',
      label: 'X/R',
      quantity: 'ratio',
      optional: true,
      hint: 'Needed with a level in MVA or kA; there is no default. An impedance or generator carries its own.',
    },
    {
      kind: 'quantity',
      name: 'statedAt',
      label: 'Voltage the level was stated at',
      quantity: 'voltage',
      hint: 'Of a generator: its rated voltage.',
    },
    {
      kind: 'variants',
      name: 'voltageFactor',
      label: 'Voltage factor c inside the level',
      tag: 'kind',
      options: [
        { value: 'unknown', label: 'unknown: computed as 1.00, listed as assumed', fields: [] },
        { value: '1.00', label: '1.00', fields: [] },
        { value: '1.10', label: '1.10', fields: [] },
        {
          value: 'other',
          label: 'other',
          fields: [{ kind: 'quantity', name: 'value', label: 'Voltage factor', quantity: 'ratio' }],
        },
      ],
    },
    {
      kind: 'choice',
      name: 'instant',
      label: 'Instant of the level',
      initial: 'unknown',
      options: [
        { value: 'initial', label: 'initial value' },
        { value: 'transient', label: 'transient value' },
        { value: 'steady', label: 'steady value' },
        { value: 'unknown', label: 'not stated' },
      ],
    },
    {
      kind: 'choice',
      name: 'plantMotorsIncluded',
      label: 'This plant’s motors in the level',
      initial: 'unknown',
      options: [
        { value: 'no', label: 'not included' },
        { value: 'yes', label: 'included; taken out before the run' },
        { value: 'unknown', label: 'not stated' },
      ],
    },
    {
      kind: 'variants',
      name: 'before',
      label: 'Voltage before the start',
      tag: 'kind',
      options: [
        { value: 'bus-voltage', label: 'at the bus, running load on, starters off', fields: [voltageField] },
        { value: 'open-circuit', label: 'open-circuit voltage of the source', fields: [voltageField] },
      ],
    },
    { kind: 'date', name: 'date', label: 'Date of the letter' },
    { kind: 'text', name: 'letter', label: 'Letter', optional: true },
    noteField,
  ],
  columns: [
    column('At bus', 'bus'),
    column('Level', 'level'),
    column('X/R', 'xOverR'),
    column('Stated at', 'statedAt'),
    column('c', 'voltageFactor'),
    column('Before the start', 'before'),
    column('Letter', 'letter'),
    column('Date', 'date'),
    column('State of the network', 'meaning'),
  ],
}
