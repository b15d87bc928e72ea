import type { Field, Variant } from '@/lib/ui/form/field'

const elements: readonly Variant[] = [
  {
    value: 'inverse',
    label: 'inverse-time overcurrent',
    fields: [
      {
        kind: 'choice',
        name: 'curve',
        label: 'Curve',
        initial: 'extremely-inverse',
        options: [
          { value: 'normal-inverse', label: 'IEC normal inverse' },
          { value: 'very-inverse', label: 'IEC very inverse' },
          { value: 'extremely-inverse', label: 'IEC extremely inverse' },
          { value: 'short-time-inverse', label: 'IEC short-time inverse' },
          { value: 'long-time-inverse', label: 'IEC long-time inverse' },
          { value: 'moderately-inverse-us', label: 'IEEE moderately inverse' },
          { value: 'very-inverse-us', label: 'IEEE very inverse' },
          { value: 'extremely-inverse-us', label: 'IEEE extremely inverse' },
        ],
      },
      { kind: 'quantity', name: 'pickUp', label: 'Pick-up', quantity: 'current' },
      { kind: 'quantity', name: 'multiplier', label: 'Time multiplier or dial', quantity: 'number' },
      {
        kind: 'quantity',
        name: 'reset',
        label: 'Reset time',
        quantity: 'time',
        optional: true,
        hint: 'Without current. Empty: that of IEEE C37.112, at once for IEC curves.',
      },
    ],
  },
  {
    value: 'definite',
    label: 'definite time',
    fields: [
      { kind: 'text', name: 'name', label: 'Name', optional: true, hint: 'For example locked rotor, instantaneous.' },
      { kind: 'quantity', name: 'pickUp', label: 'Pick-up', quantity: 'current' },
      { kind: 'quantity', name: 'delay', label: 'Delay', quantity: 'time' },
    ],
  },
  {
    value: 'overload-class',
    label: 'overload relay by trip class',
    fields: [
      { kind: 'quantity', name: 'setting', label: 'Setting', quantity: 'current' },
      {
        kind: 'choice',
        name: 'class',
        label: 'Trip class',
        initial: '10',
        options: ['5', '10A', '10', '20', '30'].map((value) => ({ value, label: value })),
      },
    ],
  },
  {
    value: 'thermal-image',
    label: 'thermal image',
    fields: [
      { kind: 'quantity', name: 'base', label: 'Basic current', quantity: 'current' },
      { kind: 'quantity', name: 'factor', label: 'Factor k', quantity: 'number', initial: '1.05' },
      { kind: 'quantity', name: 'heating', label: 'Time constant, running', quantity: 'time' },
      { kind: 'quantity', name: 'cooling', label: 'Time constant, at standstill', quantity: 'time' },
      {
        kind: 'quantity',
        name: 'lastingBefore',
        label: 'Lasting current before a hot start',
        quantity: 'current',
        optional: true,
        hint: 'Empty: rated current of the motor.',
      },
      {
        kind: 'quantity',
        name: 'inhibit',
        label: 'No start above',
        quantity: 'ratio',
        optional: true,
        hint: 'Heat in parts of that which trips, for example 60 %.',
      },
    ],
  },
]

/** Thermal limits of a motor beyond its locked-rotor times. */
export const thermalFields: readonly Field[] = [
  {
    kind: 'list',
    name: 'thermalLimits',
    label: 'Points of the thermal limit',
    item: 'point',
    hint: 'At currents below that of the locked rotor, from the maker’s curve.',
    fields: [
      {
        kind: 'choice',
        name: 'state',
        label: 'State',
        initial: 'hot',
        options: [
          { value: 'hot', label: 'hot' },
          { value: 'cold', label: 'cold' },
        ],
      },
      { kind: 'quantity', name: 'current', label: 'Current', quantity: 'current' },
      { kind: 'quantity', name: 'time', label: 'Permissible time', quantity: 'time' },
    ],
  },
  {
    kind: 'quantity',
    name: 'coolingRunning',
    label: 'Cooling time constant, running',
    quantity: 'time',
    optional: true,
  },
  {
    kind: 'quantity',
    name: 'coolingStopped',
    label: 'Cooling time constant, at standstill',
    quantity: 'time',
    optional: true,
  },
]

/** Relay of a motor's feeder. */
export const protectionField: Field = {
  kind: 'group',
  name: 'protection',
  label: 'Relay of the feeder',
  absent: 'not stated',
  hint: 'Compared with the start. Settings are the work of a licensed engineer, with local codes and makers’ data.',
  fields: [
    { kind: 'text', name: 'relay', label: 'Maker and type', optional: true },
    {
      kind: 'choice',
      name: 'measures',
      label: 'Measures',
      initial: 'line',
      options: [
        { value: 'line', label: 'at the line side of the starting device' },
        { value: 'motor', label: 'at the motor' },
      ],
    },
    {
      kind: 'group',
      name: 'currentTransformer',
      label: 'Current transformer',
      absent: 'not stated',
      fields: [
        { kind: 'quantity', name: 'primary', label: 'Primary', quantity: 'current' },
        { kind: 'quantity', name: 'secondary', label: 'Secondary', quantity: 'current' },
      ],
    },
    {
      kind: 'choice',
      name: 'settingsIn',
      label: 'Currents of the settings',
      initial: 'primary',
      options: [
        { value: 'primary', label: 'primary' },
        { value: 'secondary', label: 'secondary' },
      ],
    },
    {
      kind: 'list',
      name: 'elements',
      label: 'Elements',
      item: 'element',
      fields: [{ kind: 'variants', name: '', label: 'Element', tag: 'kind', options: elements }],
    },
  ],
}
