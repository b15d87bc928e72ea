import type { Complex } from '../../units/si'
import type { GeneratorInput } from '../generator-input'
import {
  ceilingOf,
  firstReactance,
  generatorBalance,
  generatorRates,
  generatorState,
  generatorStates,
} from '../machines/generator'
import { withSourceNode } from '../network/admittance'
import { createFrequencyGrid, type FrequencyGrid } from '../network/frequency-grid'
import { type ReducedNetwork, reduceNetwork } from '../network/reduce'
import type { NetworkSolver } from '../network/solver'
import type { Plant } from './plant'
import { generatorImpedance } from './supply'

/** What feeds the plant: one supply, or one after the other; a generator brings states of its own and a frequency that moves. */
export interface SupplyModel {
  /** The generator that feeds the plant now; null on the network. */
  readonly generator: GeneratorInput | null
  /** Its place in the state; meaningless without one. */
  readonly at: number
  /** Frequency in parts of rated that the network is written for. */
  readonly frequency: number
  /** Voltage of the supply's bus in V and power across the generator's air gap in W at the last solution. */
  readonly terminal: number
  readonly power: number
  /** Speed and power of the set stay as they are. */
  held: boolean
  /** EMF and frequency of a state; false where the frequency has left what a set can feed. */
  look(state: Float64Array): boolean
  /** Takes in the voltage of the supply's bus; with `dead` the plant is off. */
  carry(dead: boolean): void
  rates(state: Float64Array, rate: Float64Array): void
  /** Whether nothing of the supply moves any more, after `rates`. */
  isCalm(rate: Float64Array): boolean
  /** From here on the first supply's generator has states, those of the last solution; without a generator nothing happens. */
  begin(state: Float64Array): void
  /** Puts the plant on the second supply. */
  transfer(state: Float64Array): void
  /** Brings the voltages of all nodes up to the present frequency, before they are recovered. */
  followFrequency(): void
  /** Excitation in V that the state stands for, and the ceiling at the last terminal voltage. */
  ceiling(): number
}

interface Source {
  generator: GeneratorInput | null
  /** Open-circuit voltage and its angle, of a source that the plant comes to. */
  emf: number
  angle: number
  reduced: ReducedNetwork | null
  grid: FrequencyGrid | null
}

/** Rates below which a generator stands still, in parts of rated a second. */
const calmVoltage = 2e-5
const calmSpeed = 2e-6

/** Length of the state that generators of a case add. */
export const supplyStates = ({ supply, disturbance }: Plant['input']): number =>
  supply.generator || disturbance?.to?.generator ? generatorStates : 0

/**
 * Lays out the supplies of a plant whose supply is a generator or changes on the way; null for all others,
 * `singular` where a network that it needs has no reduction.
 *
 * The frame of the network is the rotor of the generator: E″ stands in it with its quadrature axis real, and the EMF is
 * n·E″ behind r + jn·X″.
 *
 * @param network what the solver works on; rewritten as the frequency moves
 * @param setFrequency told whenever the frequency changes
 */
