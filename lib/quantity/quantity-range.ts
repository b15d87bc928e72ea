import type { QuantityName } from './quantity-name'

/** What a value of a quantity may be, in SI; `least` is the smallest size other than zero that makes sense in a plant. */
export interface QuantityRange {
  sign: 'positive' | 'zero-or-positive' | 'any'
  least: number
  most: number
}

/** Wide bounds that catch a wrong prefix (11 GV, 0.4 mV), not unusual plant; the records' own rules are narrower. */
export const quantityRange: Record<QuantityName, QuantityRange> = {
  voltage: { sign: 'positive', least: 1, most: 1.2e6 },
  current: { sign: 'zero-or-positive', least: 1e-3, most: 1e6 },
  'apparent-power': { sign: 'positive', least: 1, most: 1e12 },
  'active-power': { sign: 'zero-or-positive', least: 1, most: 1e10 },
  'reactive-power': { sign: 'any', least: 1, most: 1e10 },
  impedance: { sign: 'zero-or-positive', least: 1e-9, most: 1e6 },
  'impedance-per-length': { sign: 'zero-or-positive', least: 1e-9, most: 1 },
  'susceptance-per-length': { sign: 'zero-or-positive', least: 1e-13, most: 1e-5 },
  length: { sign: 'zero-or-positive', least: 1e-3, most: 2e6 },
  ratio: { sign: 'any', least: 1e-9, most: 1e4 },
  number: { sign: 'any', least: 1e-9, most: 1e9 },
  frequency: { sign: 'positive', least: 1, most: 1e3 },
  speed: { sign: 'any', least: 1e-3, most: 1e4 },
  torque: { sign: 'any', least: 1e-3, most: 1e8 },
  inertia: { sign: 'zero-or-positive', least: 1e-6, most: 1e7 },
  time: { sign: 'zero-or-positive', least: 1e-6, most: 1e8 },
}
