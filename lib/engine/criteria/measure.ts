import { type Second, second } from '../../units/si'
import { type CaseInput, isTabulated, type MotorInput } from '../case-input'
import type { CaseResult, MotorResult, PlaceResult } from '../case-result'
import { runningUnder, startsUnder } from './applies'
import type { NotAssessedReason, RuleInput, RuleInstant, RuleReference } from './rule'

/** One figure that a rule is held against. */
export interface Measured {
  kind: 'value'
  value: number
  busId: string | null
  motorId: string | null
  at: Second | null
}

/** What the rule asks for was not reached at all, and that is worse than any figure. */
export interface Missed {
  kind: 'missed'
  busId: string | null
  motorId: string | null
}

export interface Unknown {
  kind: 'unknown'
  reason: NotAssessedReason
  busId: string | null
  motorId: string | null
}

export type Measurement = Measured | Missed | Unknown

/** A place with a voltage: a bus, or a motor's terminals. */
export interface VoltagePlace {
  place: PlaceResult
  motor: MotorInput | null
  result: MotorResult | null
}

/** The buses or motors that a rule looks at; null when the case does not have them. */
export function voltagePlaces(rule: RuleInput, input: CaseInput, result: CaseResult): VoltagePlace[] | null {
  const ruled = rule.place
  if (ruled.kind === 'every-bus') return result.places.map((place) => ({ place, motor: null, result: null }))
  if (ruled.kind === 'bus') {
    const place = result.places.find(({ busId }) => busId === ruled.busId)
    return place ? [{ place, motor: null, result: null }] : null
  }
  const motors = ruled.kind === 'starting-motors' ? startsUnder(rule, input) : runningUnder(rule, input)
  const places = motors.flatMap((motor): VoltagePlace[] => {
    const place = result.places.find(({ busId }) => busId === motor.busId)
    const own = result.motors.find(({ motorId }) => motorId === motor.id)
    return place && own ? [{ place, motor, result: own }] : []
  })
  return places.length === motors.length ? places : null
}

/** Voltage that a change or a remaining voltage is a part of. */
export function referenceVoltage({ place, motor }: VoltagePlace, reference: RuleReference): number {
  if (reference === 'before') return place.before
  return reference === 'rated' && motor !== null ? motor.ratedVoltage : place.nominal
}

interface Reading {
  voltage: number
  at: Second | null
}

/** Voltage at a place and instant; null when that state was not reached. A motor's own terminals count before those of its bus. */
function voltageAt({ place, result }: VoltagePlace, instant: RuleInstant, firstAt: Second): Reading | null {
  if (instant === 'settled-after-start' || instant === 'settled-after-process') {
    const settled = instant === 'settled-after-start' ? place.settledAfterStart : place.settledAfterProcess
    return settled === null ? null : { voltage: settled, at: null }
  }
  if (instant === 'first') {
    const start = result?.start
    return start
      ? { voltage: start.standstill.motorVoltage, at: start.switchedOnAt }
      : { voltage: place.first, at: firstAt }
  }
  return result?.start?.lowestMotorVoltage ?? result?.running?.lowestVoltage ?? place.deepest
}

function voltageFigure(rule: RuleInput, place: VoltagePlace, firstAt: Second): Measurement {
  const where = { busId: place.place.busId, motorId: place.motor?.id ?? null }
  const reference = referenceVoltage(place, rule.reference)
  if (rule.quantity === 'highest-voltage') {
    const { highest, settledAfterStart, settledAfterProcess } = place.place
    const settled = Math.max(settledAfterStart ?? 0, settledAfterProcess ?? 0)
    const value = Math.max(highest.voltage, settled) / reference
    return { kind: 'value', value, ...where, at: settled > highest.voltage ? null : highest.at }
  }
  const reading = voltageAt(place, rule.instant, firstAt)
  if (reading === null) return { kind: 'unknown', reason: 'state-not-reached', ...where }
  const value =
    rule.quantity === 'voltage-change'
      ? (place.place.before - reading.voltage) / reference
      : reading.voltage / reference
  return { kind: 'value', value, ...where, at: reading.at }
}

