import type { Field, QuantityField, Variant } from '@/lib/ui/form/field'
import { column, type KindDescription } from '../kind-description'
import { noteField, tagField } from './fields-for-all'

const conditions: readonly Variant[] = [
  {
    value: 'speed',
    label: 'at a speed',
    fields: [{ kind: 'quantity', name: 'at', label: 'Speed at the change-over', quantity: 'speed' }],
  },
  {
    value: 'time',
    label: 'after a time',
    fields: [{ kind: 'quantity', name: 'at', label: 'Time from switching on', quantity: 'time' }],
  },
  {
    value: 'current',
    label: 'when the current has fallen',
    fields: [{ kind: 'quantity', name: 'at', label: 'Line current', quantity: 'current' }],
  },
  {
    value: 'voltage',
    label: 'when the motor’s voltage has risen',
    fields: [{ kind: 'quantity', name: 'at', label: 'Voltage at the motor', quantity: 'voltage' }],
  },
]

const condition = (name: string, label: string, absent?: string): Field => ({
  kind: 'variants',
  name,
  label,
  tag: 'kind',
  options: conditions,
  absent,
})

const changeOver = condition('changeOver', 'Change-over')
const bypass = condition('bypass', 'Bypass', 'none')

const gap: Field = {
  kind: 'quantity',
  name: 'gap',
  label: 'Time without voltage',
  quantity: 'time',
  initial: '0 s',
  hint: '0 s for a closed transition.',
}

const duty: Field = {
  kind: 'text',
  name: 'duty',
  label: 'Permissible duty',
  optional: true,
  hint: 'From the maker, for example 3 starts of 20 s an hour.',
}

const dutyLimits: Field = {
  kind: 'group',
  name: 'dutyLimits',
  label: 'Duty as figures',
  absent: 'not stated',
  hint: 'The start is checked against them.',
  fields: [
    { kind: 'quantity', name: 'secondsPerStart', label: 'Longest time of a start', quantity: 'time', optional: true },
    { kind: 'decimal', name: 'startsPerHour', label: 'Starts an hour', optional: true },
  ],
}

const capacitors: Field = {
  kind: 'list',
  name: 'capacitors',
  label: 'Capacitors switched with the start',
  item: 'capacitor',
  fields: [
    { kind: 'quantity', name: 'power', label: 'Power', quantity: 'reactive-power' },
    { kind: 'quantity', name: 'ratedVoltage', label: 'At rated voltage', quantity: 'voltage' },
    condition('on', 'In', 'with the motor'),
    condition('off', 'Out', 'stays in'),
  ],
}

const ofKind = (
  name: string,
  label: string,
  quantity: QuantityField['quantity'],
  more: Partial<QuantityField> = {},
): QuantityField => ({ kind: 'quantity', name, label, quantity, ...more })

const onPlate = [ofKind('impedance', 'Impedance', 'ratio'), ofKind('rating', 'On rating', 'apparent-power')]

const own: Field = {
  kind: 'group',
  name: 'own',
  label: 'Own impedance',
  absent: 'taken as ideal',
  fields: [...onPlate, ofKind('xOverR', 'X/R', 'ratio')],
}

const middle: Field = {
  kind: 'group',
  name: 'middle',
  label: 'Middle step of a closed transition',
  absent: 'taken as instantaneous',
  fields: [ofKind('reactance', 'Reactance of the series part', 'impedance'), ofKind('time', 'Length', 'time')],
}

const transition: Field = {
  kind: 'group',
  name: 'transition',
  label: 'Transition resistors',
  absent: 'none',
  fields: [ofKind('resistance', 'Resistance', 'impedance'), ofKind('time', 'Length', 'time')],
}

const ramp: Field = {
  kind: 'variants',
  name: 'ramp',
  label: 'Ramp',
  tag: 'kind',
  options: [
    {
      value: 'voltage',
      label: 'of voltage',
      fields: [ofKind('from', 'From', 'ratio'), ofKind('to', 'To', 'ratio', { initial: '100 %' })],
    },
    {
      value: 'torque',
      label: 'of torque',
      fields: [ofKind('from', 'From, of rated torque', 'ratio'), ofKind('to', 'To, of rated torque', 'ratio')],
    },
  ],
}

const kick: Field = {
  kind: 'group',
  name: 'kick',
  label: 'Kick',
  absent: 'none',
  fields: [ofKind('voltage', 'Voltage', 'ratio'), ofKind('time', 'Length', 'time')],
}

