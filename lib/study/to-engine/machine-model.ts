import type { InductionCircuit, MachineModel, TorqueCurve } from '../../engine/case-input'
import { breakdownSlip } from '../../engine/machines/breakdown-slip'
import { ampere, hertz, newtonMetre, radianPerSecond, volt } from '../../units/si'
import { synchronousSpeed } from '../../units/speed'
import type { MotorRecord } from '../document/machine-records'
import type { MotorCircuit } from '../document/motor-circuit'

type Table = Extract<MotorCircuit, { kind: 'table' }>

/** Curves may end below synchronous speed; this near they end at it. */
const atSynchronous = 1e-6

const endsAt = (points: readonly { speed: { si: number } }[], synchronous: number): boolean =>
  (points.at(-1)?.speed.si ?? 0) >= synchronous * (1 - atSynchronous)

/** Typed torque of a motor, closed with zero at synchronous speed where it ends below. */
const torqueCurveOf = (motor: MotorRecord, synchronous: number): TorqueCurve | undefined => {
  const points = motor.torquePoints
  if (points.length === 0) return undefined
  const closed = endsAt(points, synchronous)
  const kept = closed ? points.slice(0, -1) : points
  return {
    voltage: volt(motor.ratedVoltage.si),
    speeds: [...kept.map(({ speed }) => radianPerSecond(speed.si)), radianPerSecond(synchronous)],
    torques: [...kept.map(({ torque }) => newtonMetre(torque.si)), newtonMetre(0)],
    interpolation: motor.torqueInterpolation,
  }
}

/**
 * Curves of a tabulated motor. One that ends below synchronous speed is closed there with no torque and the reactive part
 * of its last current as the no-load current: derived, and printed as such.
 */
const tableOf = (motor: MotorRecord, { points, interpolation }: Table, synchronous: number): MachineModel => {
  const closed = endsAt(points, synchronous)
  const kept = closed ? points.slice(0, -1) : points
  const last = points.at(-1)!
  const idle = closed
    ? { current: last.current.si, factor: last.powerFactor.si }
    : { current: last.current.si * Math.sqrt(Math.max(0, 1 - last.powerFactor.si ** 2)), factor: 0 }
  return {
    voltage: volt(motor.ratedVoltage.si),
    speeds: [...kept.map(({ speed }) => radianPerSecond(speed.si)), radianPerSecond(synchronous)],
    torques: [...kept.map(({ torque }) => newtonMetre(torque.si)), newtonMetre(0)],
    currents: [...kept.map(({ current }) => ampere(current.si)), ampere(idle.current)],
    powerFactors: [...kept.map(({ powerFactor }) => powerFactor.si), idle.factor],
    interpolation,
  }
}

/** Rated slip at the least, so that saturation fades out before the motor runs. */
const leastRunningSlip = 1e-4

/** The machine that a motor is computed with: its circuit with what else its record says, or its curves. */
export const machineModel = (motor: MotorRecord, circuit: InductionCircuit | null, frequency: number): MachineModel => {
  const synchronous = synchronousSpeed(hertz(frequency), motor.poles)
  if (motor.circuit.kind === 'table') return tableOf(motor, motor.circuit, synchronous)
  if (circuit === null) throw new RangeError(`motor ${motor.id} was not checked: it has neither circuit nor curves`)
  const torqueCurve = torqueCurveOf(motor, synchronous)
  const { saturation } = motor
  const noneBelow = Math.max(leastRunningSlip, 1 - motor.ratedSpeed.si / synchronous)
  return {
    ...circuit,
    ...(torqueCurve && { torqueCurve }),
    ...(saturation && {
      saturation: { ...saturation, noneBelow, fullFrom: Math.max(2 * noneBelow, breakdownSlip(circuit)) },
    }),
  }
}
