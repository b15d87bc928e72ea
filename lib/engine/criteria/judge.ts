import type { CaseInput } from '../case-input'
import type { CaseResult } from '../case-result'
import { appliesTo, classInUse } from './applies'
import { type EnvelopePoint, marginOf, worstUnderEnvelope } from './envelope'
import { type Measurement, measure, voltagePlaces } from './measure'
import { onlyTransientJudges } from './only-transient'
import type { CloseMargins, NotAssessedReason, RuleInput, StartFrequency, Verdict, VerdictWord } from './rule'

/**
 * Holds one rule against one case. Unrounded figures are compared; the worst place speaks for the case.
 *
 * @param kept worst points under the envelope of the rule, of a run whose curves were not kept
 * @returns null when the rule does not apply there
 */
export function judge(
  rule: RuleInput,
  input: CaseInput,
  result: CaseResult,
  starts: StartFrequency,
  margins: CloseMargins,
  kept?: readonly EnvelopePoint[],
): Verdict | null {
  if (!appliesTo(rule, input)) return null
  const base = { ruleId: rule.id, caseId: input.id, inUse: classInUse(rule.startClass, starts) }
  const limit = rule.limit.kind === 'value' ? rule.limit.value : (rule.limit.steps[0]?.value ?? 0)
  const blank = { ...base, value: null, limit, margin: null, busId: null, motorId: null, at: null }
  const stopped = withoutFigures(result)
  if (stopped === 'case-collapsed' && isMissedByCollapse(rule)) {
    const { outcome } = result
    return {
      ...blank,
      word: 'fails',
      reason: stopped,
      ...(outcome.kind === 'collapsed' && { busId: outcome.busId, at: outcome.at }),
    }
  }
  if (stopped !== null) return { ...blank, word: 'not-assessed', reason: stopped }

  const points = kept ?? figures(rule, input, result)
  const missed = points.find((point) => point.kind === 'missed')
  if (missed) return { ...blank, word: 'fails', reason: null, busId: missed.busId, motorId: missed.motorId }
  const found = points.flatMap((point) => (point.kind === 'value' ? [{ limit, ...point }] : []))
  const unknown = points.find((point) => point.kind === 'unknown')
  const margin = (point: { value: number; limit: number }) => marginOf(rule, point.value, point.limit)
  const worst = found.reduce<(typeof found)[number] | null>(
    (least, point) => (least === null || margin(point) / point.limit < margin(least) / least.limit ? point : least),
    null,
  )
  // One place beyond the limit decides, whatever is not known of the others.
  if (unknown && (worst === null || margin(worst) >= 0)) {
    return { ...blank, word: 'not-assessed', reason: unknown.reason, busId: unknown.busId, motorId: unknown.motorId }
  }
  if (worst === null) return { ...blank, word: 'not-assessed', reason: 'place-not-in-case' }
  const word = wordFor(rule, margin(worst), worst.limit, margins)
  const open = word !== 'fails' && onlyTransientJudges(rule, input, result)
  return {
    ...base,
    word: open ? 'not-assessed' : word,
    reason: open ? 'transient-only' : null,
    value: worst.value,
    limit: worst.limit,
    margin: margin(worst),
    busId: worst.busId,
    motorId: worst.motorId,
    at: worst.at,
  }
}

/**
 * Whether a limit is worse than missed where the voltage collapses during the start: what it asks for is never reached.
 * Highest voltage, heat and the first instant say nothing about a collapse.
 */
function isMissedByCollapse({ quantity, instant }: RuleInput): boolean {
  if (quantity === 'run-up-time' || quantity === 'accelerating-torque') return true
  return (quantity === 'voltage-change' || quantity === 'remaining-voltage') && instant !== 'first'
}

/** Why a case has no figures at all, or null. */
function withoutFigures(result: CaseResult): NotAssessedReason | null {
  if (result.outcome.kind === 'complete') return null
  if (result.outcome.kind === 'collapsed') return 'case-collapsed'
  return result.outcome.kind === 'refused' ? 'case-refused' : 'case-not-computed'
}

/** Every figure of a case that a rule is held against; for an envelope the worst point of each place. */
export function figures(rule: RuleInput, input: CaseInput, result: CaseResult): (Measurement | EnvelopePoint)[] {
  const { limit } = rule
  if (limit.kind === 'value') return measure(rule, input, result)
  const places = voltagePlaces(rule, input, result)
  if (places === null) return measure(rule, input, result)
  return places.map(
    (place) =>
      worstUnderEnvelope(rule, limit, input, result, place) ?? {
        kind: 'unknown',
        reason: 'state-not-reached',
        busId: place.place.busId,
        motorId: place.motor?.id ?? null,
      },
  )
}

/** Word for a margin that is known. */
export function wordFor(rule: RuleInput, margin: number, limit: number, margins: CloseMargins): VerdictWord {
  if (margin < 0) return 'fails'
  return margin < closeBand(rule, limit, margins) ? 'close' : 'meets'
}

/** Margin below which a limit that holds is close: per unit for voltages, a part of the limit for all else. */
export function closeBand(rule: RuleInput, limit: number, margins: CloseMargins): number {
  const absolute = rule.quantity === 'remaining-voltage' || rule.quantity === 'highest-voltage'
  return absolute ? margins.voltage : margins.ofLimit * Math.abs(limit)
}
