import type { Field, QuantityField, Variant } from '@/lib/ui/form/field'

const of = (
  name: string,
  label: string,
  quantity: QuantityField['quantity'],
  hint?: string,
  optional?: true,
): QuantityField => ({ kind: 'quantity', name, label, quantity, ...(hint && { hint }), ...(optional && { optional }) })

const axis = (name: string, label: string, absent: string, reactance: string, time: string): Field => ({
  kind: 'group',
  name,
  label,
  absent,
  fields: [of('reactance', reactance, 'ratio'), of('time', time, 'time')],
})

/** A generator in place of the utility, by its data sheet. */
export const generatorForm: Variant = {
  value: 'generator',
  label: 'a generator',
  fields: [
    of('rating', 'Rated power', 'apparent-power', 'Reactances and gain below are in parts of it.'),
    of('resistance', 'Armature resistance', 'ratio', undefined, true),
    of('synchronous', 'X_d', 'ratio', 'Unsaturated, for example 240 %.'),
    of('transient', 'X′_d', 'ratio'),
    of('transientTime', 'T′_d0', 'time', 'With the armature open.'),
    axis('subtransient', 'Sub-transient values', 'first instant behind X′_d', 'X″_d', 'T″_d, short circuit'),
    axis('quadrature', 'Quadrature axis', 'no reaction in it', 'X_q', 'T″_q0, damper'),
    {
      kind: 'group',
      name: 'regulator',
      label: 'Voltage regulator',
      absent: 'excitation held',
      fields: [
        of('gain', 'Gain', 'number', 'Excitation over voltage error, both in parts of rated voltage.'),
        of('time', 'Lag with exciter', 'time'),
        of('reset', 'Reset time', 'time', 'Empty where a lasting error remains.', true),
        of('ceiling', 'Ceiling', 'ratio', 'In parts of the excitation for rated voltage without load.'),
        { kind: 'flag', name: 'fedFromTerminals', label: 'Exciter fed from the terminals' },
      ],
    },
    of('inertia', 'Inertia constant H', 'time', 'Of the whole set, in seconds.'),
    {
      kind: 'group',
      name: 'governor',
      label: 'Speed governor',
      absent: 'speed held',
      fields: [
        of('droop', 'Droop', 'ratio'),
        of('time', 'Lag', 'time'),
        of('power', 'Largest power of the prime mover', 'active-power'),
      ],
    },
  ],
}
