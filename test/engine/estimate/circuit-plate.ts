import type { InductionCircuit } from '@/lib/engine/case-input'
import type { Nameplate } from '@/lib/engine/estimate/nameplate'
import { plateFigures } from '@/lib/engine/estimate/plate-mismatch'
import { atSlip } from '@/lib/engine/machines/at-slip'
import { magnitude } from '@/lib/engine/numeric/complex'
import { ampere, hertz, newtonMetre, ohm, radianPerSecond, volt, watt } from '@/lib/units/si'

/** Double cage from r_s, x_s, x_m, r_c, r₁, x₁ (inner), r₂, x₂ (outer), in per unit. */
export const doubleCage = (values: readonly number[]): InductionCircuit => {
  const of = (index: number) => ohm(values[index]!)
  return {
    stator: { re: of(0), im: of(1) },
    magnetising: of(2),
    core: of(3),
    cages: [
      { resistance: of(4), reactance: of(5) },
      { resistance: of(6), reactance: of(7) },
    ],
  }
}

/** Slip at which the circuit draws 1 pu at 1 pu voltage; null where it does not lie between 0.0001 and 0.1. */
export const fullLoadSlip = (circuit: InductionCircuit): number | null => {
  const current = (slip: number) => magnitude(atSlip(circuit, slip).admittance)
  let [low, high] = [1e-4, 0.1]
  if (current(low) > 1 || current(high) < 1) return null
  for (let round = 0; round < 100; round++) {
    const middle = (low + high) / 2
    if (current(middle) > 1) high = middle
    else low = middle
  }
  return low
}

/** The exact plate of a circuit in per unit at a slip, on so many VA and volts; the current there is 1 pu. */
export const plateOf = (
  circuit: InductionCircuit,
  slip: number,
  power: number,
  voltage: number,
  poles = 4,
): Nameplate => {
  const { figures } = plateFigures(circuit, slip)
  const synchronous = (4 * Math.PI * 50) / poles
  const current = power / (Math.sqrt(3) * voltage)
  const torque = power / synchronous
  return {
    ratedPower: watt(figures['shaft-power'] * power),
    ratedVoltage: volt(voltage),
    frequency: hertz(50),
    poles,
    ratedSpeed: radianPerSecond(synchronous * (1 - slip)),
    efficiency: figures.efficiency,
    powerFactor: figures['power-factor'],
    ratedCurrent: ampere(current),
    lockedRotorCurrent: ampere(figures['locked-rotor-current'] * current),
    lockedRotorTorque: newtonMetre(figures['locked-rotor-torque'] * torque),
    breakdownTorque: newtonMetre(figures['breakdown-torque'] * torque),
    lockedRotorPowerFactor: figures['locked-rotor-power-factor'],
  }
}

/** A plate as a data sheet gives it: kW, V, Hz, poles, r/min, and torques and current as multiples of rated. */
export const dataSheet = (
  kilowatt: number,
  voltage: number,
  frequency: number,
  poles: number,
  rpm: number,
  efficiency: number,
  powerFactor: number,
  current: number,
  torques: { lockedRotor: number | null; breakdown: number | null },
  lockedRotorPowerFactor: number | null = null,
): Nameplate => {
  const speed = (rpm * Math.PI) / 30
  const ratedTorque = (1000 * kilowatt) / speed
  const ratedCurrent = (1000 * kilowatt) / (Math.sqrt(3) * voltage * efficiency * powerFactor)
  const times = (multiple: number | null) => (multiple === null ? null : newtonMetre(multiple * ratedTorque))
  return {
    ratedPower: watt(1000 * kilowatt),
    ratedVoltage: volt(voltage),
    frequency: hertz(frequency),
    poles,
    ratedSpeed: radianPerSecond(speed),
    efficiency,
    powerFactor,
    ratedCurrent: null,
    lockedRotorCurrent: ampere(current * ratedCurrent),
    lockedRotorTorque: times(torques.lockedRotor),
    breakdownTorque: times(torques.breakdown),
    lockedRotorPowerFactor,
  }
}
