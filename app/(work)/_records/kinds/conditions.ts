import { column, type KindDescription } from '../kind-description'
import { motorField, noteField, tagField } from './fields-for-all'

export const plantCondition: KindDescription = {
  kind: 'plant-condition',
  one: 'plant condition',
  many: 'Plant conditions',
  empty: 'Say what runs before the start: usually one condition with nothing running and one with all others running.',
  sourced: false,
  fields: [
    tagField(),
    {
      kind: 'list',
      name: 'running',
      label: 'Running motors',
      hint: 'Solved as motors, with the load curve they run on.',
      item: 'running motor',
      fields: [motorField(), { kind: 'reference', name: 'curve', label: 'Load curve', to: 'curve', within: 'motor' }],
    },
    { kind: 'references', name: 'capacitors', label: 'Capacitor banks in service', to: 'capacitor' },
    { kind: 'references', name: 'loadsOff', label: 'Static loads switched off', to: 'load' },
    {
      kind: 'list',
      name: 'taps',
      label: 'Taps that differ from the record',
      item: 'tap',
      fields: [
        { kind: 'reference', name: 'transformer', label: 'Transformer', to: 'transformer' },
        { kind: 'quantity', name: 'tap', label: 'Tap', quantity: 'ratio' },
      ],
    },
    noteField,
  ],
  columns: [
    column('Running', 'running'),
    column('Capacitors in service', 'capacitors'),
    column('Loads off', 'loadsOff'),
    column('Taps', 'taps'),
    column('Note', 'note'),
  ],
}

export const loadCondition: KindDescription = {
  kind: 'load-condition',
  one: 'load condition',
  many: 'Load conditions',
  empty: 'Say on which curve each driven load starts, and on which it runs once the process is on.',
  sourced: false,
  fields: [
    tagField(),
    {
      kind: 'list',
      name: 'curves',
      label: 'Curves',
      item: 'driven load',
      fields: [
        motorField(),
        { kind: 'reference', name: 'starting', label: 'Curve while starting', to: 'curve', within: 'motor' },
        {
          kind: 'reference',
          name: 'process',
          label: 'Curve once the process is on',
          to: 'curve',
          within: 'motor',
          optional: true,
        },
      ],
    },
    noteField,
  ],
  columns: [column('Curves', 'curves'), column('Note', 'note')],
}
