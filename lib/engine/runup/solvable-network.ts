import type { AdmittanceMatrix } from '../network/admittance'
import { type ReducedNetwork, reduceNetwork } from '../network/reduce'
import { createSolver, type NetworkSolver } from '../network/solver'
import { createSparseSolver } from '../network/sparse-solver'
import type { Plant } from './plant'
import { supplyStates } from './supply-model'

/** Nodes that stay after the reduction: motors first, nodes with nonlinear loads last; how many come first. */
function keptNodes(plant: Plant, driven: number): { nodes: number[]; linear: number } {
  const nonlinear = new Set<number>(plant.loads.node)
  nonlinear.delete(driven)
  const motors = new Set<number>(plant.node)
  // A generator looks at the voltage of its bus.
  if (supplyStates(plant.input) > 0) motors.add(plant.supplyNode)
  const linear = [...motors].filter((node) => node !== driven && !nonlinear.has(node))
  return { nodes: [...linear, ...nonlinear], linear: linear.length }
}

/** Nodes that matter from which on the network is solved whole and sparse; with fewer the reduced dense one is faster. */
const sparseFrom = 24

/** A network with the solver that works on it. */
export interface Solvable {
  rowOf: Int32Array
  solver: NetworkSolver
  /** The reduced network behind the solver and its nodes; null where the network is solved whole. */
  reduced: { network: ReducedNetwork; nodes: readonly number[] } | null
}

/** The network made ready for solving; null where it is singular. A supply that changes rewrites a reduced one. */
export function solvableNetwork(plant: Plant, matrix: AdmittanceMatrix, drivenNode: number): Solvable | null {
  const { nodes, linear } = keptNodes(plant, drivenNode)
  const nominalOf = (node: number): number => plant.topology.busOfNode[node]!.nominal
  const changes = plant.input.supply.generator !== undefined || plant.input.disturbance?.to !== undefined
  if (nodes.length >= sparseFrom && !changes)
    return { ...createSparseSolver(matrix, plant.loads, drivenNode, nominalOf), reduced: null }
  const network = reduceNetwork(matrix, nodes, drivenNode)
  if (network === null) return null
  const solver = createSolver(network, plant.loads, linear, Float64Array.from(nodes, nominalOf))
  return { rowOf: network.rowOf, solver, reduced: { network, nodes } }
}
