import { type Ampere, ampere, type NewtonMetre, newtonMetre, type Second, second } from '../units/si'
import { type CaseInput, isTabulated } from './case-input'
import { loadTorqueAt } from './driven/load-segments'
import { beforeStart } from './runup/before-start'
import { preparePlant } from './runup/plant'
import type { System } from './runup/system'
import { canBeFollowed, transientMachine } from './transient/machine-equations'
import { transientStart } from './transient/transient-start'

/** What the first instants of a direct start bring beyond the RMS model. */
export interface DirectStartPeaks {
  motorId: string
  /** Largest instantaneous current over all phases and switching instants, A. */
  peakCurrent: { current: Ampere; at: Second }
  /** Greatest and least airgap torque. */
  peakTorque: { torque: NewtonMetre; at: Second }
  lowestTorque: { torque: NewtonMetre; at: Second }
}

/** The peaks of a start lie within its first half second. */
const watched = 0.5
const direct = { link: { kind: 'direct' as const }, rotorResistance: 0 }

/** Complex voltage at a motor's bus, re and im, after a solution. */
function voltageAt(system: System, motor: number): { re: number; im: number } {
  const row = system.network.rowOf[system.plant.node[motor]!]!
  const { voltage, driven } = system.solver
  return row < 0 ? { re: driven[0]!, im: driven[1]! } : { re: voltage[2 * row]!, im: voltage[2 * row + 1]! }
}

/**
 * Thevenin equivalent at a motor's bus: from its voltage before and after the motor is switched on at standstill, all else
 * answering as in the RMS model. Null where the network has no solution with the motor on.
 */
function equivalentAt(system: System, motor: number, speeds: Float64Array) {
  if (!system.solveAt(speeds)) return null
  const open = voltageAt(system, motor)
  system.move(motor, direct, 0)
  const solved = system.solveAt(speeds)
  const loaded = voltageAt(system, motor)
  const y = { re: system.connection.admittance[2 * motor]!, im: system.connection.admittance[2 * motor + 1]! }
  system.move(motor, null, 0)
  if (!solved) return null
  // Z = (E/V − 1)/y
  const square = loaded.re ** 2 + loaded.im ** 2
  const ratio = {
    re: (open.re * loaded.re + open.im * loaded.im) / square - 1,
    im: (open.im * loaded.re - open.re * loaded.im) / square,
  }
  const size = y.re ** 2 + y.im ** 2
  return {
    emf: Math.hypot(open.re, open.im),
    impedance: {
      re: (ratio.re * y.re + ratio.im * y.im) / size,
      im: (ratio.im * y.re - ratio.re * y.im) / size,
    },
  }
}

/**
 * Peaks of current and torque of every motor that starts direct-on-line first in a case, by the transient model behind the
 * Thevenin equivalent of the network.
 *
 * The DC part of the current decays with the equivalent's own resistance, so its peak depends on the switching instant;
 * the figure is that of the worst phase at the worst instant. Later starts of the case, machines by curves,
 * machines with a negative equivalent resistance (capacitors near resonance) and those with next to no leakage reactance have none.
 */
export function directStartPeaks(input: CaseInput): readonly DirectStartPeaks[] {
  const plant = preparePlant(input)
  if (!plant.ok) return []
  const before = beforeStart(plant.value)
  if (!before.ok) return []
  const { system, speeds } = before.value
  const begin = Math.min(...input.motors.flatMap(({ duty }) => (duty.kind === 'starting' ? [duty.at] : [])))
  return input.motors.flatMap((motor, i): DirectStartPeaks[] => {
    const { duty, circuit } = motor
    if (duty.kind !== 'starting' || duty.starter.kind !== 'direct' || duty.at > begin || isTabulated(circuit)) return []
    const equivalent = equivalentAt(system, i, speeds)
    if (equivalent === null || equivalent.impedance.re < 0 || equivalent.impedance.im < 0) return []
    // At standstill a deep bar has the values of slip 1, and the peaks lie there.
    const locked = circuit.deepBar?.law === 'linear' ? { ...circuit, cages: [circuit.deepBar] } : circuit
    const { re, im } = equivalent.impedance
    const stator = { resistance: locked.stator.re + re, reactance: locked.stator.im + im }
    if (!canBeFollowed([stator, ...locked.cages], input.frequency)) return []
    const machine = transientMachine(locked, { ...equivalent, frequency: input.frequency }, motor.poles, 0)
    const load = system.driven[i]!
    const result = transientStart(machine, {
      loadTorque: (speed) => (speed > 0 ? loadTorqueAt(load, speed) : 0),
      inertia: motor.inertia,
      from: 0,
      speeds: [],
      until: watched,
      whole: true,
    })
    const torque = (value: { torque: number; at: number }) => ({
      torque: newtonMetre(value.torque * motor.torqueFactor),
      at: second(value.at),
    })
    return [
      {
        motorId: motor.id,
        peakCurrent: { current: ampere(result.peakVector.current), at: second(result.peakVector.at) },
        peakTorque: torque(result.peakTorque),
        lowestTorque: torque(result.lowestTorque),
      },
    ]
  })
}
