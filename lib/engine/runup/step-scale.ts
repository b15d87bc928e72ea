import { scaleGenerator } from '../machines/generator'
import { evaluateMachine } from '../machines/machine-table'
import { cagesOf } from '../machines/rotor-flux'
import type { System } from './system'

/** Error allowed in a step in a rotor flux or a state of a generator, in parts of rated. */
const fluxTolerance = 1e-7

/** Error allowed in a step: speeds in parts of synchronous speed, integrals in parts of ten seconds of locked rotor at rated voltage. */
export function stepScale(system: System, tolerance: number): Float64Array {
  const { plant } = system
  const scale = new Float64Array(system.stateLength)
  plant.motors.forEach((motor, i) => {
    scale[i] = tolerance * plant.synchronous[i]!
    const at = system.integral[i]!
    if (at < 0) return
    evaluateMachine(plant.machines, i, 1)
    const [re, im] = [plant.machines.admittance[2 * i]!, plant.machines.admittance[2 * i + 1]!]
    scale[at] = (10 * tolerance * motor.ratedVoltage ** 2 * (re * re + im * im)) / 3
    scale[at + 1] = 10 * tolerance * motor.ratedVoltage ** 2 * plant.machines.airgap[i]!
  })
  plant.motors.forEach((motor, i) => {
    const at = system.fluxModel?.index[i] ?? -1
    if (at >= 0) scale.fill(fluxTolerance * motor.ratedVoltage, at, at + 2 * cagesOf(plant.machines, i))
  })
  const set = plant.input.supply.generator ?? plant.input.disturbance?.to?.generator
  if (set && system.supply) scaleGenerator(set, scale, system.supply.at, fluxTolerance)
  return scale
}
