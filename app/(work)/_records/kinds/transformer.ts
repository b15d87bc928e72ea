import { column, type KindDescription } from '../kind-description'
import { busField, noteField, tagField } from './fields-for-all'

export const transformer: KindDescription = {
  kind: 'transformer',
  one: 'transformer',
  many: 'Transformers',
  empty: 'Add the transformers between the supply and the motors, each with its own rated voltages.',
  sourced: true,
  fields: [
    tagField(),
    busField('from', 'From bus', 'The side with the taps.'),
    busField('to', 'To bus'),
    { kind: 'quantity', name: 'rating', label: 'Rating', quantity: 'apparent-power' },
    { kind: 'quantity', name: 'fromVoltage', label: 'Rated voltage, from side', quantity: 'voltage' },
    { kind: 'quantity', name: 'toVoltage', label: 'Rated voltage, to side', quantity: 'voltage' },
    {
      kind: 'quantity',
      name: 'impedance',
      label: 'Short-circuit impedance',
      quantity: 'ratio',
      hint: 'For example 8 %.',
    },
    { kind: 'quantity', name: 'xOverR', label: 'X/R', quantity: 'ratio' },
    {
      kind: 'quantity',
      name: 'tap',
      label: 'Tap in service',
      quantity: 'ratio',
      initial: '0 %',
      hint: 'On the from side. Positive means more turns there, so less voltage on the to side.',
    },
    {
      kind: 'text',
      name: 'vectorGroup',
      label: 'Vector group',
      optional: true,
      hint: 'For example Dyn11. Transformers in parallel must turn the voltage alike.',
    },
    noteField,
  ],
  columns: [
    column('From', 'from'),
    column('To', 'to'),
    column('Rating', 'rating'),
    column('From side', 'fromVoltage'),
    column('To side', 'toVoltage'),
    column('Impedance', 'impedance'),
    column('X/R', 'xOverR'),
    column('Tap', 'tap'),
    column('Group', 'vectorGroup'),
    column('Note', 'note'),
  ],
}