const dutyFields = [duty, dutyLimits]

const methods: readonly Variant[] = [
  { value: 'direct', label: 'direct-on-line', fields: [capacitors] },
  {
    value: 'autotransformer',
    label: 'autotransformer',
    fields: [
      ofKind('tap', 'Tap', 'ratio', { hint: 'Motor voltage in parts of the line’s.' }),
      own,
      changeOver,
      gap,
      middle,
      ...dutyFields,
      capacitors,
    ],
  },
  { value: 'star-delta', label: 'star-delta', fields: [changeOver, gap, transition, ...dutyFields, capacitors] },
  {
    value: 'reactor',
    label: 'series reactor',
    fields: [
      ofKind('reactance', 'Reactance a phase', 'impedance'),
      ofKind('resistance', 'Resistance a phase', 'impedance', { optional: true }),
      changeOver,
      ...dutyFields,
      capacitors,
    ],
  },
  {
    value: 'resistor',
    label: 'series resistor',
    fields: [ofKind('resistance', 'Resistance a phase', 'impedance'), changeOver, ...dutyFields, capacitors],
  },
  {
    value: 'soft-starter',
    label: 'soft starter',
    fields: [
      ramp,
      ofKind('rampTime', 'Ramp time', 'time'),
      kick,
      ofKind('currentLimit', 'Current limit', 'current', { optional: true }),
      bypass,
      ...dutyFields,
      capacitors,
    ],
  },
  {
    value: 'part-winding',
    label: 'part winding',
    fields: [
      ofKind('currentShare', 'Share of current', 'ratio', { hint: 'Of the whole winding’s locked-rotor current.' }),
      ofKind('torqueShare', 'Share of torque', 'ratio'),
      ofKind('windingShare', 'Part of the winding', 'ratio', { initial: '50 %' }),
      changeOver,
      ...dutyFields,
      capacitors,
    ],
  },
  {
    value: 'rotor-resistance',
    label: 'rotor resistance (slip rings)',
    fields: [
      {
        kind: 'list',
        name: 'steps',
        label: 'Steps',
        item: 'step',
        hint: 'From the first to the last; then the rings are shorted.',
        fields: [
          ofKind('resistance', 'Added to each rotor phase, referred to the stator', 'impedance'),
          condition('changeOver', 'Until'),
        ],
      },
      ...dutyFields,
      capacitors,
    ],
  },
  {
    value: 'captive-transformer',
    label: 'captive transformer',
    fields: [
      ofKind('primary', 'Primary voltage', 'voltage'),
      ofKind('secondary', 'Secondary voltage', 'voltage'),
      ...onPlate,
      ofKind('xOverR', 'X/R', 'ratio'),
      capacitors,
    ],
  },
  {
    value: 'drive',
    label: 'variable-speed drive',
    fields: [
      ofKind('speed', 'Speed at the end of the ramp', 'speed'),
      ofKind('rampTime', 'Ramp time', 'time'),
      ofKind('motorCurrent', 'Rated current of the motor', 'current'),
      ofKind('magnetising', 'No-load current, of rated', 'ratio'),
      ofKind('efficiency', 'Efficiency of drive and motor', 'ratio'),
      ofKind('displacementFactor', 'Displacement factor', 'ratio'),
      ofKind('totalFactor', 'Total power factor', 'ratio'),
      ofKind('torqueLimit', 'Torque limit, of rated', 'ratio', { optional: true }),
      ofKind('currentLimit', 'Limit of the motor current', 'current', { optional: true }),
      ofKind('undervoltage', 'Undervoltage trip, line voltage', 'voltage', { optional: true }),
      bypass,
      ...dutyFields,
      capacitors,
    ],
  },
]

export const starter: KindDescription = {
  kind: 'starter',
  one: 'starting method',
  many: 'Starting methods',
  empty: 'Add direct-on-line first, then the methods to be compared with it.',
  sourced: true,
  fields: [tagField(), { kind: 'variants', name: '', label: 'Method', tag: 'kind', options: methods }, noteField],
  columns: [
    column('Method', '', 'kind'),
    column('Tap', '', 'tap'),
    column('Own impedance', '', 'own'),
    column('Change-over', '', 'changeOver'),
    column('Gap', '', 'gap'),
    column('Duty', '', 'duty'),
    column('Note', 'note'),
  ],
}
