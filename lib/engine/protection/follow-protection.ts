import { type Ampere, ampere, type PerUnit, perUnit, type Second, second } from '../../units/si'
import type { ProtectionInput, RelayElement } from '../protection-input'
import { type CurrentRecord, splitAt } from './current-record'
import { type ElementCourse, elementCourse } from './element-course'
import { leastOf, steadyTime } from './steady-time'
import { restBefore } from './thermal-image'

/** One start within a run, case time in s. */
export interface StartWindow {
  from: number
  /** When it has started or is switched off; the end of the run where neither comes. */
  over: number
  /** When the motor is off the line again; the end of the run where it stays on. */
  off: number
  /** Whether the current at the end of the run goes on: a start that runs or hangs. */
  stays: boolean
}

/** How one element takes a start; times from the motor's own switching-on. */
export interface ElementResult {
  kind: RelayElement['kind']
  /** Operates while the motor is on, on the way or later; beyond the run where the current at its end would make it. */
  operatesAt: Second | null
  /** Least time that it still needs, at any instant of the start, if the current of that instant stayed. */
  least: { time: Second; at: Second } | null
  /** Time to operate with the rotor held, from its state at switching-on. */
  lockedRotor: Second | null
  /** Heat of a thermal image before and after, in parts of that which operates. */
  heat?: { before: PerUnit; after: PerUnit }
  /** Rest that it asks for before it releases this start; 0 or left out where it does. */
  inhibitedFor?: Second
}

/** How the relay of a feeder takes one start. */
export interface ProtectionResult {
  elements: readonly ElementResult[]
  /** When the start is over without a trip, from switching-on; null where it never is. */
  startedAt: Second | null
  /** Least time left to a trip over all elements, below zero where one operates first; null where none picks up or nothing starts. */
  tripMargin: Second | null
  /** The rotor held at the voltage of this start. */
  lockedRotor: LimitMargin
  /** When it ends the start, in case time and from switching-on; left out where it does not. */
  endedAt?: { run: Second; start: Second }
  /** Where trip and thermal limit come closest over the points of the limit; left out where there is no curve. */
  limitCurve?: LimitMargin
}

/** Trip against permissible time at one current; null where there is none. */
export interface LimitMargin {
  current: Ampere
  trip: Second | null
  permissible: Second | null
  /** Permissible time less time to trip. */
  margin: Second | null
}

/** What an element does over the windows of its motor. */
function followElement(
  element: RelayElement,
  record: CurrentRecord,
  windows: readonly StartWindow[],
  lockedRotor: readonly number[],
): ElementResult[] {
  const course = elementCourse(element, 'fast')
  const open = windows.map((window) => ({
    window,
    before: 0,
    after: 0,
    operatesAt: null as number | null,
    least: noLeast,
  }))
  const { time, current } = record
  let entered = 0
  for (let k = 0; k < time.length; k++) {
    const [t, i] = [time[k]!, current[k]!]
    // The later of two samples at an instant is the one after the switching.
    while (entered < open.length && t >= open[entered]!.window.from && time[k + 1] !== t)
      open[entered++]!.before = course.travelled()
    const one = open[entered - 1]
    if (one) note(one, course, t, i)
    if (k + 1 === time.length) break
    const into = course.advance(time[k + 1]! - t, i, current[k + 1]!)
    if (one) {
      if (into !== null && t < one.window.off) one.operatesAt ??= t + into
      if (time[k + 1]! <= one.window.off) one.after = course.travelled()
    }
  }
  return open.map(({ window, before, after, operatesAt, least }, k) => {
    const beyond = window.stays && operatesAt === null ? course.timeLeft(current.at(-1)!) : null
    const operates = operatesAt ?? (beyond === null ? null : time.at(-1)! + beyond)
    const since = (t: number): Second => second(t - window.from)
    const held = steadyTime(element, lockedRotor[k]!, before)
    return {
      kind: element.kind,
      operatesAt: operates === null ? null : since(operates),
      least: least.time === Number.POSITIVE_INFINITY ? null : { time: second(least.time), at: since(least.at) },
      lockedRotor: held === null ? null : second(held),
      ...(element.kind === 'thermal-image' && {
        heat: { before: perUnit(before), after: perUnit(after) },
        ...inhibition(element, before),
      }),
    }
  })
}

const noLeast = { time: Number.POSITIVE_INFINITY, at: 0 }

function note(one: { window: StartWindow; least: typeof noLeast }, course: ElementCourse, t: number, i: number): void {
  if (t > one.window.over) return
  const left = course.timeLeft(i)
  if (left !== null && left < one.least.time) one.least = { time: left, at: t }
}

function inhibition(
  element: Extract<RelayElement, { kind: 'thermal-image' }>,
  heat: number,
): { inhibitedFor?: Second } {
  // Without a level of its own it still releases nothing that has tripped.
  const level = element.inhibit ?? 1
  if (heat < level) return {}
  return { inhibitedFor: restBefore(element, heat, 1 - level) ?? second(0) }
}

/**
 * Drives the elements of a relay by the current of a run, through all starts of a motor one after the other: what is
 * travelled and heated goes on over the rests between them.
 *
 * @param lockedRotor current on the relay's side with the rotor held, A, for each start
 * @param startedAt of each start without a trip, case time; null where it never starts
 * @returns for each start all but what the motor bears
 */
export function followProtection(
  { elements }: ProtectionInput,
  record: CurrentRecord,
  windows: readonly StartWindow[],
  lockedRotor: readonly number[],
  startedAt: readonly (number | null)[],
): Pick<ProtectionResult, 'elements' | 'startedAt' | 'tripMargin'>[] {
  const split = splitAt(
    record,
    windows.flatMap(({ from, over, off }) => [from, over, off]),
  )
  const followed = elements.map((element) => followElement(element, split, windows, lockedRotor))
  return windows.map((window, k) => {
    const own = followed.map((results) => results[k]!)
    const started = startedAt[k] ?? null
    return {
      elements: own,
      startedAt: started === null ? null : second(started - window.from),
      tripMargin: started === null ? null : marginOf(own, started - window.from),
    }
  })
}

/** Least time left, or how long before the end of the start the first element operates, as a negative number. */
function marginOf(elements: readonly ElementResult[], started: number): Second | null {
  const first = leastOf(elements.map(({ operatesAt }) => operatesAt))
  if (first !== null && first < started) return second(first - started)
  const least = leastOf(elements.map((one) => one.least?.time ?? null))
  return least === null ? null : second(least)
}

/** Trip against permissible time at a current; heats are those of the elements at switching-on. */
export function limitMargin(
  elements: readonly RelayElement[],
  heats: readonly number[],
  current: number,
  motorCurrent: number,
  permissible: number | null,
): LimitMargin {
  const trip = leastOf(elements.map((element, k) => steadyTime(element, current, heats[k]!)))
  return {
    current: ampere(motorCurrent),
    trip: trip === null ? null : second(trip),
    permissible: permissible === null ? null : second(permissible),
    margin: trip === null || permissible === null ? null : second(permissible - trip),
  }
}
