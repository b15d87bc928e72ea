import type { Ampere, Hertz, NewtonMetre, RadianPerSecond, Volt, VoltAmpere, Watt } from '../../units/si'

/** What a nameplate or data sheet says of a cage motor, at rated voltage; null where it is silent. */
export interface Nameplate {
  ratedPower: Watt
  ratedVoltage: Volt
  frequency: Hertz
  poles: number
  ratedSpeed: RadianPerSecond
  efficiency: number
  powerFactor: number
  /** Only held against the other four; the fit does not use it. */
  ratedCurrent: Ampere | null
  lockedRotorCurrent: Ampere
  lockedRotorTorque: NewtonMetre | null
  breakdownTorque: NewtonMetre | null
  lockedRotorPowerFactor: number | null
  /** Only held against the rest, as the rated current; absent or null where the plate is silent. */
  ratedTorque?: NewtonMetre | null
  pullUpTorque?: NewtonMetre | null
  /** Locked-rotor apparent power at rated voltage that the plate's code letter stands for: from (held), below (not held). */
  lockedRotorCode?: { from: VoltAmpere; below: VoltAmpere | null } | null
}

/** The plate in per unit on P/(η·cos φ) and rated voltage, torque on that power over synchronous speed. */
export interface PlateInPerUnit {
  slip: number
  shaftPower: number
  efficiency: number
  powerFactor: number
  lockedRotorCurrent: number
  lockedRotorTorque: number | null
  breakdownTorque: number | null
  lockedRotorPowerFactor: number | null
}

/** Bases of the per-unit plate: VA, ohm and rad/s. */
export interface PlateBase {
  power: number
  impedance: number
  synchronousSpeed: number
}

export const plateBase = (plate: Nameplate): PlateBase => {
  const power = plate.ratedPower / (plate.efficiency * plate.powerFactor)
  return {
    power,
    impedance: plate.ratedVoltage ** 2 / power,
    synchronousSpeed: (4 * Math.PI * plate.frequency) / plate.poles,
  }
}

export const inPerUnit = (plate: Nameplate, base: PlateBase): PlateInPerUnit => {
  const torque = (value: number | null) => (value === null ? null : (value * base.synchronousSpeed) / base.power)
  return {
    slip: 1 - plate.ratedSpeed / base.synchronousSpeed,
    shaftPower: plate.ratedPower / base.power,
    efficiency: plate.efficiency,
    powerFactor: plate.powerFactor,
    lockedRotorCurrent: (plate.lockedRotorCurrent * Math.sqrt(3) * plate.ratedVoltage) / base.power,
    lockedRotorTorque: torque(plate.lockedRotorTorque),
    breakdownTorque: torque(plate.breakdownTorque),
    lockedRotorPowerFactor: plate.lockedRotorPowerFactor,
  }
}
