import { type InductionCircuit, isTabulated, type MachineModel, type TorqueCurve } from '../case-input'
import { saturationOf } from './saturation'

const positive = (value: number): boolean => Number.isFinite(value) && value > 0
const notNegative = (value: number): boolean => Number.isFinite(value) && value >= 0

/** What makes a circuit impossible to compute, or null. */
export function circuitProblem({ stator, magnetising, core, cages, deepBar }: InductionCircuit): string | null {
  if (!notNegative(stator.re) || !notNegative(stator.im)) return 'the stator impedance must not be negative.'
  if (!positive(magnetising)) return 'the magnetising reactance must be above zero.'
  if (core !== null && !positive(core)) return 'the core resistance must be above zero.'
  if (cages.length < 1 || cages.length > 2) return 'the circuit needs one or two cages.'
  const sound = cages.every((cage) => positive(cage.resistance) && notNegative(cage.reactance))
  if (!sound) return 'each cage needs a resistance above zero and a reactance of zero or more.'
  if (!deepBar) return null
  if (cages.length !== 1) return 'a deep-bar rotor has one cage in its circuit.'
  if (deepBar.law === 'linear')
    return positive(deepBar.resistance) && notNegative(deepBar.reactance)
      ? null
      : 'the cage needs a resistance above zero and a reactance of zero or more at standstill too.'
  const { depth, slotShare } = deepBar
  return notNegative(depth) && depth <= 20 && slotShare >= 0 && slotShare <= 1
    ? null
    : 'the reduced depth of its bars must lie between 0 and 20 and the part of the slot between 0 and 1.'
}

/** The curves go from standstill to synchronous speed, where the torque is zero. */
function curveProblem({ speeds, torques, voltage }: TorqueCurve, synchronous: number): string | null {
  if (!positive(voltage)) return 'its curves need the voltage that they hold at.'
  if (speeds.length < 3 || speeds.length !== torques.length) return 'its curves need three points or more.'
  if (speeds.some((speed, i) => i > 0 && !(speed > speeds[i - 1]!))) return 'the speeds of its curves must rise.'
  if (torques.some((torque) => !Number.isFinite(torque))) return 'each point of its curves needs a torque.'
  const [first, last] = [speeds[0]!, speeds.at(-1)!]
  if (first !== 0) return 'its curves must begin at standstill.'
  if (Math.abs(last - synchronous) > 1e-6 * synchronous || torques.at(-1) !== 0)
    return 'its curves must end at synchronous speed with a torque of zero.'
  return null
}

/**
 * What makes a machine impossible to compute, or null.
 *
 * @param synchronous synchronous speed, rad/s
 */
export function machineProblem(model: MachineModel, synchronous: number): string | null {
  if (isTabulated(model)) {
    const { currents, powerFactors, speeds } = model
    if (currents.length !== speeds.length || powerFactors.length !== speeds.length)
      return 'each point of its curves needs a current and a power factor.'
    if (!currents.every(positive)) return 'each current of its curves must be above zero.'
    if (powerFactors.some((factor) => !(factor >= 0 && factor <= 1)))
      return 'each power factor of its curves must lie between 0 and 1.'
    return curveProblem(model, synchronous)
  }
  const circuit = circuitProblem(model)
  if (circuit !== null) return circuit
  const saturation = saturationOf(model)
  if (saturation) {
    const { current, torque, noneBelow, fullFrom } = saturation
    if (!(current >= 1 && current <= 2) || !(torque >= 2 && torque <= 4))
      return 'its exponents of saturation must lie between 1 and 2 for current and between 2 and 4 for torque.'
    if (!(noneBelow >= 0 && fullFrom > noneBelow)) return 'its saturation must set in before it acts in full.'
  }
  return model.torqueCurve ? curveProblem(model.torqueCurve, synchronous) : null
}
