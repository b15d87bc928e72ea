import type { TabulatedMachine, TorqueCurve } from '../case-input'
import { interpolant } from '../numeric/interpolant'

/** Torque, and current where it is known, of a machine by typed curves. */
export interface CurveMachine {
  /** Whether the curves give the current too. */
  current: boolean
  /** Airgap power at one volt, W/V². */
  airgap(slip: number): number
  /** Writes admittance (re, im) and airgap power of machine i; for curves with a current. */
  write(admittance: Float64Array, airgap: Float64Array, i: number, slip: number): void
  /** Whether the curves reach this slip. */
  reaches(slip: number): boolean
}

/** A speed this far beyond an end of the curves, in parts of synchronous speed, is still the end itself. */
const onTheEdge = 1e-9

/**
 * Torque ∝ U², current ∝ U, power factor unchanged. Airgap power is torque times synchronous speed.
 *
 * @param synchronous synchronous speed, rad/s
 */
export function curveMachine(curve: TorqueCurve | TabulatedMachine, synchronous: number): CurveMachine {
  const { speeds, torques, voltage, interpolation } = curve
  const torque = interpolant(speeds, torques, interpolation)
  const perVolt = synchronous / voltage ** 2
  const [first, last] = [speeds[0]!, speeds.at(-1)!]
  const airgap = (slip: number): number => torque((1 - slip) * synchronous) * perVolt
  const edge = onTheEdge * synchronous
  const reaches = (slip: number): boolean => {
    const speed = (1 - slip) * synchronous
    return speed >= first - edge && speed <= last + edge
  }
  if (!('powerFactors' in curve)) return { current: false, airgap, write: () => undefined, reaches }
  const current = interpolant(speeds, curve.currents, interpolation)
  const factor = interpolant(speeds, curve.powerFactors, interpolation)
  const admittancePerAmpere = Math.sqrt(3) / voltage
  return {
    current: true,
    airgap,
    reaches,
    write(admittance, into, i, slip) {
      const speed = (1 - slip) * synchronous
      const size = current(speed) * admittancePerAmpere
      const cosine = factor(speed)
      admittance[2 * i] = size * cosine
      admittance[2 * i + 1] = -size * Math.sqrt(Math.max(0, 1 - cosine * cosine))
      into[i] = airgap(slip)
    },
  }
}
