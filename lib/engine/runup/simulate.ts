import { type Complex, radianPerSecond, second } from '../../units/si'
import { pieceAt } from '../driven/load-segments'
import { evaluateMachine } from '../machines/machine-table'
import { createIntegrator } from '../numeric/dormand-prince'
import { findRoot } from '../numeric/root'
import { changeOverOf, firstPosition, gapOf, type Position } from '../starters/position'
import { type BeforeStart, supplyPower, weakestBus } from './before-start'
import type { Courses, StartCourse } from './course'
import { type Crossing, firstCrossings } from './crossing'
import { createExtremeSearch, type Watch } from './extremes'
import { findHang, hangOutcome, turningMotors } from './hang'
import { busVoltages, createObserver, motorState, observationLength, placeOf } from './observation'
import type { Sample } from './sampler'
import type { System } from './system'

/** How a run ended. */
export type RunEnd =
  /** Every start over and every shaft at rest or at its balance. */
  | { kind: 'settled'; at: number }
  /** Time ran out with shafts still on their way. */
  | { kind: 'horizon'; at: number }
  | { kind: 'collapsed'; at: number; busId: string | null }

export interface RunRecord {
  end: RunEnd
  samples: Sample[]
  /** Just after the first switching-on; null when the network had no solution there or nothing was started. */
  first: Float64Array | null
  firstAt: number
  /** From the source into the supply's bus at that instant, W and var. */
  firstPower: Complex | null
  state: Float64Array
  counters: { steps: number; rejected: number; evaluations: number; largestErrorRatio: number; largestMismatch: number }
}

/** Longest step, s. */
const longest = 1
/** Torque left, in parts of rated, below which a shaft counts as settled after its start, and as worth a look for a hang. */
const settledTorque = 1e-4
const hangingTorque = 4e-3
/** Departure of a plotted quantity from the straight line, in parts of its scale, above which more samples are taken. */
const coarse = 2e-3
const sameInstant = 1e-12

/**
 * Runs a plant up from its state before the start.
 *
 * J·dω/dt = T(ω, U) − T_L(ω) for every shaft, the network solved in every evaluation; integrated with error control,
 * begun anew at every switching, corner of a load curve and halt, which are located first.
 */