function startFigure(rule: RuleInput, motor: MotorInput, result: MotorResult | undefined): Measurement {
  const where = { busId: null, motorId: motor.id }
  const start = result?.start
  if (!start) return { kind: 'unknown', reason: 'state-not-reached', ...where }
  const started = start.outcome.kind === 'started'
  if (rule.quantity === 'run-up-time') {
    if (start.outcome.kind !== 'started') return { kind: 'missed', ...where }
    return { kind: 'value', value: start.outcome.at, ...where, at: second(start.switchedOnAt + start.outcome.at) }
  }
  if (rule.quantity === 'accelerating-torque') {
    // A circuit cannot show a saddle below breakdown: with one declared, only typed torque can be held against the limit.
    const typed = isTabulated(motor.circuit) || motor.circuit.torqueCurve !== undefined
    if (!typed && (motor.declared.pullUpTorque ?? null) !== null)
      return { kind: 'unknown', reason: 'no-pull-up-data', ...where }
    return { kind: 'value', value: start.leastAccelerating.ofRated, ...where, at: null }
  }
  const figure = start.heatUsed.withEarlier ?? start.heatUsed.figure
  if (figure === null) return { kind: 'unknown', reason: 'not-declared', ...where }
  // Heat goes on growing in a start that does not end: a figure inside the limit then says nothing.
  const limit = rule.limit.kind === 'value' ? rule.limit.value : 0
  if (!started && figure <= limit) return { kind: 'unknown', reason: 'state-not-reached', ...where }
  return { kind: 'value', value: figure, ...where, at: null }
}

/** Margin of a start to a trip, or of a trip to what the held rotor bears; the worst attempt speaks. */
function protectionFigure(rule: RuleInput, motor: MotorInput, result: MotorResult | undefined): Measurement {
  const where = { busId: null, motorId: motor.id }
  const starts = result?.start ? [...(result.earlierAttempts ?? []), result.start] : []
  const known = starts.flatMap(({ protection }) => protection ?? [])
  if (starts.length === 0) return { kind: 'unknown', reason: 'state-not-reached', ...where }
  if (known.length < starts.length) return { kind: 'unknown', reason: 'no-protection', ...where }
  const values: (number | null)[] = known.map(({ tripMargin, lockedRotor }) =>
    rule.quantity === 'trip-margin' ? tripMargin : lockedRotor.margin,
  )
  if (rule.quantity === 'trip-margin') {
    const released = known.every(({ elements }) => elements.every((one) => one.inhibitedFor === undefined))
    if (!released || known.at(-1)!.startedAt === null) return { kind: 'missed', ...where }
  } else {
    if (known.some(({ lockedRotor }) => lockedRotor.permissible === null))
      return { kind: 'unknown', reason: 'not-declared', ...where }
    // A held rotor that no element takes off is not protected at all.
    if (known.some(({ lockedRotor }) => lockedRotor.trip === null)) return { kind: 'missed', ...where }
  }
  const found = values.filter((value) => value !== null)
  if (found.length === 0) return { kind: 'unknown', reason: 'no-pick-up', ...where }
  return { kind: 'value', value: Math.min(...found), ...where, at: null }
}

/** Severities at the places of a rule. */
function flickerFigures(rule: RuleInput, result: CaseResult): Measurement[] {
  const { place } = rule
  const all = result.flicker ?? []
  const found = place.kind === 'bus' ? all.filter(({ busId }) => busId === place.busId) : all
  if (found.length === 0) {
    const busId = place.kind === 'bus' ? place.busId : null
    return [{ kind: 'unknown', reason: 'state-not-reached', busId, motorId: null }]
  }
  return found.map(({ busId, shortTerm, longTerm }) => {
    const value = rule.quantity === 'flicker-short-term' ? shortTerm.meter : longTerm.meter
    return { kind: 'value', value, busId, motorId: null, at: null }
  })
}

/** Every figure of a case that a rule with a single value is held against. */
export function measure(rule: RuleInput, input: CaseInput, result: CaseResult): Measurement[] {
  if (rule.quantity === 'run-up-time' || rule.quantity === 'accelerating-torque' || rule.quantity === 'heat-used') {
    return startsUnder(rule, input).map((motor) =>
      startFigure(
        rule,
        motor,
        result.motors.find(({ motorId }) => motorId === motor.id),
      ),
    )
  }
  if (rule.quantity === 'trip-margin' || rule.quantity === 'thermal-margin') {
    return startsUnder(rule, input).map((motor) =>
      protectionFigure(
        rule,
        motor,
        result.motors.find(({ motorId }) => motorId === motor.id),
      ),
    )
  }
  if (rule.quantity === 'flicker-short-term' || rule.quantity === 'flicker-long-term')
    return flickerFigures(rule, result)
  const places = voltagePlaces(rule, input, result)
  if (places === null) {
    const busId = rule.place.kind === 'bus' ? rule.place.busId : null
    return [{ kind: 'unknown', reason: 'place-not-in-case', busId, motorId: null }]
  }
  const firstAt = firstSwitching(input)
  return places.map((place) => voltageFigure(rule, place, firstAt))
}

/** Instant of the first switching-on or disturbance of a case; 0 when nothing happens. Starts that wait for others come later. */
export function firstSwitching({ motors, disturbance }: CaseInput): Second {
  const starts = motors.flatMap(({ duty }) => (duty.kind === 'starting' && !duty.after ? [duty.at] : []))
  const instants = disturbance ? [disturbance.at, ...starts] : starts
  return second(instants.length === 0 ? 0 : Math.min(...instants))
}
