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
        {
          kind: 'group',
          name: 'after',
          label: 'Waits for another start',
          absent: 'at its instant',
          hint: 'Switched on once that motor has started; the instant above is then the earliest.',
          fields: [
            motorField(),
            { kind: 'quantity', name: 'interval', label: 'At least so long after it', quantity: 'time' },
          ],
        },
        {
          kind: 'quantity',
          name: 'initialSpeed',
          label: 'Speed before the start',
          quantity: 'speed',
          optional: true,
          hint: 'Negative where the load turns the shaft backwards; near synchronous for a generator that is switched in.',
        },
        {
          kind: 'list',
          name: 'attempts',
          label: 'Attempts before',
          item: 'attempt',
          hint: 'Failed or repeated starts: switched off after a time, then at rest before the next.',
          fields: [
            { kind: 'quantity', name: 'runFor', label: 'Switched off after', quantity: 'time' },
            { kind: 'quantity', name: 'rest', label: 'Rest before the next', quantity: 'time' },
          ],
        },
      ],
    },
    {
      kind: 'group',
      name: 'disturbance',
      label: 'Dip or transfer of the supply',
      absent: 'none',
      hint: 'Running motors slow down and re-accelerate; 0 % takes the plant off its supply.',
      fields: [
        { kind: 'quantity', name: 'at', label: 'Begin', quantity: 'time', initial: '0 s' },
        { kind: 'quantity', name: 'duration', label: 'Length', quantity: 'time' },
        { kind: 'quantity', name: 'remaining', label: 'What remains of the voltage', quantity: 'ratio' },
        {
          kind: 'group',
          name: 'to',
          label: 'Transfer to another supply',
          absent: 'the first one comes back',
          hint: 'It stands at the same bus and waits unloaded at its stated voltage; nothing remains in between: 0 %.',
          fields: [
            { kind: 'reference', name: 'supply', label: 'Supply condition', to: 'supply' },
            { kind: 'decimal', name: 'angle', label: 'Its voltage leads by, degrees' },
          ],
        },
        {
          kind: 'quantity',
          name: 'decayTime',
          label: 'Decay of the residual voltage',
          quantity: 'time',
          optional: true,
          hint: 'A return before it is not assessed.',
        },
      ],
    },
    {
      kind: 'list',
      name: 'contactors',
      label: 'Contactors',
      item: 'contactor',
      hint: 'Motors without one stay connected whatever the voltage; that of a started motor ends its start.',
      fields: [
        motorField(),
        { kind: 'quantity', name: 'dropOut', label: 'Drops out below, of rated voltage', quantity: 'ratio' },
        { kind: 'quantity', name: 'delay', label: 'After', quantity: 'time' },
        {
          kind: 'group',
          name: 'reclose',
          label: 'Closes again',
          absent: 'stays open',
          fields: [
            { kind: 'quantity', name: 'above', label: 'Above, of rated voltage', quantity: 'ratio' },
            { kind: 'quantity', name: 'delay', label: 'After', quantity: 'time' },
          ],
        },
      ],
    },
    noteField,
  ],
  columns: [
    column('Starts', 'starts'),
    column('Dip', 'disturbance'),
    column('Contactors', 'contactors'),
    column('Note', 'note'),
  ],
}
