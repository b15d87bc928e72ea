import type { Verdict, VerdictWord } from '@/lib/engine/criteria/rule'
import type { CaseRecord } from '@/lib/study/document/case-records'
import type { LimitRecord } from '@/lib/study/document/limit-record'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { formatVerdict, verdictFigure } from '@/lib/study/words/format-verdict'
import { perUnit } from '@/lib/units/si'

/** A verdict with the records that it is about. */
export interface VerdictRow {
  verdict: Verdict
  limit: LimitRecord
  case: CaseRecord
}

/** Verdicts joined with their records; one whose record is gone is a broken result and throws. */
export const verdictRows = (document: StudyDocument, verdicts: readonly Verdict[]): readonly VerdictRow[] => {
  const limits = new Map(document.limits.map((limit) => [limit.id, limit]))
  const cases = new Map(document.cases.map((one) => [one.id, one]))
  return verdicts.map((verdict) => {
    const limit = limits.get(verdict.ruleId)
    const one = cases.get(verdict.caseId)
    if (!limit || !one) throw new Error(`The verdict ${verdict.ruleId}/${verdict.caseId} belongs to no record.`)
    return { verdict, limit, case: one }
  })
}

export const closeMargins = ({ settings }: StudyDocument) => ({
  ofLimit: perUnit(settings.closeOfLimit.si),
  voltage: perUnit(settings.closeVoltage.si),
})

/** `3.48 % (at most 4.0 %)`; where there is no figure, why. */
export const figureOf = ({ verdict, limit }: VerdictRow, document: StudyDocument): string =>
  verdictFigure(formatVerdict(verdict, limit.quantity, closeMargins(document)), limit.quantity, verdict.reason)

const weight: Record<VerdictWord, number> = { fails: 0, 'not-assessed': 1, close: 2, meets: 3 }

/** The worst first. */
export const byWeight = (a: VerdictRow, b: VerdictRow): number => weight[a.verdict.word] - weight[b.verdict.word]

export const inUse = ({ verdict }: VerdictRow): boolean => verdict.inUse
