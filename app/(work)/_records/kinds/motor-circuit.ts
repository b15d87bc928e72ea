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
  ],
}
