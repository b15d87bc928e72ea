import type { QuantityName } from './quantity-name'

/** How a quantity is spoken of in a message: with its article, and a value as one would type it. */
export const quantityWording: Record<QuantityName, { noun: string; example: string }> = {
  voltage: { noun: 'a voltage', example: '11 kV' },
  current: { noun: 'a current', example: '651 A' },
  'apparent-power': { noun: 'an apparent power', example: '8 MVA' },
  'active-power': { noun: 'an active power', example: '1100 kW' },
  'reactive-power': { noun: 'a reactive power', example: '1.2 Mvar' },
  impedance: { noun: 'an impedance', example: '0.35 Ω' },
  'impedance-per-length': { noun: 'an impedance per length', example: '0.246 Ω/km' },
  'susceptance-per-length': { noun: 'a susceptance per length', example: '60 µS/km' },
  length: { noun: 'a length', example: '0.8 km' },
  ratio: { noun: 'a ratio', example: '0.85 or 6 %' },
  number: { noun: 'a number', example: '6' },
  frequency: { noun: 'a frequency', example: '50 Hz' },
  speed: { noun: 'a speed', example: '992 r/min' },
  torque: { noun: 'a torque', example: '10 589 N·m' },
  inertia: { noun: 'an inertia', example: '340 kg·m²' },
  time: { noun: 'a time', example: '12 s' },
}
