import type { Field } from '@/lib/ui/form/field'
import { column, type KindDescription } from '../kind-description'
import { motorField, noteField, tagField } from './fields-for-all'

const breakaway: Field = {
  kind: 'group',
  name: 'breakaway',
  label: 'Breakaway',
  absent: 'no breakaway torque above the curve',
  hint: 'Straight from this torque at standstill down to the curve.',
  fields: [
    { kind: 'quantity', name: 'torque', label: 'Torque at standstill', quantity: 'torque' },
    { kind: 'quantity', name: 'until', label: 'Back on the curve at', quantity: 'speed' },
  ],
}

const powerCurve: readonly Field[] = [
  { kind: 'quantity', name: 'constant', label: 'Torque of the curve at zero speed', quantity: 'torque' },
  { kind: 'quantity', name: 'atRated', label: 'Torque at rated speed', quantity: 'torque' },
  { kind: 'quantity', name: 'ratedSpeed', label: 'Rated speed of the curve', quantity: 'speed' },
  { kind: 'quantity', name: 'exponent', label: 'Exponent', quantity: 'number', initial: '2' },
  breakaway,
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

const active: Field = {
  kind: 'flag',
  name: 'active',
  label: 'The load may drive the shaft',
  hint: 'An inclined conveyor, a pump that spins back: torques keep their sign below zero speed.',
}

const shutPump: readonly Field[] = [
  { kind: 'quantity', name: 'friction', label: 'Torque at zero speed', quantity: 'torque' },
  { kind: 'quantity', name: 'shut', label: 'Torque at rated speed, valve shut', quantity: 'torque' },
  { kind: 'quantity', name: 'ratedSpeed', label: 'Rated speed of the curve', quantity: 'speed' },
  breakaway,
]

const openPump: readonly Field[] = [
  ...shutPump,
  { kind: 'quantity', name: 'staticHead', label: 'Static head', quantity: 'length' },
  { kind: 'quantity', name: 'shutHead', label: 'Head at rated speed, valve shut', quantity: 'length' },
  { ...points, label: 'Points once the check valve is open' },
]

const constantPower: readonly Field[] = [
  { kind: 'quantity', name: 'power', label: 'Power', quantity: 'active-power' },
  { kind: 'quantity', name: 'from', label: 'From speed', quantity: 'speed' },
  { kind: 'quantity', name: 'standstill', label: 'Torque at standstill', quantity: 'torque', optional: true },
]

const formula: readonly Field[] = [
  {
    kind: 'text',
    name: 'formula',
    label: 'Torque in N·m',
    hint: 'From n (r/min) or x (n over rated speed), for example 100 + 800*x^2; abs, sqrt, exp, ln, sin, cos, min, max.',
  },
  { kind: 'quantity', name: 'ratedSpeed', label: 'Rated speed of the curve', quantity: 'speed' },
  { kind: 'quantity', name: 'from', label: 'From speed', quantity: 'speed', optional: true },
  { kind: 'quantity', name: 'upTo', label: 'Up to speed', quantity: 'speed' },
  active,
]

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
      name: 'inertiaConstants',
      label: 'Inertia constants',
      hint: 'Parts stated by H: energy at rated motor speed over power.',
      item: 'part',
      fields: [
        { kind: 'text', name: 'part', label: 'Part' },
        { kind: 'quantity', name: 'constant', label: 'H', quantity: 'time' },
        { kind: 'quantity', name: 'power', label: 'On power', quantity: 'apparent-power' },
      ],
    },
    {
      kind: 'group',
      name: 'gear',
      label: 'Gear',
      absent: 'curves at the motor shaft',
      hint: 'The curves stand at the load behind the gear.',
      fields: [
        { kind: 'quantity', name: 'speedRatio', label: 'Load speed over motor speed', quantity: 'ratio' },
        { kind: 'quantity', name: 'efficiency', label: 'Efficiency', quantity: 'ratio', optional: true },
      ],
    },
    {
      kind: 'text',
      name: 'shaft',
      label: 'Shared shaft',
      optional: true,
      hint: 'Loads with the same name here are turned by their motors together.',
    },
    {
      kind: 'decimal',
      name: 'startsPerHour',
      label: 'Starts an hour that the process allows',
      optional: true,
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
            { value: 'points', label: 'points', fields: [points, active] },
            { value: 'pump-closed', label: 'pump, valve shut', fields: shutPump },
            { value: 'pump-open', label: 'pump against a static head', fields: openPump },
            { value: 'constant-power', label: 'constant power', fields: constantPower },
            { value: 'formula', label: 'formula', fields: formula },
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
