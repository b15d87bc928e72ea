import { column, type KindDescription } from '../kind-description'
import { busField, noteField, tagField } from './fields-for-all'

export const load: KindDescription = {
  kind: 'load',
  one: 'static load',
  many: 'Static loads',
  empty: 'Add what else is on while the motor starts: heating, lighting, drives, small motors as a mix.',
  sourced: true,
  fields: [
    tagField(),
    busField('bus', 'At bus'),
    { kind: 'quantity', name: 'active', label: 'Active power at rated voltage', quantity: 'active-power' },
    { kind: 'quantity', name: 'reactive', label: 'Reactive power at rated voltage', quantity: 'reactive-power' },
    { kind: 'quantity', name: 'ratedVoltage', label: 'Rated voltage', quantity: 'voltage' },
    {
      kind: 'group',
      name: 'mix',
      label: 'Mix',
      hint: 'The three parts add up to 1. Constant power draws more current the deeper the dip.',
      fields: [
        { kind: 'decimal', name: 'impedance', label: 'Constant impedance', initial: '0.4', inLine: 'Z #' },
        { kind: 'decimal', name: 'current', label: 'Constant current', initial: '0.2', inLine: 'I #' },
        { kind: 'decimal', name: 'power', label: 'Constant power', initial: '0.4', inLine: 'P #' },
      ],
    },
    {
      kind: 'quantity',
      name: 'floor',
      label: 'Floor',
      quantity: 'ratio',
      initial: '0.70',
      hint: 'Below this part of rated voltage the load turns to constant impedance.',
    },
    noteField,
  ],
  columns: [
    column('At bus', 'bus'),
    column('Active', 'active'),
    column('Reactive', 'reactive'),
    column('Rated voltage', 'ratedVoltage'),
    column('Mix Z, I, P', 'mix'),
    column('Floor', 'floor'),
    column('Note', 'note'),
  ],
}
