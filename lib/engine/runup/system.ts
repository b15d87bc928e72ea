import { type LoadSegments, loadTorque, loadTorqueAt } from '../driven/load-segments'
import { evaluateMachine, setMachineFrequency } from '../machines/machine-table'
import { saturate, saturationOf } from '../machines/saturation'
import type { AdmittanceMatrix } from '../network/admittance'
import type { NetworkSolver } from '../network/solver'
import { codes, connect, connections, disconnect, evaluateConnection, isRegulated } from '../starters/connection'
import { evaluateDrive } from '../starters/drive'
import type { Step } from '../starters/position'
import { createFluxModel, type FluxModel } from './flux-model'
import type { Plant } from './plant'
import { createRegulation } from './regulation'
import { solvableNetwork } from './solvable-network'
import { createSupplyModel, type SupplyModel, supplyStates } from './supply-model'

/** The plant with its network reduced for one driving node, motors in given positions. The run-up works on it in place. */
export interface System {
  readonly plant: Plant
  /** Place of each node among the solver's voltages, −1 for the others. */
  readonly network: { readonly rowOf: Int32Array }
  readonly solver: NetworkSolver
  /** 1 where a shaft stands still because its torque does not exceed that of its load. */
  readonly resting: Uint8Array
  /** Piece of the load curve each motor is on; kept over a step so that the step sees a smooth curve. */
  readonly piece: Int32Array
  /** Written by `solveAt`: torque in N·m, loss in the rotor in W, squares of bus voltage in V², motor and line current in A². */
  readonly torque: Float64Array
  readonly slipLoss: Float64Array
  readonly busSquare: Float64Array
  readonly currentSquare: Float64Array
  readonly lineSquare: Float64Array
  readonly connection: ReturnType<typeof connections>
  /** Place of each starting motor's two integrals in the state (∫I²dt, then ∫s·P_ag dt), −1 for others. */
  readonly integral: Int32Array
  readonly stateLength: number
  /** Rotor fluxes behind the integrals in the state; null in a quasi-static case. */
  readonly fluxModel: FluxModel | null
  /** A generator, or supplies that follow one another; null for one supply of the network. */
  readonly supply: SupplyModel | null
  /** Load curves in force. */
  driven: readonly LoadSegments[]
  /** Brings a motor into a position of its starting device at case time t, or off the line. */
  move(motor: number, step: Pick<Step, 'link' | 'rotorResistance'> | null, t: number): void
  /** EMF in parts of that before the start; 0 takes the plant off its supply. */
  setSource(part: number): void
  /** Puts a plant without supply on its second one. */
  transfer(state: Float64Array): void
  /** Case time that `solveAt` holds for; ramps of starting devices look at it. */
  setTime(t: number): void
  /** Solves the network with every motor at the given speed (rad/s); false where there is no solution. */
  solveAt(speeds: Float64Array): boolean
  /** Right-hand side of the run-up. State: speed of every motor, then the integrals. */
  derivative(t: number, state: Float64Array, rate: Float64Array): boolean
  /** Does something with every machine as its steady circuit. */
  steadily<T>(look: () => T): T
  /** From here on motors have rotor fluxes: those of the last steady solution where they are connected. */
  begin(state: Float64Array): void
  /** Torque left for acceleration of the shaft after `solveAt`, with the piece looked up by speed; at standstill against the breakaway torque. */
  balance(motor: number, speed: number): number
}

/** Agreement of the voltages of network and devices, as a part of their squares, and rounds after which there is none. */
const regulationTolerance = 1e-11
const mostRounds = 60

/**
 * Reduces the network to motors and nonlinear loads, driven at one node, and joins it with the motors.
 *
 * @returns null where the rest of the network is singular
 */
