import type { Complex } from '../../units/si'
import type { CaseOutcome } from '../case-result'
import { ceilingOf, generatorBalance } from '../machines/generator'
import { withSourceNode } from '../network/admittance'
import { refuse } from '../network/refusal'
import { type EquilibriumOutcome, runningEquilibrium } from './equilibrium'
import type { Plant } from './plant'
import { type SourceImpedance, sourceImpedance } from './supply'
import { createSystem, type System } from './system'

/** The plant before the start: running motors at their balance, starters off, the EMF fixed from here on. */
export interface BeforeStart {
  /** Driven by the EMF behind the source impedance; solved at `speeds`. */
  system: System
  source: SourceImpedance
  emf: number
  speeds: Float64Array
  /** Into the supply's bus from the source, W and var. */
  power: Complex
}

/** Running motors that have no balance before the start leave a case without a result; the machine is named beside the outcome. */
export interface NoStart {
  ok: false
  outcome: CaseOutcome
  motor?: { index: number; system: System; speeds: Float64Array }
}

/** Finds the state before the start for a given EMF, or the EMF that gives the stated voltage at the supply's bus. */
export function beforeStart(plant: Plant): { ok: true; value: BeforeStart } | NoStart {
  const found = sourceImpedance(plant)
  if (!found.ok) return found
  const source = found.value
  const { hold } = plant.input.supply
  const matrix = withSourceNode(plant.network, plant.supplyNode, source.impedance)
  const system = createSystem(plant, matrix, plant.network.order)
  if (system === null) return singular(plant)
  connectRunning(system)
  if (hold.kind === 'emf') {
    system.solver.driven.set([hold.voltage, 0])
    const speeds = new Float64Array(system.stateLength)
    const outcome = runningEquilibrium(system, runningMotors(plant), speeds)
    if (outcome.kind !== 'found') return withoutStart(system, speeds, outcome)
    return finish(system, source, hold.voltage, speeds)
  }
  const held = holdVoltage(plant, source, hold.voltage)
  if (!held.ok) return held
  const { emf, speeds, voltages } = held.value
  // The angle of the EMF becomes the reference; the held solution starts the search and stays on its branch.
  const size = Math.hypot(emf.re, emf.im)
  const { rowOf } = system.network
  for (let node = 0; node < plant.network.order; node++) {
    const row = rowOf[node]!
    if (row < 0) continue
    const [re, im] = [voltages[2 * node]!, voltages[2 * node + 1]!]
    system.solver.voltage[2 * row] = (re * emf.re + im * emf.im) / size
    system.solver.voltage[2 * row + 1] = (im * emf.re - re * emf.im) / size
  }
  system.solver.driven.set([size, 0])
  system.solver.resume()
  return finish(system, source, size, speeds)
}

export const runningMotors = (plant: Plant): number[] =>
  plant.motors.flatMap((motor, i) => (motor.duty.kind === 'running' ? [i] : []))

const direct = { link: { kind: 'direct' }, rotorResistance: 0 } as const

function connectRunning(system: System): void {
  system.plant.motors.forEach((motor, i) => {
    const running = motor.duty.kind === 'running'
    system.move(i, running ? direct : null, 0)
    system.resting[i] = running ? 0 : 1
  })
  // A motor that is not yet on turns with the others of its shaft.
  for (const mates of system.plant.mates) {
    if (mates.some((m) => !system.resting[m])) for (const m of mates) system.resting[m] = 0
  }
}

/** Load flow with the supply's bus at its stated voltage; the EMF follows from the current through the source. */
function holdVoltage(
  plant: Plant,
  source: SourceImpedance,
  voltage: number,
): { ok: true; value: { emf: Complex; speeds: Float64Array; voltages: Float64Array } } | NoStart {
  const system = createSystem(plant, plant.network, plant.supplyNode)
  if (system === null) return singular(plant)
  connectRunning(system)
  system.solver.driven.set([voltage, 0])
  const speeds = new Float64Array(system.stateLength)
  const outcome = runningEquilibrium(system, runningMotors(plant), speeds)
  if (outcome.kind !== 'found') return withoutStart(system, speeds, outcome)
  const voltages = new Float64Array(2 * plant.network.order)
  system.solver.recover(voltages)
  const current = currentInto(plant, system, voltages)
  const { re, im } = source.impedance
  return {
    ok: true,
    value: {
      emf: { re: voltage + re * current.re - im * current.im, im: re * current.im + im * current.re },
      speeds,
      voltages,
    },
  }
}

