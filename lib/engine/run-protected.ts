import { perUnit, radianPerSecond, type Second, second } from '../units/si'
import type { CaseInput, MotorInput } from './case-input'
import type { CaseResult, MotorResult, StartResult } from './case-result'
import { judgeProtection } from './judge-protection'
import type { ProtectionResult } from './protection/follow-protection'
import { heatBalances } from './protection/heat-balance'
import { runCase } from './run-case'

type Starting = Extract<MotorInput['duty'], { kind: 'starting' }>

/** A start by its motor and its place among the attempts; the last one counts. */
interface Trip {
  motorId: string
  attempt: number
  at: number
  after: Second
  protection: ProtectionResult
}

/** More trips than a plant's relays make in a run that anybody looks at. */
const mostTrips = 50

/** All attempts of a motor, the one that counts last. */
export const allAttempts = ({ earlierAttempts, start }: MotorResult): readonly StartResult[] =>
  start === null ? [] : [...(earlierAttempts ?? []), start]

/** The motor taken off the line by its relay: its attempt is shortened and its rest made longer, or its last start ended. */
function withTrip(motor: MotorInput, { attempt, after }: Trip): MotorInput {
  const duty = motor.duty as Starting
  const attempts = duty.attempts ?? []
  const one = attempts[attempt]
  if (!one) return { ...motor, duty: { ...duty, tripAt: after } }
  const shortened = { runFor: after, rest: second(one.rest + one.runFor - after) }
  return { ...motor, duty: { ...duty, attempts: attempts.with(attempt, shortened) } }
}

const tripped = (start: StartResult, { after, protection }: Trip): StartResult => {
  const { outcome } = start
  const abandoned = outcome.kind === 'abandoned'
  return {
    ...start,
    ...(abandoned && { outcome: { kind: 'tripped', cause: 'protection', at: after, speed: outcome.speed } }),
    protection,
  }
}

/** Puts what belongs to every attempt in its place. */
function withStarts(motor: MotorResult, change: (start: StartResult, attempt: number) => StartResult): MotorResult {
  if (motor.start === null) return motor
  const earlier = motor.earlierAttempts ?? []
  return {
    ...motor,
    start: change(motor.start, earlier.length),
    ...(earlier.length > 0 && { earlierAttempts: earlier.map(change) }),
  }
}

/**
 * Runs a case with the relays of its motors: where one operates before a start is over, the run is made again with the
 * motor taken off the line at that instant, the earliest first, until no relay operates on a start any more.
 */
export function runProtected(input: CaseInput): CaseResult {
  let run = input
  let result = runCase(run)
  const trips: Trip[] = []
  for (;;) {
    const found = judgeProtection(run, result)
    const next = trips.length < mostTrips ? earliest(run, found, trips) : null
    if (next === null) return withHeat(run, withProtection(result, found, trips))
    trips.push(next)
    run = { ...run, motors: run.motors.map((motor) => (motor.id === next.motorId ? withTrip(motor, next) : motor)) }
    result = runCase(run)
  }
}

/**
 * Judges a run that is not made again: a relay that operates on its start ends it as far as the outcome goes, while
 * curves and figures are those of the start without the relay.
 */
export function protectOnce(input: CaseInput, result: CaseResult): CaseResult {
  const judged = judgeProtection(input, result)
  const found = withHeat(input, withProtection(result, judged, []))
  const { time, motors: curves } = result.series
  const motors = found.motors.map((motor) =>
    withStarts(motor, (start) => {
      const ended = start.protection?.endedAt
      if (!ended) return start
      const sample = Math.max(
        0,
        time.findLastIndex((t) => t <= ended.run),
      )
      const speed = radianPerSecond(curves[motor.motorId]?.speed[sample] ?? 0)
      return { ...start, outcome: { kind: 'tripped', cause: 'protection', at: ended.start, speed } }
    }),
  )
  return { ...found, motors }
}

type Judged = ReadonlyMap<string, readonly ProtectionResult[]>

/** The first start that a relay ends: an attempt before it is switched off, or one that would have gone on by itself. */
function earliest(input: CaseInput, judged: Judged, trips: readonly Trip[]): Trip | null {
  const all = input.motors.flatMap(({ id, duty }): Trip[] => {
    if (duty.kind !== 'starting') return []
    return (judged.get(id) ?? []).flatMap((protection, attempt): Trip[] => {
      if (trips.some((trip) => trip.motorId === id && trip.attempt === attempt)) return []
      return protection.endedAt === undefined
        ? []
        : [{ motorId: id, attempt, at: protection.endedAt.run, after: protection.endedAt.start, protection }]
    })
  })
  return all.reduce<Trip | null>((first, trip) => (first === null || trip.at < first.at ? trip : first), null)
}

function withProtection(result: CaseResult, judged: Judged, trips: readonly Trip[]): CaseResult {
  if (judged.size === 0) return result
  const motors = result.motors.map((motor) => {
    const own = judged.get(motor.motorId)
    return own === undefined
      ? motor
      : withStarts(motor, (start, attempt) => {
          const trip = trips.find((one) => one.motorId === motor.motorId && one.attempt === attempt)
          const protection = own[attempt]
          if (trip) return tripped(start, trip)
          return protection ? { ...start, protection } : start
        })
  })
  return { ...result, motors }
}

/** Adds the heat that starts leave to one another. */
function withHeat(input: CaseInput, result: CaseResult): CaseResult {
  let changed = false
  const motors = result.motors.map((motor) => {
    const one = input.motors.find(({ id }) => id === motor.motorId)
    const balances = one ? balancesOf(one, motor) : null
    if (balances === null) return motor
    changed = true
    return withStarts(motor, (start, attempt) => {
      const heatBalance = balances[attempt]!
      const { running, before, after } = heatBalance
      const base = start.heatUsed.state === 'hot' ? (running ?? 0) : 0
      // In parts of what is left above the state that the start is judged from.
      const carried = attempt > 0 ? { withEarlier: perUnit((after - base) / (1 - base)) } : {}
      return { ...start, heatUsed: { ...start.heatUsed, ...(before > 0 && carried) }, heatBalance }
    })
  })
  return changed ? { ...result, motors } : result
}

function balancesOf({ declared, duty }: MotorInput, motor: MotorResult) {
  const { thermal, permissibleTime } = declared
  if (thermal === undefined || permissibleTime === null || duty.kind !== 'starting') return null
  const starts = allAttempts(motor)
  const used = starts.flatMap(({ heatUsed, switchedOnAt, timeToCriterion, outcome }, k) => {
    if (heatUsed.figure === null) return []
    const { runFor, rest } = duty.attempts?.[k] ?? { runFor: null, rest: 0 }
    const off = switchedOnAt + (runFor ?? timeToCriterion ?? 0)
    const next = starts[k + 1]?.switchedOnAt
    const complete = outcome.kind === 'started'
    const lasts = timeToCriterion ?? runFor ?? 0
    return [{ used: heatUsed.figure, lasts, rest: next === undefined ? rest : next - off, complete }]
  })
  return used.length === starts.length ? heatBalances(thermal, permissibleTime.state, used) : null
}