export function createSystem(plant: Plant, matrix: AdmittanceMatrix, drivenNode: number): System | null {
  const network = solvableNetwork(plant, matrix, drivenNode)
  if (network === null) return null
  const { solver } = network
  const count = plant.motors.length
  const { machines, torqueFactor, inertia } = plant
  const synchronous = Float64Array.from(plant.synchronous)
  const row = Int32Array.from(plant.node, (node) => network.rowOf[node]!)
  const connection = connections(count)
  const ownRotor = Float64Array.from({ length: count }, (_, i) => machines.circuit[8 * i + 4]!)
  const torque = new Float64Array(count)
  const slipLoss = new Float64Array(count)
  const busSquare = Float64Array.from(plant.motors, (motor) => motor.ratedVoltage ** 2)
  const currentSquare = new Float64Array(count)
  const lineSquare = new Float64Array(count)
  const resting = new Uint8Array(count)
  const piece = new Int32Array(count)
  let length = count
  const integral = Int32Array.from(plant.starters, (starter) => {
    if (starter === null) return -1
    length += 2
    return length - 2
  })
  const fluxModel = createFluxModel(plant, connection, length)
  if (fluxModel !== null) length = fluxModel.length
  const ratedCircuit = Float64Array.from(machines.circuit)
  const found =
    network.reduced !== null && drivenNode === plant.network.order
      ? createSupplyModel(plant, network.reduced.nodes, length, network.reduced.network, solver, (part) => {
          setMachineFrequency(machines, ratedCircuit, part)
          connection.frequency = part
          for (let i = 0; i < count; i++) synchronous[i] = part * plant.synchronous[i]!
        })
      : null
  if (found === 'singular') return null
  const feeding: SupplyModel | null = found
  length += supplyStates(plant.input)
  const fed = new Float64Array(2)
  const saturations = plant.motors.map(({ circuit }) => saturationOf(circuit))
  const { shunt, injection, voltage, driven } = solver

  /** Motors whose devices look at the voltage of their bus; the rest of the work is spared while there are none. */
  const regulated = new Uint8Array(count)
  let regulatedMotors = 0
  let time = 0
  const regulation = createRegulation(count)

  function squareAt(i: number): number {
    const at = 2 * row[i]!
    const re = at < 0 ? driven[0]! : voltage[at]!
    const im = at < 0 ? driven[1]! : voltage[at + 1]!
    return re * re + im * im
  }

  /** What motor i and its device show the bus at this speed, for the square of the voltage there. */
  function evaluate(i: number, speed: number, square: number): void {
    if (connection.code[i] === codes.drive) {
      const load = system.driven[i]!
      const opposing = resting[i] ? loadTorqueAt(load, 0) : loadTorque(load, piece[i]!, speed)
      evaluateDrive(connection, i, speed, opposing, square, time)
      return
    }
    const slip = 1 - speed / synchronous[i]!
    evaluateMachine(machines, i, slip)
    const saturation = saturations[i]
    if (saturation) {
      // Behind an impedance the winding's share of the voltage is that of the round before.
      const winding = Math.sqrt(connection.winding[i]! * square) / plant.motors[i]!.ratedVoltage / connection.frequency
      saturate(machines, i, saturation, slip, winding)
    }
    const atFull = regulated[i] ? (torqueFactor[i]! * machines.airgap[i]! * square) / synchronous[i]! : 0
    evaluateConnection(connection, machines, i, square, time, atFull)
  }

  function addShunt(i: number): void {
    const at = 2 * row[i]!
    if (at < 0) return
    shunt[at] = shunt[at]! + connection.admittance[2 * i]!
    shunt[at + 1] = shunt[at + 1]! + connection.admittance[2 * i + 1]! + connection.shunt[i]! * connection.frequency
  }

  /** Network and devices in turns until the voltages that the devices saw are those of the network. */
  function regulate(speeds: Float64Array): boolean {
    regulation.begin()
    for (let round = 0; round < mostRounds; round++) {
      shunt.fill(0)
      for (let i = 0; i < count; i++) {
        if (connection.code[i] === 0) continue
        if (regulated[i]) evaluate(i, speeds[i]!, busSquare[i]!)
        addShunt(i)
      }
      if (!solver.solve()) return false
      let farthest = 0
      for (let i = 0; i < count; i++) {
        if (!regulated[i]) continue
        const found = squareAt(i)
        const off = Math.abs(found - busSquare[i]!) / found
        if (!(off <= farthest)) farthest = off
        busSquare[i] = regulation.next(i, busSquare[i]!, found)
      }
      if (farthest < regulationTolerance) return true
    }
    return false
  }

  /** EMF before a disturbance, and the last voltages with supply: from them the search goes on afterwards. */
  let emf: readonly [number, number] | null = null
  let dead = false
  const lastVoltage = new Float64Array(voltage.length)

  /** A plant without supply: no voltage, no current, no torque. Residual voltages of motors are left out. */
  function withoutSupply(): void {
    voltage.fill(0)
    for (const each of [torque, slipLoss, busSquare, currentSquare, lineSquare]) each.fill(0)
  }

  function lookAtFluxes(model: FluxModel, i: number, state: Float64Array): void {
    if (connection.code[i] === 0) {
      model.open(i, state[i]!, state)
      return
    }
    model.before(i, state[i]!, state, fed)
    const at = 2 * row[i]!
    if (at < 0) return
    injection[at] = injection[at]! + fed[0]!
    injection[at + 1] = injection[at + 1]! + fed[1]!
    addShunt(i)
  }

  function carryFluxes(model: FluxModel, i: number, state: Float64Array): void {
    const at = 2 * row[i]!
    model.after(i, at < 0 ? driven[0]! : voltage[at]!, at < 0 ? driven[1]! : voltage[at + 1]!, state)
    torque[i] = (torqueFactor[i]! * model.fluxes.airgap[i]!) / synchronous[i]!
    slipLoss[i] = model.fluxes.rotorLoss[i]! * connection.ownRotor[i]!
    currentSquare[i] = model.motorSquare[i]!
    lineSquare[i] = model.lineSquare[i]!
  }

  function solveAt(speeds: Float64Array): boolean {
    const moving = fluxModel?.on ? fluxModel : null
    if (feeding !== null && !feeding.look(speeds)) return false
    if (dead) {
      withoutSupply()
      feeding?.carry(true)
      if (moving !== null) for (let i = 0; i < count; i++) if (moving.index[i]! >= 0) moving.open(i, speeds[i]!, speeds)
      return true
    }
    shunt.fill(0)
    if (fluxModel !== null) injection.fill(0)
    for (let i = 0; i < count; i++) {
      if (moving !== null && moving.index[i]! >= 0) {
        lookAtFluxes(moving, i, speeds)
        continue
      }
      if (connection.code[i] === 0) continue
      if (!regulated[i]) evaluate(i, speeds[i]!, 1)
      addShunt(i)
    }
    if (!(regulatedMotors > 0 ? regulate(speeds) : solver.solve())) return false
    feeding?.carry(false)
    for (let i = 0; i < count; i++) {
      const square = squareAt(i)
      busSquare[i] = square
      const code = connection.code[i]!
      if (moving !== null && moving.index[i]! >= 0 && code !== 0) {
        carryFluxes(moving, i, speeds)
        continue
      }
      if (code === 0) {
        torque[i] = 0
        slipLoss[i] = 0
        currentSquare[i] = 0
        lineSquare[i] = 0
        continue
      }
      if (code === codes.drive) {
        torque[i] = connection.torque[i]!
        slipLoss[i] = connection.slipLoss[i]!
        currentSquare[i] = connection.motorSquare[i]!
        lineSquare[i] = connection.lineSquare[i]!
        continue
      }
      const power = machines.airgap[i]! * connection.winding[i]! * square
      torque[i] = (torqueFactor[i]! * power) / synchronous[i]!
      slipLoss[i] = (1 - speeds[i]! / synchronous[i]!) * power * connection.ownRotor[i]!
      const yRe = connection.admittance[2 * i]!
      const yIm = connection.admittance[2 * i + 1]!
      const share = connection.current[i]!
      currentSquare[i] = ((yRe * yRe + yIm * yIm) * square * share * share) / 3
      const withCapacitors = yIm + connection.shunt[i]! * connection.frequency
      lineSquare[i] = ((yRe * yRe + withCapacitors * withCapacitors) * square) / 3
    }
    return true
  }

  const shared = plant.mates.filter((mates, i) => mates.length > 1 && mates[0] === i)

  /** One acceleration for the motors of a shaft: all torques over all inertias. */
  function couple(rate: Float64Array): void {
    for (const mates of shared) {
      let [left, mass] = [0, 0]
      for (const m of mates) {
        left += rate[m]! * inertia[m]!
        mass += inertia[m]!
      }
      for (const m of mates) rate[m] = left / mass
    }
  }

  const system: System = {
    plant,
    network,
    solver,
    resting,
    piece,
    torque,
    slipLoss,
    busSquare,
    currentSquare,
    lineSquare,
    connection,
    integral,
    stateLength: length,
    fluxModel,
    supply: feeding,
    driven: plant.driven,
    move(motor, step, t) {
      const added = step?.rotorResistance ?? 0
      const own = ownRotor[motor]!
      machines.circuit[8 * motor + 4] = own + added
      connection.ownRotor[motor] = own / (own + added)
      const { ratedTorque, ratedVoltage } = plant.motors[motor]!
      if (step === null) disconnect(connection, motor)
      else connect(connection, motor, step, t, { ratedTorque, ratedVoltage, inertia: inertia[motor]! })
      const looks = isRegulated(connection, motor) || (saturations[motor] !== null && connection.code[motor] !== 0)
      regulated[motor] = looks ? 1 : 0
      regulatedMotors = regulated.reduce((sum, one) => sum + one, 0)
    },
    setTime(t) {
      time = t
    },
    setSource(part) {
      emf ??= [driven[0]!, driven[1]!]
      if (dead) {
        voltage.set(lastVoltage)
        plant.motors.forEach((motor, i) => {
          busSquare[i] = motor.ratedVoltage ** 2
        })
        solver.resume()
      }
      dead = part === 0
      if (dead) lastVoltage.set(voltage)
      driven.set([part * emf[0], part * emf[1]])
    },
    transfer(state) {
      system.setSource(1)
      feeding?.transfer(state)
    },
    solveAt,
    derivative(t, state, rate) {
      time = t
      if (!solveAt(state)) return false
      for (let i = 0; i < count; i++) {
        const speed = state[i]!
        rate[i] = resting[i] ? 0 : (torque[i]! - loadTorque(system.driven[i]!, piece[i]!, speed)) / inertia[i]!
        const at = integral[i]!
        if (at < 0) continue
        rate[at] = currentSquare[i]!
        rate[at + 1] = slipLoss[i]!
      }
      if (shared.length > 0) couple(rate)
      feeding?.rates(state, rate)
      if (!fluxModel?.on) return true
      for (let i = 0; i < count; i++) {
        const at = fluxModel.index[i]!
        if (at >= 0) fluxModel.fluxes.rates(i, 1 - state[i]! / synchronous[i]!, state, at, rate)
      }
      return true
    },
    steadily(look) {
      if (!fluxModel?.on) return look()
      fluxModel.on = false
      const found = look()
      fluxModel.on = true
      return found
    },
    begin(state) {
      if (feeding !== null && solveAt(state)) feeding.begin(state)
      if (fluxModel === null || !solveAt(state)) return
      for (let i = 0; i < count; i++) {
        const at = fluxModel.index[i]!
        if (at < 0 || connection.code[i] === 0) continue
        const r = 2 * row[i]!
        const [re, im] = r < 0 ? [driven[0]!, driven[1]!] : [voltage[r]!, voltage[r + 1]!]
        fluxModel.fluxes.settle(i, 1 - state[i]! / synchronous[i]!, re, im, state, at)
      }
      fluxModel.on = true
    },
    balance(motor, speed) {
      let left = 0
      for (const m of plant.mates[motor]!) left += torque[m]! - loadTorqueAt(system.driven[m]!, speed)
      return left
    },
  }
  return system
}
