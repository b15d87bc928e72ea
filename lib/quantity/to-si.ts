import type { InertiaNotation } from './inertia-notation'
import type { QuantityName } from './quantity-name'
import { sameDimension, unitFactor } from './unit-class'

/** The SI unit of each quantity that has one, in the words of the unit parser. */
const siUnit: Record<Exclude<QuantityName, 'ratio' | 'number'>, string> = {
  voltage: 'V',
  current: 'A',
  'apparent-power': 'voltampere',
  'active-power': 'W',
  'reactive-power': 'reactivevar',
  impedance: 'ohm',
  'impedance-per-length': 'ohm/m',
  'susceptance-per-length': 'S/m',
  length: 'm',
  frequency: 'Hz',
  speed: 'rad/s',
  torque: 'N*m',
  inertia: 'kg*m^2',
  time: 's',
}

export type MeasuredQuantity = keyof typeof siUnit

const standardGravity = 9.80665

/**
 * SI units in one typed unit; null where the unit measures something else. A pound or kilogram with a foot or metre is
 * a force where a torque is asked for; a weight is a mass where an inertia is (GD² in kgf·m², Wk² in lb·ft²).
 */
export const siFactor = (
  expression: string,
  quantity: MeasuredQuantity,
  notation: InertiaNotation | null,
): number | null => {
  const share = notation === 'GD²' ? 0.25 : 1
  const factor = unitFactor(expression)
  if (sameDimension(expression, siUnit[quantity])) return factor * share
  if (quantity === 'torque' && sameDimension(expression, 'kg*m')) return factor * standardGravity
  if (quantity === 'inertia') {
    if (notation !== null && sameDimension(expression, 'N*m^2')) return (factor / standardGravity) * share
    if (sameDimension(expression, 'kg*m*s^2')) return factor * standardGravity * share
  }
  return null
}

/** Whether the unit is a weight times a length squared, which without GD² or Wk² leaves open what is meant. */
export const isWeightInertia = (expression: string): boolean => sameDimension(expression, 'N*m^2')
