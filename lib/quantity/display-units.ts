import type { QuantityName } from './quantity-name'

/** A unit that values are printed in: its label (which the parser reads), SI units in one of it, and from which SI size on it is chosen. */
export interface DisplayUnit {
  label: string
  factor: number
  from: number
}

export type UnitSystem = 'SI' | 'US'

const unit = (label: string, factor: number, from = 0): DisplayUnit => ({ label, factor, from })

const foot = 0.3048
const pound = 0.45359237
const poundFoot = pound * 9.80665 * foot
const horsepower = 550 * poundFoot

/** Smallest first. */
const si: Record<QuantityName, readonly DisplayUnit[]> = {
  voltage: [unit('V', 1), unit('kV', 1e3, 1e3)],
  current: [unit('A', 1), unit('kA', 1e3, 1e4)],
  'apparent-power': [unit('VA', 1), unit('kVA', 1e3, 1e3), unit('MVA', 1e6, 1e6)],
  'active-power': [unit('W', 1), unit('kW', 1e3, 1e3), unit('MW', 1e6, 1e7)],
  'reactive-power': [unit('var', 1), unit('kvar', 1e3, 1e3), unit('Mvar', 1e6, 1e6)],
  impedance: [unit('mΩ', 1e-3), unit('Ω', 1, 0.01)],
  'impedance-per-length': [unit('Ω/km', 1e-3)],
  'susceptance-per-length': [unit('µS/km', 1e-9)],
  length: [unit('m', 1), unit('km', 1e3, 1e3)],
  ratio: [unit('', 1)],
  number: [unit('', 1)],
  frequency: [unit('Hz', 1)],
  speed: [unit('r/min', Math.PI / 30)],
  torque: [unit('N·m', 1), unit('kN·m', 1e3, 1e5)],
  inertia: [unit('kg·m²', 1)],
  time: [unit('ms', 1e-3), unit('s', 1, 1), unit('min', 60, 600), unit('h', 3600, 36_000)],
}

const us: Partial<Record<QuantityName, readonly DisplayUnit[]>> = {
  'active-power': [unit('hp', horsepower)],
  'impedance-per-length': [unit('Ω/kft', 1 / (1000 * foot))],
  'susceptance-per-length': [unit('µS/kft', 1e-6 / (1000 * foot))],
  length: [unit('ft', foot)],
  torque: [unit('lb·ft', poundFoot)],
  inertia: [unit('lb·ft²', pound * foot * foot)],
}

const asRatio = [unit('%', 0.01), unit('pu', 1), unit('×', 1)]

/** Every unit that a quantity is printed in by itself in a system of units. */
export const displayUnits = (quantity: QuantityName, system: UnitSystem): readonly DisplayUnit[] =>
  (system === 'US' ? us[quantity] : undefined) ?? si[quantity]

/** The unit of that label; undefined where the quantity is not printed in it. */
export const namedDisplayUnit = (quantity: QuantityName, label: string): DisplayUnit | undefined =>
  [...si[quantity], ...(us[quantity] ?? []), ...(quantity === 'ratio' ? asRatio : [])].find(
    (one) => one.label === label,
  )

/** The largest unit whose size the value reaches; a value of zero takes the SI unit itself where there is one. */
export const chooseDisplayUnit = (value: number, units: readonly DisplayUnit[]): DisplayUnit => {
  const size = Math.abs(value)
  const chosen = size === 0 ? units.find((one) => one.factor === 1) : units.findLast((one) => size >= one.from)
  return chosen ?? units[0] ?? unit('', 1)
}