/** Current (√3·I) that the supply's bus takes from its source: into branches and shunts, loads and motors there. */
function currentInto(plant: Plant, system: System, voltages: Float64Array): Complex {
  const { network, supplyNode, loads } = plant
  let [re, im] = [0, 0]
  for (let j = 0; j < network.order; j++) {
    const at = 2 * (supplyNode * network.order + j)
    const [yRe, yIm] = [network.data[at]!, network.data[at + 1]!]
    re += yRe * voltages[2 * j]! - yIm * voltages[2 * j + 1]!
    im += yRe * voltages[2 * j + 1]! + yIm * voltages[2 * j]!
  }
  const [vRe, vIm] = [voltages[2 * supplyNode]!, voltages[2 * supplyNode + 1]!]
  for (let l = 0; l < loads.count; l++) {
    if (loads.node[l] !== supplyNode) continue
    const w = Math.max(vRe * vRe + vIm * vIm, loads.floor[l]!)
    const g = loads.current[l]! / Math.sqrt(w) + loads.share[l]! / w
    re += g * (loads.power[2 * l]! * vRe - loads.power[2 * l + 1]! * vIm)
    im += g * (loads.power[2 * l]! * vIm + loads.power[2 * l + 1]! * vRe)
  }
  for (let i = 0; i < plant.motors.length; i++) {
    if (plant.node[i] !== supplyNode || system.connection.code[i] === 0) continue
    const [yRe, yIm] = [system.connection.admittance[2 * i]!, system.connection.admittance[2 * i + 1]!]
    re += yRe * vRe - yIm * vIm
    im += yRe * vIm + yIm * vRe
  }
  return { re, im }
}

function finish(
  system: System,
  source: SourceImpedance,
  emf: number,
  speeds: Float64Array,
): { ok: true; value: BeforeStart } | NoStart {
  if (!system.solveAt(speeds)) return withoutStart(system, speeds, { kind: 'no-network' })
  const power = supplyPower(system, source)
  const beyond = beyondGenerator(system, power)
  if (beyond !== null) return beyond
  return { ok: true, value: { system, source, emf, speeds, power } }
}

/** A generator that cannot carry what runs before the start leaves nothing to compute. */
function beyondGenerator({ plant, solver, network }: System, power: Complex): NoStart | null {
  const { supply } = plant.input
  if (!supply.generator) return null
  const row = network.rowOf[plant.supplyNode]!
  const voltage = { re: solver.voltage[2 * row]!, im: solver.voltage[2 * row + 1]! }
  const square = voltage.re ** 2 + voltage.im ** 2
  const current = {
    re: (power.re * voltage.re + power.im * voltage.im) / square,
    im: (power.re * voltage.im - power.im * voltage.re) / square,
  }
  const found = generatorBalance(supply.generator, voltage, current)
  if (found.excitation > ceilingOf(supply.generator, Math.sqrt(square)))
    return refuse('bad-value', [supply.busId], 'The generator lacks the excitation for what runs before the start.')
  const most = supply.generator.governor?.largestPower ?? Number.POSITIVE_INFINITY
  return found.power > most
    ? refuse(
        'bad-value',
        [supply.busId],
        'The prime mover of the generator lacks the power for what runs before the start.',
      )
    : null
}

/** Power from the source into the supply's bus for the present solution: V·conj((E − V)/Z). */
export function supplyPower(system: System, source: SourceImpedance): Complex {
  const voltages = new Float64Array(2 * (system.plant.network.order + 1))
  system.solver.recover(voltages)
  const at = 2 * system.plant.supplyNode
  const [vRe, vIm] = [voltages[at]!, voltages[at + 1]!]
  const [dRe, dIm] = [system.solver.driven[0]! - vRe, system.solver.driven[1]! - vIm]
  const { re, im } = source.impedance
  const square = re * re + im * im
  const [iRe, iIm] = [(dRe * re + dIm * im) / square, (dIm * re - dRe * im) / square]
  return { re: vRe * iRe + vIm * iIm, im: vIm * iRe - vRe * iIm }
}

function withoutStart(system: System, speeds: Float64Array, outcome: EquilibriumOutcome): NoStart {
  const { plant } = system
  if (outcome.kind === 'no-equilibrium') {
    const { motor } = outcome
    return {
      ok: false,
      outcome: { kind: 'no-load-flow', busId: plant.motors[motor]!.busId },
      motor: { index: motor, system, speeds },
    }
  }
  return { ok: false, outcome: { kind: 'no-load-flow', busId: weakestBus(system) } }
}

/** The bus with the lowest voltage that the search for a solution reached. */
export function weakestBus(system: System): string | null {
  const { rowOf } = system.network
  const node = rowOf.indexOf(system.solver.weakest)
  return node < 0 ? null : system.plant.topology.busOfNode[node]!.id
}

const singular = (plant: Plant): NoStart => ({
  ok: false,
  outcome: { kind: 'no-load-flow', busId: plant.input.supply.busId },
})
