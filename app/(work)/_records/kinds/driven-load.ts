import type { Field } from '@/lib/ui/form/field'
import { column, type KindDescription } from '../kind-description'
import { motorField, noteField, tagField } from './fields-for-all'

const powerCurve: readonly Field[] = [
  { kind: 'quantity', name: 'constant', label: 'Torque of the curve at zero speed', quantity: 'torque' },
  { kind: 'quantity', name: 'atRated', label: 'Torque at rated speed', quantity: 'torque' },
  { kind: 'quantity', name: 'ratedSpeed', label: 'Rated speed of the curve', quantity: 'speed' },
  { kind: 'quantity', name: 'exponent', label: 'Exponent', quantity: 'number', initial: '2' },
  {
    kind: 'group',
    name: 'breakaway',
    label: 'Breakaway',
    absent: 'no breakaway torque above the curve',
    hint: 'Straight from this torque at standstill down to the curve.',
    fields: [
      { kind: 'quantity', name: 'torque', label: 'Torque at standstill', quantity: 'torque' },
      { kind: 'quantity', name: 'until', label: 'Back on the curve at', quantity: 'speed' },
    ],
  },
]

const points: Field = {
  kind: 'list',
  name: 'points',
  label: 'Points, straight lines between them',
  item: 'point',
  fields: [
    { kind: 'quantity', name: 'speed', label: 'Speed', quantity: 'speed' },
    { kind: 'quantity', name: 'torque', label: 'Torque', quantity: 'torque' },
  ],
}

const machines = [
  { value: 'radial-pump', label: 'radial pump' },
  { value: 'mixed-flow-pump', label: 'mixed-flow pump' },
  { value: 'axial-pump', label: 'axial pump' },
  { value: 'positive-displacement-pump', label: 'positive-displacement pump' },
  { value: 'fan', label: 'fan' },
  { value: 'compressor', label: 'compressor' },
  { value: 'conveyor', label: 'conveyor' },
  { value: 'mill', label: 'mill' },
  { value: 'other', label: 'other' },
]

export const drivenLoad: KindDescription = {
  kind: 'driven-load',
  one: 'driven load',
  many: 'Driven loads',
  empty: 'Add what each motor turns: its inertia and its torque against speed, one curve a process condition.',
  sourced: true,
  fields: [
    tagField(),
    motorField(),
    { kind: 'choice', name: 'machine', label: 'Machine', options: machines, initial: 'radial-pump' },
    {
      kind: 'list',
      name: 'inertias',
      label: 'Inertias',
      hint: 'Everything the motor turns, each at its own speed.',
      item: 'part',
      fields: [
        { kind: 'text', name: 'part', label: 'Part' },
        { kind: 'quantity', name: 'inertia', label: 'Inertia', quantity: 'inertia' },
        {
          kind: 'quantity',
          name: 'speedRatio',
          label: 'Speed ratio to the motor',
          quantity: 'ratio',
          initial: '1',
          inLine: '',
        },
      ],
    },
    {
      kind: 'list',
      name: 'curves',
      label: 'Load curves',
      item: 'curve',
      identified: true,
      fields: [
        { kind: 'text', name: 'name', label: 'Name', hint: 'The process condition, for example valve closed.' },
        {
          kind: 'variants',
          name: '',
          label: 'Form of the curve',
          tag: 'kind',
          options: [
            { value: 'power', label: 'power of speed', fields: powerCurve },
            { value: 'points', label: 'points', fields: [points] },
          ],
        },
      ],
    },
    noteField,
  ],
  columns: [
    column('Motor', 'motor'),
    column('Machine', 'machine'),
    column('Inertias', 'inertias'),
    column('Curves', 'curves'),
    column('Note', 'note'),
  ],
}