export function simulate(before: BeforeStart, courses: Courses): RunRecord {
  const { system } = before
  const { plant } = system
  const { timeLimit, tolerance } = plant.input.settings
  const observe = createObserver(system)
  const length = observationLength(system)
  const state = Float64Array.from(before.speeds)
  const integrator = createIntegrator(state, system.derivative, stepScale(system, tolerance), longest)
  const scratch = new Float64Array(system.stateLength)
  const end = new Float64Array(length)
  const plotScale = plotScales(system)
  const samples: Sample[] = []
  let largestMismatch = 0
  let first: Float64Array | null = null
  let firstPower: Complex | null = null
  let lastHangTorque = Number.POSITIVE_INFINITY

  const observeAt = (t: number, into: Float64Array): boolean => {
    integrator.interpolate(t, scratch)
    return observe(scratch, into)
  }
  const search = createExtremeSearch(allWatches(courses), length, observeAt)

  function keep(t: number, observation: Float64Array): void {
    samples.push({ t, observation: Float64Array.from(observation) })
    search.add(t, observation)
  }

  function result(outcome: RunEnd): RunRecord {
    const { steps, rejected, evaluations, largestErrorRatio } = integrator.counters
    return {
      end: outcome,
      samples,
      first,
      firstAt,
      firstPower,
      state,
      counters: { steps, rejected, evaluations, largestErrorRatio, largestMismatch },
    }
  }

  const collapsed = (t: number): RunRecord => result({ kind: 'collapsed', at: t, busId: weakestBus(system) })

  function moveTo(start: StartCourse, position: Position, t: number): void {
    start.position = position
    system.move(start.motor, position)
    if (position === 'running') start.runningAt = t
    if (position === 'open') start.openedAt = t
    const connected = position !== 'open'
    start.watches.line.active = true
    start.watches.motor.active = true
    start.watches.voltage.active = connected
    start.watches.accelerating.active = connected && start.at95 === null
  }

  /** Switchings due at t. Returns the starts that moved. */
  function switchDue(t: number): StartCourse[] {
    const moved: StartCourse[] = []
    for (const start of courses.starts) {
      const change = changeOverOf(start.starter)
      const onFirst = start.position === 'tap' || start.position === 'star'
      if (!start.switchedOn && t >= start.at - sameInstant) {
        start.switchedOn = true
        moveTo(start, firstPosition(start.starter), t)
        moved.push(start)
      } else if (onFirst && change?.kind === 'time' && t >= start.at + change.at - sameInstant) {
        moveTo(start, gapOf(start.starter) > 0 ? 'open' : 'running', t)
        moved.push(start)
      } else if (start.position === 'open' && t >= start.openedAt! + gapOf(start.starter) - sameInstant) {
        moveTo(start, 'running', t)
        moved.push(start)
      }
    }
    return moved
  }

  /** Earliest switching or time limit after t. */
  function nextInstant(t: number): number {
    let next = horizon
    for (const start of courses.starts) {
      const change = changeOverOf(start.starter)
      const onFirst = start.position === 'tap' || start.position === 'star'
      const due = [
        start.switchedOn ? null : start.at,
        onFirst && change?.kind === 'time' ? start.at + change.at : null,
        start.position === 'open' ? start.openedAt! + gapOf(start.starter) : null,
        start.outcome === null ? start.at + timeLimit : null,
      ]
      for (const each of due) if (each !== null && each > t + sameInstant && each < next) next = each
    }
    return next
  }

  /** Lets go every resting shaft whose torque exceeds what holds it; after `solveAt`. */
  function release(): void {
    for (let i = 0; i < plant.motors.length; i++) {
      if (!system.resting[i] || system.connection.code[i] === 0) continue
      if (system.balance(i, 0) > 0) {
        system.resting[i] = 0
        system.piece[i] = 0
        const start = courses.starts.find((each) => each.motor === i)
        if (start) start.turned = true
      }
    }
  }

  /** Solves anew after switchings and notes the state just after them; false where the network has no solution. */
  function afterSwitching(t: number, moved: readonly StartCourse[]): boolean {
    lastHangTorque = Number.POSITIVE_INFINITY
    if (!system.solveAt(state)) return false
    release()
    if (!observe(state, end)) return false
    largestMismatch = Math.max(largestMismatch, system.solver.mismatch())
    search.breakHere()
    keep(t, end)
    if (first === null) {
      first = Float64Array.from(end)
      firstPower = supplyPower(system, before.source)
    }
    for (const start of moved) {
      const now = motorState(system, end, start.motor)
      if (start.standstill === null) {
        start.standstill = now
        continue
      }
      const { position, motor } = start
      if (position !== 'open' && position !== 'running') continue
      courses.changeOvers.push({
        motorId: plant.motors[motor]!.id,
        at: second(t),
        to: position,
        speed: radianPerSecond(state[motor]!),
        state: now,
        busVoltages: busVoltages(system, end),
        tooEarly: position === 'running' && state[motor]! < plant.breakdownSpeed[motor]!,
      })
    }
    return integrator.restart(t, 0)
  }

  function judgeStarted(): void {
    for (const start of courses.starts) {
      if (start.outcome !== null || start.runningAt === null || start.atCriterion === null) continue
      start.outcome = { kind: 'started', at: second(Math.max(start.runningAt, start.atCriterion) - start.at) }
    }
  }

  /** Acts on crossings at the present instant. Returns the starts that changed over. */
  function act(crossings: readonly Crossing[], t: number): { moved: StartCourse[]; anew: boolean } {
    const moved: StartCourse[] = []
    let anew = false
    for (const { motor, kind, speed } of crossings) {
      state[motor] = speed
      const start = courses.starts.find((each) => each.motor === motor)
      const running = courses.running.find((each) => each.motor === motor)
      if (kind === 'corner-up') system.piece[motor] = system.piece[motor]! + 1
      if (kind === 'corner-down') system.piece[motor] = system.piece[motor]! - 1
      if (kind === 'halt') {
        system.resting[motor] = 1
        system.piece[motor] = 0
        anew = true
      }
      if (running && kind === 'pull-out') running.pulledOutAt = t
      if (running && kind === 'recovery') running.pulledOutAt = null
      if (!start) continue
      if (kind === 'at-95') {
        start.at95 = t
        start.watches.accelerating.active = false
      }
      if (kind === 'criterion') {
        start.atCriterion = t
        const at = system.integral[motor]!
        start.i2t = state[at]!
        start.slipEnergy = state[at + 1]!
      }
      if (kind === 'change-over') {
        moveTo(start, gapOf(start.starter) > 0 ? 'open' : 'running', t)
        moved.push(start)
      }
    }
    return { moved, anew }
  }

  /** Samples between two instants of the last step, closer where a plotted line bends. */
  function sampleBetween(from: Sample, to: Sample, depth: number): boolean {
    const middle = new Float64Array(length)
    const t = (from.t + to.t) / 2
    if (!observeAt(t, middle)) return false
    const bends =
      depth > 0 &&
      plotScale.some((scale, c) => {
        const line = (from.observation[c]! + to.observation[c]!) / 2
        return Math.abs(middle[c]! - line) > coarse * scale
      })
    const sample = { t, observation: middle }
    if (bends && !sampleBetween(from, sample, depth - 1)) return false
    samples.push(sample)
    search.add(t, middle)
    return !bends || sampleBetween(sample, to, depth - 1)
  }

  /** Observes the last step up to its end; false where the network has no solution there. */
  function look(): boolean {
    const t = integrator.time
    if (!observe(state, end)) return false
    const last = samples.at(-1)!
    const now = { t, observation: Float64Array.from(end) }
    if (t > last.t && !sampleBetween(last, now, 4)) return false
    if (!observe(state, end)) return false
    largestMismatch = Math.max(largestMismatch, system.solver.mismatch())
    samples.push(now)
    search.add(t, end)
    return true
  }

  /** Instant in the last step at which a resting shaft is let go, or null. */
  function releaseInstant(): number | null {
    const held = plant.motors.flatMap((_, i) => (system.resting[i] && system.connection.code[i] !== 0 ? [i] : []))
    if (held.length === 0 || !system.solveAt(state)) return null
    let earliest: number | null = null
    for (const i of held) {
      const surplus = (t: number): number => {
        integrator.interpolate(t, scratch)
        return system.solveAt(scratch) ? system.balance(i, 0) : -1
      }
      if (!system.solveAt(state) || system.balance(i, 0) <= 0) continue
      const { from, time } = integrator
      const atFrom = surplus(from)
      const t = atFrom >= 0 ? Math.min(time, from + 1e-9) : findRoot(surplus, from, time, 1e-9)
      if (earliest === null || t < earliest) earliest = t
    }
    return earliest
  }

  const restless = (i: number): number =>
    system.resting[i] ? 0 : Math.abs(end[placeOf(system, i, 'accelerating')]!) / plant.ratedTorque[i]!

  /** Whether the run is over: starts resolved and shafts settled, or every open start hanging. */
  function isOver(): boolean {
    const open = courses.starts.filter((start) => start.outcome === null)
    if (courses.starts.some((start) => start.position === 'open' || !start.switchedOn)) return false
    const gaveUp = new Set(
      courses.starts.flatMap((start) => (start.outcome?.kind === 'timed-out' ? [start.motor] : [])),
    )
    const torque = Math.max(
      0,
      ...turningMotors(system)
        .filter((i) => !gaveUp.has(i))
        .map(restless),
    )
    if (open.length === 0) return torque < settledTorque
    const pending = open.some((start) => start.position !== 'running' && changeOverOf(start.starter)?.kind === 'time')
    if (pending || torque > hangingTorque || torque > lastHangTorque / 2) return false
    lastHangTorque = torque
    const speeds = findHang(system, open, state)
    if (speeds === null) return false
    for (const start of open) start.outcome = hangOutcome(system, start, speeds)
    state.set(speeds)
    return true
  }

  function giveUp(t: number): void {
    for (const start of courses.starts) {
      if (start.outcome !== null || t < start.at + timeLimit - sameInstant) continue
      start.outcome =
        system.resting[start.motor] && !start.turned
          ? hangOutcome(system, start, state)
          : { kind: 'timed-out', speed: radianPerSecond(state[start.motor]!) }
    }
  }

  const firstAt = Math.min(...courses.starts.map((start) => start.at))
  const horizon = Math.max(...courses.starts.map((start) => start.at)) + 2 * timeLimit

  system.piece.set(plant.driven.map((load, i) => pieceAt(load, state[i]!)))
  if (!observe(state, end)) return collapsed(0)
  keep(0, end)
  if (courses.starts.length === 0) return result({ kind: 'settled', at: 0 })
  if (firstAt > 0) keep(firstAt, end)
  for (const bus of courses.buses) bus.deepest.active = true
  if (!afterSwitching(firstAt, switchDue(firstAt))) return collapsed(firstAt)

  for (;;) {
    const t = integrator.time
    if (t >= horizon) return result({ kind: 'horizon', at: t })
    if (integrator.advance(nextInstant(t)) === 'blocked') return collapsed(integrator.time)
    const released = releaseInstant()
    let crossings = firstCrossings(system, courses, integrator)
    const crossed = crossings[0]?.at ?? Number.POSITIVE_INFINITY
    const letGo = released !== null && released < crossed
    if (letGo) crossings = []
    const stride = integrator.nextStep
    if (letGo) integrator.cutAt(released)
    else if (crossings.length > 0) integrator.cutAt(crossed)
    if (!look()) return collapsed(integrator.time)
    const now = integrator.time
    const { moved, anew } = act(crossings, now)
    moved.push(...switchDue(now))
    judgeStarted()
    giveUp(now)
    if (moved.length > 0 || anew || letGo) {
      if (!afterSwitching(now, moved)) return collapsed(now)
    } else if (crossings.length > 0 && !integrator.restart(now, stride)) return collapsed(now)
    judgeStarted()
    if (isOver()) return result({ kind: 'settled', at: now })
  }
}

