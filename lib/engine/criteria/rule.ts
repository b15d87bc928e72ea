import type { PerUnit, Second } from '../../units/si'
import type { StarterKind } from '../case-input'

/** Where a limit holds. */
export type RulePlace =
  | { kind: 'bus'; busId: string }
  | { kind: 'every-bus' }
  | { kind: 'starting-motors' }
  | { kind: 'running-motors' }

/**
 * What is limited. Change: (U before − U)/reference, the largest for `deepest`. Remaining: U/reference, the least.
 * Highest: U/reference, the largest over the run. Time in s, torque in parts of rated torque, heat in parts of the permissible,
 * flicker as the severity that the flickermeter gives, trip margin as the least time in s that the relay leaves a start,
 * thermal margin as permissible locked-rotor time less time to trip with the rotor held, s.
 */
export type RuleQuantity =
  | 'voltage-change'
  | 'remaining-voltage'
  | 'highest-voltage'
  | 'run-up-time'
  | 'accelerating-torque'
  | 'heat-used'
  | 'flicker-short-term'
  | 'flicker-long-term'
  | 'trip-margin'
  | 'thermal-margin'

export type RuleInstant = 'first' | 'deepest' | 'settled-after-start' | 'settled-after-process'

/** Voltage before the start, nominal voltage of the bus, or rated voltage of the motor. */
export type RuleReference = 'before' | 'nominal' | 'rated'

/** A single value, or steps: from `from` seconds after the first switching-on the limit is `value` until the next step. */
export type RuleLimit =
  | { kind: 'value'; value: number }
  | { kind: 'envelope'; steps: readonly { from: Second; value: PerUnit }[] }

/** Class of starts that a limit is written for: more than / at most so many a day, an hour; null leaves that side open. */
export interface StartClass {
  moreThanPerDay: number | null
  atMostPerDay: number | null
  moreThanPerHour: number | null
  atMostPerHour: number | null
}

export interface RuleInput {
  id: string
  place: RulePlace
  quantity: RuleQuantity
  instant: RuleInstant
  reference: RuleReference
  limit: RuleLimit
  /** Null means all. */
  appliesTo: {
    caseIds: readonly string[] | null
    methods: readonly StarterKind[] | null
    motorIds: readonly string[] | null
  }
  startClass: StartClass | null
}

/** Inside the limit by less than this is `close`. */
export interface CloseMargins {
  /** Part of a limit on change, time, torque or heat (default 0.10). */
  ofLimit: PerUnit
  /** Absolute margin on remaining and highest voltage in per unit (default 0.01). */
  voltage: PerUnit
}

export type VerdictWord = 'meets' | 'close' | 'fails' | 'not-assessed'

export type NotAssessedReason =
  | 'case-not-computed'
  | 'case-collapsed'
  | 'case-refused'
  | 'state-not-reached'
  | 'not-declared'
  | 'no-pull-up-data'
  | 'place-not-in-case'
  /** Cut-in near synchronous speed, open transition or reclosing: steady circuits cannot show the transient. */
  | 'transient-only'
  | 'no-protection'
  | 'no-pick-up'

/** One rule held against one case; a rule that does not apply there has no verdict row. */
export interface Verdict {
  ruleId: string
  caseId: string
  word: VerdictWord
  /** Why there is no verdict; with `fails`, why there is no figure. */
  reason: NotAssessedReason | null
  /** False when the rule's class of starts is not the one in use; such a row is shown and does not count. */
  inUse: boolean
  value: number | null
  limit: number
  /** Positive inside the limit, in the unit of the limit. */
  margin: number | null
  busId: string | null
  motorId: string | null
  at: Second | null
  /** So many machines that meet the same plate stand behind the word, the worst speaking; absent for one alone. */
  circuits?: number
}

export interface StartFrequency {
  perDay: number
  perHour: number
}