export function createSupplyModel(
  plant: Plant,
  keep: readonly number[],
  begin: number,
  network: ReducedNetwork,
  solver: NetworkSolver,
  setFrequency: (part: number) => void,
): SupplyModel | 'singular' | null {
  const { supply, disturbance } = plant.input
  const to = disturbance?.to
  if (!supply.generator && !to) return null
  const sourceNode = plant.network.order
  const row = network.rowOf[plant.supplyNode]!
  const { driven, voltage } = solver

  const reduceWith =
    (impedance: (part: number) => Complex) =>
    (part: number): ReducedNetwork | null =>
      reduceNetwork(withSourceNode(plant.networkAt(part), plant.supplyNode, impedance(part)), keep, sourceNode)
  function source(generator: GeneratorInput | null, impedance: Complex | null, emf: number, angle: number): Source {
    const reduceAt = reduceWith((part) => (generator ? generatorImpedance(generator, part) : impedance!))
    const whole = { generator, emf, angle }
    if (generator) return { ...whole, reduced: null, grid: createFrequencyGrid(reduceAt) }
    return { ...whole, reduced: impedance === null ? null : reduceAt(1), grid: null }
  }
  const first = source(supply.generator ?? null, null, 0, 0)
  const second = to ? source(to.generator ?? null, to.impedance, to.emf, to.angle) : null

  const missing = ({ generator, reduced, grid }: Source): boolean => (generator ? grid : reduced) === null
  if ((first.generator && missing(first)) || (second !== null && missing(second))) return 'singular'

  let now = first
  let on = false
  let frequency = 1
  let terminal = 0
  let power = 0
  let [currentRe, currentIm] = [0, 0]
  const set = { voltage: 0, power: 0 }

  function move(part: number): boolean {
    if (part === frequency) return true
    if (now.grid === null || !now.grid.write(part, network)) return false
    frequency = part
    setFrequency(part)
    return true
  }

  /** Turns every voltage by −angle of the given unit vector. */
  function turn({ re, im }: Complex): void {
    for (let k = 0; k < voltage.length; k += 2) {
      const [vRe, vIm] = [voltage[k]!, voltage[k + 1]!]
      voltage[k] = vRe * re + vIm * im
      voltage[k + 1] = vIm * re - vRe * im
    }
    solver.resume()
  }

  const model: SupplyModel = {
    get generator() {
      return on ? now.generator : null
    },
    at: begin,
    get frequency() {
      return frequency
    },
    get terminal() {
      return terminal
    },
    get power() {
      return power
    },
    held: false,
    look(state) {
      if (!on || now.generator === null) return true
      const part = state[begin + generatorState.speed]!
      if (!move(part)) return false
      driven[0] = part * state[begin]!
      driven[1] = part * state[begin + 1]!
      return true
    },
    carry(dead) {
      if (!on || now.generator === null) return
      const { resistance } = now.generator
      const x = frequency * firstReactance(now.generator)
      const [eRe, eIm] = [driven[0]!, driven[1]!]
      const [vRe, vIm] = dead ? [eRe, eIm] : [voltage[2 * row]!, voltage[2 * row + 1]!]
      const square = resistance * resistance + x * x
      const [dRe, dIm] = [eRe - vRe, eIm - vIm]
      currentRe = (dRe * resistance + dIm * x) / square
      currentIm = (dIm * resistance - dRe * x) / square
      terminal = Math.sqrt(vRe * vRe + vIm * vIm)
      power = eRe * currentRe + eIm * currentIm
    },
    rates(state, rate) {
      if (supplyStates(plant.input) === 0) return
      if (!on || now.generator === null) {
        rate.fill(0, begin, begin + generatorStates)
        return
      }
      generatorRates(now.generator, set, state, begin, currentRe, currentIm, terminal, power, rate)
      if (!model.held) return
      rate[begin + generatorState.power] = 0
      rate[begin + generatorState.speed] = 0
    },
    isCalm(rate) {
      if (!on || now.generator === null) return true
      const { ratedVoltage, ratedPower } = now.generator
      // Quick states carry the noise of the steps, the excitation that of the voltage times its gain.
      const quick = 10 * calmVoltage * ratedVoltage
      const excited = (1 + (now.generator.regulator?.gain ?? 0)) * calmVoltage * ratedVoltage
      if (Math.abs(rate[begin]!) > quick || Math.abs(rate[begin + 1]!) > quick) return false
      if (Math.abs(rate[begin + generatorState.transient]!) > calmVoltage * ratedVoltage) return false
      if (Math.abs(rate[begin + generatorState.excitation]!) > excited) return false
      const mechanical = Math.abs(rate[begin + generatorState.power]!) < calmVoltage * ratedPower
      return mechanical && Math.abs(rate[begin + generatorState.speed]!) < calmSpeed
    },
    begin(state) {
      const { generator } = first
      if (generator === null) return
      const [vRe, vIm] = [voltage[2 * row]!, voltage[2 * row + 1]!]
      const [dRe, dIm] = [driven[0]! - vRe, driven[1]! - vIm]
      const { re: r, im: x } = generatorImpedance(generator, 1)
      const square = r * r + x * x
      const current = { re: (dRe * r + dIm * x) / square, im: (dIm * r - dRe * x) / square }
      const found = generatorBalance(generator, { re: vRe, im: vIm }, current)
      settle(generator, state, found, Math.hypot(vRe, vIm))
      turn(found.axis)
      on = true
    },
    transfer(state) {
      if (second === null) return
      now = second
      on = second.generator !== null
      frequency = Number.NaN
      if (second.generator === null) {
        network.admittance.set(second.reduced!.admittance)
        network.source.set(second.reduced!.source)
        network.recovery.set(second.reduced!.recovery)
        frequency = 1
        setFrequency(1)
        driven[0] = second.emf * Math.cos(second.angle)
        driven[1] = second.emf * Math.sin(second.angle)
        return
      }
      // Unloaded at its voltage and rated speed.
      const open = { re: second.emf, im: 0 }
      settle(second.generator, state, generatorBalance(second.generator, open, { re: 0, im: 0 }), second.emf)
      move(1)
      driven[0] = second.emf
      driven[1] = 0
    },
    followFrequency() {
      if (on && now.grid !== null) now.grid.writeRecovery(network)
    },
    ceiling: () => (on && now.generator !== null ? ceilingOf(now.generator, terminal) : Number.POSITIVE_INFINITY),
  }

  function settle(
    generator: GeneratorInput,
    state: Float64Array,
    { re, im, transient, excitation, power: taken }: ReturnType<typeof generatorBalance>,
    voltageNow: number,
  ): void {
    const reset = (generator.regulator?.reset ?? null) !== null
    state.set([re, im, transient, excitation, reset ? excitation : 0, taken, 1], begin)
    set.voltage = voltageNow + (reset ? 0 : excitation / (generator.regulator?.gain ?? 1))
    set.power = taken
  }

  return model
}
