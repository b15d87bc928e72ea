import { type CircuitVector, stateAtSlip } from '@/lib/engine/estimate/circuit-vector'
import type { Nameplate } from '@/lib/engine/estimate/nameplate'
import { plateFigures } from '@/lib/engine/estimate/plate-mismatch'
import { ampere, hertz, newtonMetre, radianPerSecond, volt, watt } from '@/lib/units/si'

/** Slip at which the circuit draws 1 pu at 1 pu voltage; null where it does not lie between 0.0001 and 0.1. */
export const fullLoadSlip = (circuit: CircuitVector): number | null => {
  let [low, high] = [1e-4, 0.1]
  if (stateAtSlip(circuit, low).current > 1 || stateAtSlip(circuit, high).current < 1) return null
  for (let round = 0; round < 100; round++) {
    const middle = (low + high) / 2
    if (stateAtSlip(circuit, middle).current > 1) high = middle
    else low = middle
  }
  return low
}

/** The exact plate of a circuit in per unit at a slip, on so many VA and volts; the current there is 1 pu. */
export const plateOf = (circuit: CircuitVector, slip: number, power: number, voltage: number, poles = 4): Nameplate => {
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
