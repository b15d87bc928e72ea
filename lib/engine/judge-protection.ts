import { second } from '../units/si'
import type { CaseInput, MotorInput } from './case-input'
import type { CaseResult, MotorResult, StartResult } from './case-result'
import type { CurrentRecord } from './protection/current-record'
import { followProtection, limitMargin, type ProtectionResult, type StartWindow } from './protection/follow-protection'
import { limitPoints, permissibleTime } from './protection/permissible-time'
import { leastOf } from './protection/steady-time'

/** A start that stays where it is, running or hanging, so that its current goes on after the run. */
const staying: ReadonlySet<StartResult['outcome']['kind']> = new Set([
  'started',
  'not-transferred',
  'below-criterion',
  'stalled',
  'never-turned',
])

/** The starts of a motor as windows of the run. */
function windowsOf(motor: MotorInput, starts: readonly StartResult[], end: number): StartWindow[] {
  const attempts = (motor.duty.kind === 'starting' && motor.duty.attempts) || []
  return starts.map(({ switchedOnAt: from, outcome }, k) => {
    const runFor = attempts[k]?.runFor
    const switchedOff = outcome.kind === 'tripped' || outcome.kind === 'abandoned' ? from + outcome.at : end
    const off = runFor === undefined ? switchedOff : from + runFor
    const over = outcome.kind === 'started' ? Math.min(off, from + outcome.at) : off
    return { from, over, off, stays: k === starts.length - 1 && staying.has(outcome.kind) }
  })
}

/** With the rotor held a ramped device comes to its largest current; others draw that of standstill. */
function heldCurrents(motor: MotorInput, { standstill, peakLineCurrent, peakMotorCurrent }: StartResult) {
  const kind = motor.duty.kind === 'starting' ? motor.duty.starter.kind : 'direct'
  return kind === 'soft-starter' || kind === 'drive'
    ? { line: peakLineCurrent.current, motor: peakMotorCurrent.current }
    : { line: standstill.lineCurrent, motor: standstill.motorCurrent }
}

/** How the relay of one motor takes its starts, the one that counts last; null where it has none or the run has no curve. */
function judgeMotor(motor: MotorInput, result: MotorResult, series: CaseResult['series']): ProtectionResult[] | null {
  const { protection, declared } = motor
  const currents = series.motors[motor.id]
  if (protection === undefined || result.start === null || currents === undefined || series.time.length < 2) return null
  const starts = [...(result.earlierAttempts ?? []), result.start]
  const side = protection.measures
  const current = side === 'line' ? currents.lineCurrent : currents.motorCurrent
  const record: CurrentRecord = { time: series.time, current }
  const windows = windowsOf(motor, starts, series.time.at(-1)!)
  const held = starts.map((start) => heldCurrents(motor, start))
  const startedAt = starts.map(({ outcome, switchedOnAt }) =>
    outcome.kind === 'started' ? switchedOnAt + outcome.at : null,
  )
  const followed = followProtection(
    protection,
    record,
    windows,
    held.map((one) => one[side]),
    startedAt,
  )
  const state = declared.permissibleTime?.state ?? 'hot'
  const points = declared.thermal ? limitPoints(declared.thermal, state, declared.lockedRotorCurrent) : []
  return followed.map((own, k): ProtectionResult => {
    const heats = own.elements.map(({ heat }) => heat?.before ?? 0)
    const margin = (relay: number, atMotor: number) =>
      limitMargin(protection.elements, heats, relay, atMotor, permissibleTime(points, atMotor))
    const { line, motor: atMotor } = held[k]!
    const curve = points.map((point) => margin(point.current, point.current))
    const closest = curve.reduce<(typeof curve)[number] | null>(
      (least, one) => (least === null || order(one.margin) < order(least.margin) ? one : least),
      null,
    )
    const { kind } = starts[k]!.outcome
    const first = leastOf(own.elements.map(({ operatesAt }) => operatesAt))
    const window = windows[k]!
    // A start that hangs keeps its own outcome; the instant of the trip stands beside it.
    const ends =
      first !== null &&
      window.from + first < window.over &&
      (k < starts.length - 1 || kind === 'started' || kind === 'timed-out')
    return {
      ...own,
      lockedRotor: margin(side === 'line' ? line : atMotor, atMotor),
      ...(points.length > 1 && closest !== null && { limitCurve: closest }),
      ...(ends && { endedAt: { run: second(window.from + first), start: second(first) } }),
    }
  })
}

/** No trip at all is worse than any margin. */
const order = (margin: number | null): number => margin ?? Number.NEGATIVE_INFINITY

/** How the relays of a case take its starts, by motor. Empty where no motor has one. */
export function judgeProtection(
  { motors }: CaseInput,
  { motors: results, series }: Pick<CaseResult, 'motors' | 'series'>,
): ReadonlyMap<string, readonly ProtectionResult[]> {
  const judged = new Map<string, readonly ProtectionResult[]>()
  for (const motor of motors) {
    const result = results.find(({ motorId }) => motorId === motor.id)
    const own = result && motor.protection ? judgeMotor(motor, result, series) : null
    if (own !== null) judged.set(motor.id, own)
  }
  return judged
}
