import { type LoadSegments, loadTorque, loadTorqueAt } from '../driven/load-segments'
import { evaluateMachine } from '../machines/machine-table'
import type { AdmittanceMatrix } from '../network/admittance'
import { type ReducedNetwork, reduceNetwork } from '../network/reduce'
import { createSolver, type NetworkSolver } from '../network/solver'
import { connect, connections, evaluateConnection } from '../starters/connection'
import type { Position } from '../starters/position'
import type { Plant } from './plant'

/** The plant with its network reduced for one driving node, motors in given positions. The run-up works on it in place. */
export interface System {
  readonly plant: Plant
  readonly network: ReducedNetwork
  readonly solver: NetworkSolver
  /** 1 where a shaft stands still because its torque does not exceed that of its load. */
  readonly resting: Uint8Array
  /** Piece of the load curve each motor is on; kept over a step so that the step sees a smooth curve. */
  readonly piece: Int32Array
  /** Written by `solveAt`: torque in N·m, airgap power in W, square of the bus voltage in V², square of the motor current in A². */
  readonly torque: Float64Array
  readonly airgapPower: Float64Array
  readonly busSquare: Float64Array
  readonly currentSquare: Float64Array
  readonly connection: ReturnType<typeof connections>
  /** Place of each starting motor's two integrals in the state (∫I²dt, then ∫s·P_ag dt), −1 for others. */
  readonly integral: Int32Array
  readonly stateLength: number
  /** Load curves in force. */
  driven: readonly LoadSegments[]
  move(motor: number, position: Position): void
  /** Solves the network with every motor at the given speed (rad/s); false where there is no solution. */
  solveAt(speeds: Float64Array): boolean
  /** Right-hand side of the run-up. State: speed of every motor, then the integrals. */
  derivative(t: number, state: Float64Array, rate: Float64Array): boolean
  /** Torque left for acceleration after `solveAt`, with the piece looked up by speed; at standstill against the breakaway torque. */
  balance(motor: number, speed: number): number
}

/** Nodes that stay after the reduction: motors first, nodes with nonlinear loads last; how many come first. */
function keptNodes(plant: Plant, driven: number): { nodes: number[]; linear: number } {
  const nonlinear = new Set<number>(plant.loads.node)
  nonlinear.delete(driven)
  const motors = new Set<number>(plant.node)
  const linear = [...motors].filter((node) => node !== driven && !nonlinear.has(node))
  return { nodes: [...linear, ...nonlinear], linear: linear.length }
}

/**
 * Reduces the network to motors and nonlinear loads, driven at one node, and joins it with the motors.
 *
 * @returns null where the rest of the network is singular
 */
export function createSystem(plant: Plant, matrix: AdmittanceMatrix, drivenNode: number): System | null {
  const kept = keptNodes(plant, drivenNode)
  const network = reduceNetwork(matrix, kept.nodes, drivenNode)
  if (network === null) return null
  const nominal = Float64Array.from(kept.nodes, (node) => plant.topology.busOfNode[node]!.nominal)
  const solver = createSolver(network, plant.loads, kept.linear, nominal)
  const count = plant.motors.length
  const { machines, synchronous, torqueFactor, inertia } = plant
  const row = Int32Array.from(plant.node, (node) => network.rowOf[node]!)
  const connection = connections(plant.starters)
  const torque = new Float64Array(count)
  const airgapPower = new Float64Array(count)
  const busSquare = new Float64Array(count)
  const currentSquare = new Float64Array(count)
  const resting = new Uint8Array(count)
  const piece = new Int32Array(count)
  let length = count
  const integral = Int32Array.from(plant.starters, (starter) => {
    if (starter === null) return -1
    length += 2
    return length - 2
  })
  const { shunt, voltage, driven } = solver

  function solveAt(speeds: Float64Array): boolean {
    shunt.fill(0)
    for (let i = 0; i < count; i++) {
      if (connection.code[i] === 0) continue
      evaluateMachine(machines, i, 1 - speeds[i]! / synchronous[i]!)
      evaluateConnection(connection, machines, i)
      const at = 2 * row[i]!
      if (at < 0) continue
      shunt[at] = shunt[at]! + connection.admittance[2 * i]!
      shunt[at + 1] = shunt[at + 1]! + connection.admittance[2 * i + 1]!
    }
    if (!solver.solve()) return false
    for (let i = 0; i < count; i++) {
      const at = 2 * row[i]!
      const re = at < 0 ? driven[0]! : voltage[at]!
      const im = at < 0 ? driven[1]! : voltage[at + 1]!
      const square = re * re + im * im
      busSquare[i] = square
      if (connection.code[i] === 0) {
        torque[i] = 0
        airgapPower[i] = 0
        currentSquare[i] = 0
        continue
      }
      const power = machines.airgap[i]! * connection.winding[i]! * square
      airgapPower[i] = power
      torque[i] = (torqueFactor[i]! * power) / synchronous[i]!
      const yRe = connection.admittance[2 * i]!
      const yIm = connection.admittance[2 * i + 1]!
      const share = connection.current[i]!
      currentSquare[i] = ((yRe * yRe + yIm * yIm) * square * share * share) / 3
    }
    return true
  }

  const system: System = {
    plant,
    network,
    solver,
    resting,
    piece,
    torque,
    airgapPower,
    busSquare,
    currentSquare,
    connection,
    integral,
    stateLength: length,
    driven: plant.driven,
    move(motor, position) {
      connect(connection, motor, position)
    },
    solveAt,
    derivative(_t, state, rate) {
      if (!solveAt(state)) return false
      for (let i = 0; i < count; i++) {
        const speed = state[i]!
        rate[i] = resting[i] ? 0 : (torque[i]! - loadTorque(system.driven[i]!, piece[i]!, speed)) / inertia[i]!
        const at = integral[i]!
        if (at < 0) continue
        rate[at] = currentSquare[i]!
        rate[at + 1] = (1 - speed / synchronous[i]!) * airgapPower[i]!
      }
      return true
    },
    balance: (motor, speed) => torque[motor]! - loadTorqueAt(system.driven[motor]!, speed),
  }
  return system
}
