import { ampere, newtonMetre, radianPerSecond, type Volt, volt, voltAmpere } from '../../units/si'
import type { MotorState } from '../case-result'
import { loadTorqueAt } from '../driven/load-segments'
import { generatorState } from '../machines/generator'
import { supplyStates } from './supply-model'
import type { System } from './system'

/**
 * Everything that is reported of one instant, in one Float64Array: the voltage of every bus (V line to line, in the
 * order of the input), then `perMotor` numbers a motor in the order of `channel`.
 */
export const channel = {
  speed: 0,
  torque: 1,
  loadTorque: 2,
  accelerating: 3,
  lineCurrent: 4,
  motorCurrent: 5,
  motorVoltage: 6,
  active: 7,
  reactive: 8,
} as const

export const perMotor = 9

/** After the motors, where a generator may supply: frequency in Hz, excitation and its lack below the ceiling in V, power in W. */
export const generatorChannel = { frequency: 0, excitation: 1, room: 2, power: 3 } as const

const motorsEnd = ({ plant }: System): number => plant.input.buses.length + perMotor * plant.motors.length

export const observationLength = (system: System): number => motorsEnd(system) + (generators(system) ? 4 : 0)

/** Whether a generator supplies the plant at some time. */
export const generators = ({ plant }: System): boolean => supplyStates(plant.input) > 0

/** Place of a generator's channel in an observation. */
export const generatorPlace = (system: System, which: keyof typeof generatorChannel): number =>
  motorsEnd(system) + generatorChannel[which]

/** Place of a motor's channel in an observation. */
export const placeOf = (system: System, motor: number, which: keyof typeof channel): number =>
  system.plant.input.buses.length + perMotor * motor + channel[which]

/** Writes down what the last solution of the network is like; `state` holds the speeds it was solved at. */
export function createObserver(system: System): (state: Float64Array, into: Float64Array) => void {
  const { plant, connection } = system
  const buses = plant.input.buses.length
  const nodes = new Float64Array(2 * (plant.network.order + 1))
  const { nodeOfBus } = plant.topology
  const end = generators(system) ? motorsEnd(system) : -1
  return (state, into) => {
    system.supply?.followFrequency()
    system.solver.recover(nodes)
    for (let b = 0; b < buses; b++) into[b] = Math.hypot(nodes[2 * nodeOfBus[b]!]!, nodes[2 * nodeOfBus[b]! + 1]!)
    for (let i = 0; i < plant.motors.length; i++) {
      const at = buses + perMotor * i
      const load = loadTorqueAt(system.driven[i]!, state[i]!)
      const square = system.busSquare[i]!
      into[at] = state[i]!
      into[at + 1] = system.torque[i]!
      into[at + 2] = load
      into[at + 3] = plant.mates[i]!.length > 1 ? system.balance(i, state[i]!) : system.torque[i]! - load
      into[at + 4] = Math.sqrt(system.lineSquare[i]!)
      into[at + 5] = Math.sqrt(system.currentSquare[i]!)
      into[at + 6] = Math.sqrt(square) * connection.terminal[i]!
      into[at + 7] = square * connection.admittance[2 * i]!
      into[at + 8] = -square * (connection.admittance[2 * i + 1]! + connection.shunt[i]! * connection.frequency)
    }
    if (end >= 0) observeGenerator(system, state, into, end)
  }
}

function observeGenerator({ supply, plant }: System, state: Float64Array, into: Float64Array, end: number): void {
  const fed = supply?.generator ? supply : null
  const excitation = fed === null ? 0 : state[fed.at + generatorState.excitation]!
  into[end] = plant.input.frequency * (fed?.frequency ?? 1)
  into[end + 1] = excitation
  into[end + 2] = fed === null ? 0 : fed.ceiling() - excitation
  into[end + 3] = fed?.power ?? 0
}

/** The electrical state of one motor in an observation. */
export function motorState(system: System, observation: Float64Array, motor: number): MotorState {
  const at = placeOf(system, motor, 'speed')
  const [active, reactive] = [observation[at + channel.active]!, observation[at + channel.reactive]!]
  const apparent = Math.hypot(active, reactive)
  return {
    speed: radianPerSecond(observation[at]!),
    lineCurrent: ampere(observation[at + channel.lineCurrent]!),
    motorCurrent: ampere(observation[at + channel.motorCurrent]!),
    motorVoltage: volt(observation[at + channel.motorVoltage]!),
    torque: newtonMetre(observation[at + channel.torque]!),
    power: { re: voltAmpere(active), im: voltAmpere(reactive) },
    powerFactor: apparent > 0 ? active / apparent : 0,
  }
}

/** Voltages of every bus in an observation. */
export const busVoltages = (system: System, observation: Float64Array): Volt[] =>
  Array.from(observation.subarray(0, system.plant.input.buses.length), volt)
