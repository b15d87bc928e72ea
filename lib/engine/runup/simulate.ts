import { type Complex, radianPerSecond, second } from '../../units/si'
import { pieceAt } from '../driven/load-segments'
import { createIntegrator } from '../numeric/dormand-prince'
import { findRoot } from '../numeric/root'
import { attemptEnd, endAttempts } from './attempts'
import { type BeforeStart, supplyPower, weakestBus } from './before-start'
import { breakdownSpeedNow } from './breakdown-speed'
import { contactorInstants, noteVoltage, switchContactors, tripContactors } from './contactor'
import { type Courses, type StartCourse, untilOf } from './course'
import { type Crossing, firstCrossings } from './crossing'
import { createDisturbance } from './disturbance'
import { noteGenerator } from './generator-course'
import { findBalance, findHang, hangOutcome } from './hang'
import { busVoltages, motorState, placeOf } from './observation'
import { createRecorder } from './recorder'
import type { SampleStore } from './sampler'
import {
  advance,
  awaitsCapacitor,
  isForlorn,
  latestEnd,
  type Move,
  nextInstant,
  rampEnd,
  sameInstant,
  switchCapacitor,
  switchDue,
} from './schedule'
import { stepScale } from './step-scale'
import { protectionDue, trip, tripProtected } from './trip'

/** How a run ended. */
export type RunEnd =
  /** Every start over and every shaft at rest or at its balance. */
  | { kind: 'settled'; at: number }
  /** Time ran out with shafts still on their way. */
  | { kind: 'horizon'; at: number }
  | { kind: 'collapsed'; at: number; busId: string | null }

export interface RunRecord {
  end: RunEnd
  samples: SampleStore
  /** Just after the first switching-on; null when the network had no solution there or nothing was started. */
  first: Float64Array | null
  /** From the source into the supply's bus at that instant, W and var. */
  firstPower: Complex | null
  state: Float64Array
  counters: { steps: number; rejected: number; evaluations: number; largestErrorRatio: number; largestMismatch: number }
}

/** Longest step, s. */
const longest = 1
/** Within this time of a switching, s, rotor fluxes build up and swing, and the torque is not yet that of the speed. */
const fluxTime = 0.2
/** Torque left, in parts of rated, below which a shaft counts as settled, and as worth a look for a hang. */
const settledTorque = 1e-5

/** Torques left, in parts of rated, below which a plant may be wavering about its balance; steps after which that is looked at. */
const waveringTorque = 1e-2
const patientSteps = 60
const hangingTorque = 4e-3
/** No run of a plant needs so many steps; a caller is not kept waiting for one that does. */
const mostSteps = 400_000
/** Speed in parts of synchronous at which a run ends: the load has run away. */
const farthest = 3
const nobody: ReadonlySet<number> = new Set()

/**
 * Runs a plant up from its state before the start.
 *
 * J·dω/dt = T(ω, U) − T_L(ω) for every shaft, the network solved in every evaluation; integrated with error control,
 * begun anew at every switching, corner of a load curve and halt, which are located first.
 */
