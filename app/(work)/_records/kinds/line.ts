import { column, type KindDescription } from '../kind-description'
import { busField, noteField, tagField } from './fields-for-all'

export const line: KindDescription = {
  kind: 'line',
  one: 'cable or line',
  many: 'Cables and lines',
  empty: 'Add the cables and lines with their resistance and reactance per length.',
  sourced: true,
  fields: [
    tagField(),
    {
      kind: 'choice',
      name: 'kind',
      label: 'Kind',
      initial: 'cable',
      options: [
        { value: 'cable', label: 'cable' },
        { value: 'overhead', label: 'overhead line' },
      ],
    },
    busField('from', 'From bus'),
    busField('to', 'To bus'),
    {
      kind: 'quantity',
      name: 'resistance',
      label: 'Resistance per length',
      quantity: 'impedance-per-length',
      hint: 'One conductor, at its working temperature.',
    },
    { kind: 'quantity', name: 'reactance', label: 'Reactance per length', quantity: 'impedance-per-length' },
    {
      kind: 'quantity',
      name: 'susceptance',
      label: 'Susceptance per length',
      quantity: 'susceptance-per-length',
      optional: true,
      hint: 'Left empty, charging is not counted.',
    },
    { kind: 'quantity', name: 'length', label: 'Length', quantity: 'length' },
    { kind: 'whole', name: 'parallel', label: 'Conductors in parallel', initial: '1' },
    noteField,
  ],
  columns: [
    column('Kind', 'kind'),
    column('From', 'from'),
    column('To', 'to'),
    column('Resistance', 'resistance'),
    column('Reactance', 'reactance'),
    column('Length', 'length'),
    column('Parallel', 'parallel'),
    column('Note', 'note'),
  ],
}
