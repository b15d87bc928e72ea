import { column, type KindDescription } from '../kind-description'
import { noteField, tagField } from './fields-for-all'

export const bus: KindDescription = {
  kind: 'bus',
  one: 'bus',
  many: 'Buses',
  empty: 'Add the bus at the point of common coupling first, then those down to the motor terminals.',
  sourced: true,
  fields: [
    tagField(),
    { kind: 'text', name: 'name', label: 'Name', optional: true },
    {
      kind: 'quantity',
      name: 'nominal',
      label: 'Nominal voltage',
      quantity: 'voltage',
      hint: 'Line to line. Ratings elsewhere convert with their own voltages, never with this one.',
    },
    noteField,
  ],
  columns: [column('Name', 'name'), column('Nominal voltage', 'nominal'), column('Note', 'note')],
}