function allWatches(courses: Courses): Watch[] {
  return [
    ...courses.buses.flatMap((bus) => [bus.deepest, bus.highest]),
    ...courses.starts.flatMap((start) => Object.values<Watch>(start.watches)),
    ...courses.running.flatMap((running) => Object.values<Watch>(running.watches)),
  ]
}

/** Error allowed in a step: speeds in parts of synchronous speed, integrals in parts of one second of locked rotor at rated voltage. */
function stepScale(system: System, tolerance: number): Float64Array {
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
  return scale
}

/** What counts as one whole on a plot of each channel. */
export function plotScales(system: System): Float64Array {
  const scale = new Float64Array(observationLength(system))
  system.plant.input.buses.forEach((bus, b) => {
    scale[b] = 0.1 * bus.nominal
  })
  system.plant.motors.forEach((motor, i) => {
    const current = motor.ratedPower / motor.ratedVoltage
    scale[placeOf(system, i, 'speed')] = motor.ratedSpeed
    scale[placeOf(system, i, 'torque')] = motor.ratedTorque
    scale[placeOf(system, i, 'loadTorque')] = motor.ratedTorque
    scale[placeOf(system, i, 'accelerating')] = motor.ratedTorque
    scale[placeOf(system, i, 'lineCurrent')] = 2 * current
    scale[placeOf(system, i, 'motorCurrent')] = 2 * current
    scale[placeOf(system, i, 'motorVoltage')] = motor.ratedVoltage
    scale[placeOf(system, i, 'active')] = 2 * motor.ratedPower
    scale[placeOf(system, i, 'reactive')] = 2 * motor.ratedPower
  })
  return scale
}
