import { column, type KindDescription } from '../kind-description'
import { motorField, noteField, tagField } from './fields-for-all'

export const schedule: KindDescription = {
  kind: 'schedule',
  one: 'start schedule',
  many: 'Start schedules',
  empty: 'Say which motor starts, when, and by which method.',
  sourced: false,
  fields: [
    tagField(),
    {
      kind: 'list',
      name: 'starts',
      label: 'Starts',
      item: 'start',
      fields: [
        motorField(),
        { kind: 'reference', name: 'starter', label: 'Starting method', to: 'starter' },
        { kind: 'quantity', name: 'at', label: 'Switched on at', quantity: 'time', initial: '0 s', inLine: 'at #' },
      ],
    },
    noteField,
  ],
  columns: [column('Starts', 'starts'), column('Note', 'note')],
}
