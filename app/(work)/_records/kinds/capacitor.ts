import { column, type KindDescription } from '../kind-description'
import { busField, noteField, tagField } from './fields-for-all'

export const capacitor: KindDescription = {
  kind: 'capacitor',
  one: 'capacitor bank',
  many: 'Capacitor banks',
  empty: 'Add the capacitor banks; the plant condition says which are in service.',
  sourced: true,
  fields: [
    tagField(),
    busField('bus', 'At bus'),
    {
      kind: 'quantity',
      name: 'rating',
      label: 'Rating',
      quantity: 'reactive-power',
      hint: 'At the rated voltage below.',
    },
    { kind: 'quantity', name: 'ratedVoltage', label: 'Rated voltage', quantity: 'voltage' },
    noteField,
  ],
  columns: [
    column('At bus', 'bus'),
    column('Rating', 'rating'),
    column('Rated voltage', 'ratedVoltage'),
    column('Note', 'note'),
  ],
}
