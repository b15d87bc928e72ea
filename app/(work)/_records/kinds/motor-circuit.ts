import type { Field, VariantsField } from '@/lib/ui/form/field'

const cage = (name: string, label: string): Field => ({
  kind: 'group',
  name,
  label,
  fields: [
    { kind: 'decimal', name: 'r', label: 'Resistance' },
    { kind: 'decimal', name: 'x', label: 'Leakage reactance' },
  ],
})

const common: readonly Field[] = [
  {
    kind: 'variants',
    name: 'scale',
    label: 'Unit of the numbers',
    tag: 'unit',
    options: [
      {
        value: 'pu',
        label: 'per unit on a base power, rated voltage',
        fields: [{ kind: 'quantity', name: 'base', label: 'Base power', quantity: 'apparent-power' }],
      },
      { value: 'ohm', label: 'ohm per phase', fields: [] },
    ],
  },
  {
    kind: 'group',
    name: 'stator',
    label: 'Stator',
    fields: [
      { kind: 'decimal', name: 'r', label: 'Resistance' },
      { kind: 'decimal', name: 'x', label: 'Leakage reactance' },
    ],
  },
  { kind: 'decimal', name: 'magnetising', label: 'Magnetising reactance' },
  {
    kind: 'decimal',
    name: 'core',
    label: 'Core-loss resistance',
    optional: true,
    hint: 'Beside the magnetising reactance; empty leaves it out.',
  },
]

const source: Field = { kind: 'source', name: 'provenance', label: 'Source of the circuit' }

/** How a curve runs between its points. */
export const interpolationField = (name: string): Field => ({
  kind: 'choice',
  name,
  label: 'Between points',
  initial: 'linear',
  options: [
    { value: 'linear', label: 'straight' },
    { value: 'monotone', label: 'a cubic that never turns' },
  ],
})

/** Torque that replaces the circuit's. */
export const torquePointsField: Field = {
  kind: 'list',
  name: 'torquePoints',
  label: 'Torque curve of the maker',
  item: 'point',
  hint: 'At rated voltage, from standstill on; the circuit then gives current and power factor alone. Without points the circuit gives the torque too. Needed where a pull-up torque is declared.',
  fields: [
    { kind: 'quantity', name: 'speed', label: 'Speed', quantity: 'speed' },
    { kind: 'quantity', name: 'torque', label: 'Torque', quantity: 'torque' },
  ],
}

/** Powers of the voltage that current and torque follow. */
export const saturationField: Field = {
  kind: 'group',
  name: 'saturation',
  label: 'Leakage saturation',
  absent: 'none: current with the voltage, torque with its square',
  fields: [
    { kind: 'decimal', name: 'current', label: 'Power of the voltage for the current', hint: 'Typical 1.05 to 1.15.' },
    { kind: 'decimal', name: 'torque', label: 'Power of the voltage for the torque', hint: 'Typical 2.1 to 2.3.' },
  ],
}

/** Typed parameters, or estimated from the nameplate whenever the study is computed. */
export const circuitField: VariantsField = {
  kind: 'variants',
  name: 'circuit',
  label: 'Equivalent circuit',
  hint: 'Estimated: parameters and what is left over stand with the results once the study is computed.',
  tag: 'kind',
  options: [
    { value: 'estimated', label: 'estimated from the nameplate', fields: [] },
    { value: 'single-cage', label: 'single cage, typed', fields: [...common, cage('cage', 'Rotor cage'), source] },
    {
      value: 'double-cage',
      label: 'double cage, typed',
      fields: [...common, cage('inner', 'Inner cage'), cage('outer', 'Outer cage'), source],
    },
    {
      value: 'deep-bar',
      label: 'deep bars, linear in slip, typed',
      fields: [...common, cage('cage', 'Cage at synchronous speed'), cage('locked', 'Cage at standstill'), source],
    },
    {
      value: 'slot-bar',
      label: 'deep bars by their depth, typed',
      fields: [
        ...common,
        cage('cage', 'Cage at synchronous speed'),
        {
          kind: 'decimal',
          name: 'depth',
          label: 'Reduced depth at standstill',
          hint: 'Height of a bar in parts of the depth to which the current penetrates at line frequency.',
        },
        { kind: 'decimal', name: 'slotShare', label: 'Part of the cage reactance in the slot' },
        source,
      ],
    },
    {
      value: 'table',
      label: 'curves of the maker',
      fields: [
        {
          kind: 'list',
          name: 'points',
          label: 'Points at rated voltage, from standstill on',
          item: 'point',
          fields: [
            { kind: 'quantity', name: 'speed', label: 'Speed', quantity: 'speed' },
            { kind: 'quantity', name: 'torque', label: 'Torque', quantity: 'torque' },
            { kind: 'quantity', name: 'current', label: 'Current', quantity: 'current' },
            { kind: 'quantity', name: 'powerFactor', label: 'Power factor', quantity: 'ratio' },
          ],
        },
        interpolationField('interpolation'),
      ],
    },
  ],
}
