import { type Complex, type VoltAmpere, voltAmpere } from '../../units/si'
import type { GeneratorInput } from '../generator-input'
import { atSlip } from '../machines/at-slip'
import { firstReactance } from '../machines/generator'
import { type AdmittanceMatrix, addElement } from '../network/admittance'
import { refuse, type Setup } from '../network/refusal'
import { createSparseSolver } from '../network/sparse-solver'
import { type NonlinearLoads, nonlinearLoads } from '../network/static-load'
import { magnitude, reciprocal, subtract } from '../numeric/complex'
import type { Plant } from './plant'

/** The supply's own impedance, and what was taken out of the stated one. */
export interface SourceImpedance {
  impedance: Complex
  /** Short-circuit power of the plant's motors in the stated level at nominal voltage; null when it contains none. */
  takenOut: VoltAmpere | null
}

const noLoads: NonlinearLoads = nonlinearLoads([], new Map())

/** Admittance of the network at the supply's bus: the current into it with 1 V there; null where it is singular. */
function seenFrom({ supplyNode, topology }: Plant, matrix: AdmittanceMatrix): Complex | null {
  const { order, data } = matrix
  const nominalOf = (node: number): number => topology.busOfNode[node]!.nominal
  const { solver } = createSparseSolver(matrix, noLoads, supplyNode, nominalOf)
  solver.driven.set([1, 0])
  if (!solver.solve()) return null
  const voltages = new Float64Array(2 * order)
  solver.recover(voltages)
  let [re, im] = [0, 0]
  for (let j = 0; j < order; j++) {
    const at = 2 * (supplyNode * order + j)
    re += data[at]! * voltages[2 * j]! - data[at + 1]! * voltages[2 * j + 1]!
    im += data[at]! * voltages[2 * j + 1]! + data[at + 1]! * voltages[2 * j]!
  }
  return { re, im }
}

/**
 * Source impedance without the plant's motors: the admittance of the stated level minus the locked-rotor admittance
 * of the motors in it, seen from the supply's bus through lines and transformers with static loads and capacitors off.
 *
 * Refused when nothing inductive remains: the motors would feed more than the whole level.
 */
export function sourceImpedance(plant: Plant): Setup<SourceImpedance> {
  const { supply } = plant.input
  if (supply.generator)
    return { ok: true, value: { impedance: generatorImpedance(supply.generator, 1), takenOut: null } }
  if (supply.motorsInLevel.length === 0) return { ok: true, value: { impedance: supply.impedance, takenOut: null } }
  const matrix = { order: plant.branches.order, data: Float64Array.from(plant.branches.data) }
  for (const motor of supply.motorsInLevel) {
    const node = plant.topology.nodeOf.get(motor.busId)!
    addElement(matrix, node, node, atSlip(motor.circuit, 1).admittance)
  }
  const motors = seenFrom(plant, matrix)
  if (motors === null) return refuse('bad-value', [supply.busId], 'The network between supply and motors is singular.')
  const rest = subtract(reciprocal(supply.impedance), motors)
  if (!(rest.re >= 0 && rest.im < 0)) {
    return refuse(
      'bad-value',
      [supply.busId],
      'The motors in the stated level feed more than the whole level; nothing remains for the supply.',
    )
  }
  const impedance = reciprocal(rest)
  const nominal = plant.topology.busOfNode[plant.supplyNode]!.nominal
  return {
    ok: true,
    value: {
      impedance,
      takenOut: voltAmpere(nominal ** 2 * magnitude(motors)),
    },
  }
}

/** Impedance in ohm behind which a generator meets the first instant, at a frequency in parts of rated. */
export const generatorImpedance = (generator: GeneratorInput, part: number): Complex => ({
  re: generator.resistance,
  im: part * firstReactance(generator),
})