export function simulate(before: BeforeStart, courses: Courses): RunRecord {
  const { system } = before
  const { plant } = system
  const { starts } = courses
  const { timeLimit, tolerance } = plant.input.settings
  const state = Float64Array.from(before.speeds)
  for (const { motor } of starts) {
    const { duty } = plant.motors[motor]!
    if (duty.kind === 'starting' && system.resting[motor]) state[motor] = duty.initialSpeed ?? 0
  }
  const integrator = createIntegrator(state, system.derivative, stepScale(system, tolerance), longest)
  const recorder = createRecorder(system, courses, integrator)
  const { now } = recorder
  const scratch = new Float64Array(system.stateLength)
  const supplied = courses.generator !== null
  const disturbance = createDisturbance(system, state)
  let first: Float64Array | null = null
  let firstPower: Complex | null = null
  let waveringSteps = 0
  let lastHangTorque = Number.POSITIVE_INFINITY

  function result(end: RunEnd): RunRecord {
    const { largestMismatch, samples } = recorder
    return { end, samples, first, firstPower, state, counters: { ...integrator.counters, largestMismatch } }
  }

  const collapsed = (t: number): RunRecord => result({ kind: 'collapsed', at: t, busId: weakestBus(system) })

  const held = (i: number): boolean =>
    system.resting[i] === 1 && plant.mates[i]!.some((m) => system.connection.code[m] !== 0)
  /** Shafts that nothing holds at rest: active loads, and those that turn already. */
  const unheld = (i: number): boolean => system.driven[i]!.active || state[i] !== 0

  /** Lets go every resting shaft whose torque exceeds what holds it, but those that have just halted; after `solveAt`. */
  function release(halted: ReadonlySet<number>): void {
    for (let i = 0; i < plant.motors.length; i++) {
      if (!held(i) || halted.has(i) || (!unheld(i) && system.balance(i, 0) <= 0)) continue
      for (const m of plant.mates[i]!) {
        system.resting[m] = 0
        system.piece[m] = pieceAt(system.driven[m]!, state[m]!)
        const start = starts.find((each) => each.motor === m)
        if (start) start.turned = true
      }
    }
  }

  /** Solves anew after switchings and notes the state just after them; false where the network has no solution. */
  function afterSwitching(t: number, moved: readonly Move[], halted: ReadonlySet<number> = nobody): boolean {
    lastHangTorque = Number.POSITIVE_INFINITY
    system.setTime(t)
    if (system.fluxModel !== null) watchTorques(t)
    if (!system.solveAt(state)) return false
    release(halted)
    if (!recorder.begin(t)) return false
    if (first === null) {
      first = Float64Array.from(now)
      firstPower = supplyPower(system, before.source)
    }
    if (courses.generator !== null && !noteGenerator(system, courses.generator, now, state, t)) return false
    for (const move of moved) {
      const { start } = move
      if (start.standstill === null && !move.off) start.standstill = motorState(system, now, start.motor)
      else noteChangeOver(move, t)
    }
    return integrator.restart(t, 0)
  }

  function noteChangeOver({ start, capacitor }: Move, t: number): void {
    const { motor, position } = start
    const capacitorState = capacitor === null ? null : start.capacitors[capacitor]!.state
    const transferred = capacitor === null && (position === 'running' || position === 'rotor')
    courses.changeOvers.push({
      motorId: plant.motors[motor]!.id,
      at: second(t),
      to: capacitorState === null ? position : capacitorState === 'in' ? 'capacitor-in' : 'capacitor-out',
      speed: radianPerSecond(state[motor]!),
      state: motorState(system, now, motor),
      busVoltages: busVoltages(system, now),
      tooEarly: transferred && state[motor]! < breakdownSpeedNow(system, motor),
    })
  }

  function judgeStarted(): void {
    for (const start of starts) {
      if (start.outcome !== null || start.runningAt === null || start.atCriterion === null) continue
      start.outcome = { kind: 'started', at: second(Math.max(start.runningAt, start.atCriterion) - start.at) }
    }
  }

  function giveUp(t: number): void {
    const late = starts.filter(
      (start) => start.switchedOn && start.outcome === null && t >= start.at + timeLimit - sameInstant,
    )
    if (late.length === 0) return
    judgeHanging(late)
    for (const start of late)
      if (system.resting[start.motor]) start.outcome ??= system.steadily(() => hangOutcome(system, start, state))
    for (const start of late) start.outcome ??= { kind: 'timed-out', speed: radianPerSecond(state[start.motor]!) }
  }

  /** Acts on crossings at the present instant: the starts that changed over and the shafts that halted. */
  function act(crossings: readonly Crossing[], t: number): { moved: Move[]; halted: Set<number>; stood: boolean } {
    const moved: Move[] = []
    const halted = new Set<number>()
    let stood = false
    for (const { motor, kind, capacitor } of crossings) {
      if (kind === 'corner-up') system.piece[motor] = system.piece[motor]! + 1
      if (kind === 'corner-down') system.piece[motor] = system.piece[motor]! - 1
      if (kind === 'halt' || kind === 'stand') {
        for (const m of plant.mates[motor]!) {
          system.resting[m] = 1
          system.piece[m] = 0
          if (kind === 'halt') halted.add(m)
        }
        if (kind === 'stand') stood = true
      }
      const running = courses.running.find((each) => each.motor === motor)
      const contactor = running?.contactor ?? starts.find((each) => each.motor === motor)?.contactor
      if (contactor && kind === 'contactor') noteVoltage(contactor, t)
      if (running && kind === 'pull-out') running.pulledOutAt = t
      if (running && kind === 'recovery') running.pulledOutAt = null
      const start = starts.find((each) => each.motor === motor)
      if (start && kind === 'at-95') {
        start.at95 = t
        start.watches.accelerating.active = false
      }
      if (start && kind === 'criterion') {
        const at = system.integral[motor]!
        start.atCriterion = t
        start.i2t = state[at]!
        start.slipEnergy = state[at + 1]!
        start.extraAtCriterion = start.extraHeat
      }
      if (start && kind === 'change-over') moved.push(advance(system, start, t))
      if (start && kind === 'capacitor') moved.push(switchCapacitor(system, start, capacitor))
      if (start && kind === 'undervoltage') moved.push(trip(system, start, 'undervoltage', state[motor]!, t))
    }
    return { moved, halted, stood }
  }

  /** Instant in the last step at which a resting shaft is let go, or null. */
  function releaseInstant(): number | null {
    let earliest: number | null = null
    for (let i = 0; i < plant.motors.length; i++) {
      system.setTime(integrator.time)
      if (!held(i) || !system.solveAt(state) || system.balance(i, 0) <= 0) continue
      const surplus = (t: number): number => {
        system.setTime(t)
        integrator.interpolate(t, scratch)
        return system.solveAt(scratch) ? system.balance(i, 0) : -1
      }
      const { from, time } = integrator
      const atFrom = surplus(from)
      // A surplus all through the step is that of a shaft that has just come to rest: it is let go at the end, not at once again.
      const t = atFrom >= 0 ? time : findRoot(surplus, from, time, 1e-9, atFrom)
      if (earliest === null || t < earliest) earliest = t
    }
    return earliest
  }

  /** Largest torque left on a shaft at the last instant observed, in parts of rated. */
  function restlessness(): number {
    let most = 0
    for (let i = 0; i < plant.motors.length; i++) {
      if (system.resting[i]) continue
      most = Math.max(most, Math.abs(now[placeOf(system, i, 'accelerating')]!) / plant.ratedTorque[i]!)
    }
    return most
  }

  /** Whether the plant has come to rest. About its balance an explicit method may waver for as long as it is let: then the balance itself is looked for. */
  function isSettled(torque: number): boolean {
    if (torque < settledTorque) return true
    waveringSteps = torque < waveringTorque ? waveringSteps + 1 : 0
    if (waveringSteps < patientSteps || waveringSteps % patientSteps !== 0) return false
    const balance = findBalance(system, state, 1e-4)
    if (balance !== null) state.set(balance)
    return balance !== null
  }

  /** Whether the run is over: starts resolved and shafts settled, or every open start hanging. */
  function isOver(t: number): boolean {
    if (starts.some((start) => untilOf(start)?.kind === 'after' || (!start.switchedOn && !isForlorn(start))))
      return false
    if (starts.some((start) => attemptEnd(start) !== null || protectionDue(start) !== null)) return false
    if (disturbance.nextAt() !== null) return false
    if (contactorInstants(courses).some((due) => due !== null)) return false
    if (starts.some((start) => awaitsCapacitor(start, t))) return false
    const torque = restlessness()
    const open = starts.filter((start) => start.outcome === null && start.switchedOn)
    // A start that was given up goes on turning: there is no settled plant to wait for.
    const givenUp = starts.some(({ outcome }) => outcome?.kind === 'timed-out' || outcome?.kind === 'tripped')
    const settled = isSettled(torque)
    if (open.length === 0) return givenUp || (settled && isSupplyCalm())
    const waits = open.some((start) => untilOf(start)?.kind === 'time' || rampEnd(start) > t)
    if (waits || torque > hangingTorque || torque > lastHangTorque / 2 || !isSupplyCalm()) return false
    lastHangTorque = torque
    judgeHanging(open)
    return open.every((start) => start.outcome !== null) && settled
  }

  function isSupplyCalm(): boolean {
    if (!system.supply?.generator) return true
    return system.derivative(integrator.time, state, scratch) && system.supply.isCalm(scratch)
  }

  /** A shaft still held at rest that goes once the fluxes of its motor stand; after a steady solution that this makes. */
  function startsByItself(open: readonly StartCourse[]): boolean {
    if (system.fluxModel === null || !system.solveAt(state)) return false
    return open.some(({ motor }) => held(motor) && system.balance(motor, 0) > 0)
  }

  /** The torque of a start is looked at once the swing of its fluxes has died away, or half way up. */
  function watchTorques(t: number): void {
    for (const start of starts) {
      const calm = t >= start.since + fluxTime || state[start.motor]! >= start.speed95 / 2
      if (start.switchedOn) start.watches.accelerating.active = start.at95 === null && calm
    }
  }

  /** Resolves starts that have come to where they stay short of their goal. */
  function judgeHanging(open: readonly StartCourse[]): void {
    system.steadily(() => {
      if (startsByItself(open)) return
      const speeds = findHang(system, open, state)
      if (speeds !== null) for (const start of open) start.outcome = hangOutcome(system, start, speeds)
    })
  }

  /** Passes over time in which nothing moves, up to the next instant; false where something does move. */
  function skipStillness(t: number, until: number): boolean {
    const moves =
      system.fluxModel !== null || supplied || starts.some((start) => start.position === 'open' || rampEnd(start) > t)
    if (until - t <= longest || restlessness() > settledTorque || moves) return false
    const speeds = findBalance(system, state, 1e-5)
    if (speeds === null) return false
    state.set(speeds)
    if (!system.derivative(t, state, scratch)) return false
    for (const at of system.integral) {
      if (at < 0) continue
      state[at] = state[at]! + scratch[at]! * (until - t)
      state[at + 1] = state[at + 1]! + scratch[at + 1]! * (until - t)
    }
    return integrator.restart(until, 0) && recorder.begin(until)
  }

  const otherInstants = (): (number | null)[] => [
    disturbance.nextAt(),
    ...starts.map(attemptEnd),
    ...starts.map(protectionDue),
    ...contactorInstants(courses),
  ]

  /** An active load that the motor cannot hold drives its shaft beyond any speed that its curve means. */
  const runsAway = (): boolean =>
    plant.driven.some((load, i) => load.active && Math.abs(state[i]!) > farthest * plant.synchronous[i]!)

  system.piece.set(plant.driven.map((load, i) => pieceAt(load, state[i]!)))
  system.begin(state)
  if (!recorder.begin(0)) return collapsed(0)
  if (starts.length === 0 && disturbance.nextAt() === null) return result({ kind: 'settled', at: 0 })
  const firstAt = Math.min(
    disturbance.nextAt() ?? Number.POSITIVE_INFINITY,
    ...starts.filter(({ former }) => former === null).map((start) => start.at),
  )
  const horizon = latestEnd(starts, disturbance.endsAt, timeLimit)
  if (firstAt > 0 && !recorder.begin(firstAt)) return collapsed(firstAt)
  for (const bus of courses.buses) bus.deepest.active = true
  disturbance.act(firstAt)
  if (!afterSwitching(firstAt, switchDue(system, starts, firstAt))) return collapsed(firstAt)

  for (;;) {
    const from = integrator.time
    if (from >= horizon || integrator.counters.steps > mostSteps || runsAway())
      return result({ kind: 'horizon', at: from })
    const until = nextInstant(starts, otherInstants(), from, timeLimit, horizon)
    let crossings: Crossing[] = []
    let letGo = false
    let stride = 0
    if (!skipStillness(from, until)) {
      if (integrator.advance(until) === 'blocked') return collapsed(integrator.time)
      stride = integrator.nextStep
      const released = releaseInstant()
      crossings = firstCrossings(system, courses, integrator)
      const crossed = crossings[0]?.at ?? Number.POSITIVE_INFINITY
      letGo = released !== null && released < crossed
      if (letGo) crossings = []
      if (released !== null && letGo) integrator.cutAt(released)
      else if (crossings.length > 0) integrator.cutAt(crossed)
      // The crossed speed itself, so that a shaft that halts stands still exactly.
      for (const { motor, speed } of crossings)
        if (speed !== null) for (const m of plant.mates[motor]!) state[m] = speed
      if (!recorder.follow(!letGo && crossings.length === 0)) return collapsed(integrator.time)
    }
    const t = integrator.time
    if (system.fluxModel !== null) watchTorques(t)
    for (const start of starts) noteHeat(start, state[system.integral[start.motor]!]!)
    const { moved, halted, stood } = act(crossings, t)
    moved.push(...endAttempts(system, courses, state, t))
    moved.push(...switchDue(system, starts, t))
    judgeStarted()
    // A start that another waited for lets it go at the same instant.
    moved.push(...switchDue(system, starts, t))
    const disturbed = disturbance.act(t)
    const contactors = switchContactors(system, courses.running, t)
    moved.push(...tripContactors(system, starts, state, t))
    moved.push(...tripProtected(system, starts, state, t))
    giveUp(t)
    if (moved.length > 0 || halted.size > 0 || letGo || stood || disturbed || contactors) {
      if (!afterSwitching(t, moved, halted)) return collapsed(t)
      judgeStarted()
    } else if (starts.some((start) => Math.abs(rampEnd(start) - t) < sameInstant)) {
      if (!afterSwitching(t, [])) return collapsed(t)
    } else if (crossings.length > 0 && !integrator.restart(t, stride)) return collapsed(t)
    if (isOver(t)) return result({ kind: 'settled', at: t })
  }
}

/** Adds what the last stretch heated the winding beyond the integral of the terminal current. */
function noteHeat(start: StartCourse, i2t: number): void {
  start.extraHeat += ((start.steps[start.step]?.heat ?? 1) - 1) * (i2t - start.i2tSeen)
  start.i2tSeen = i2t
}
