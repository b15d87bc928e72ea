import { formatNumber } from '../../quantity/format-number'
import { printQuantity } from '../../quantity/print-quantity'
import type { StudyDocument } from '../document/study-document'
import type { CaseSummary, StudySummary } from '../summary'
import { startOutcomeWords } from '../words/outcome-words'
import { busTag, caseTag, motorTag } from '../words/tags'

/** A figure of a case that does not print the same in two revisions. */
export interface ResultChange {
  caseId: string
  case: string
  what: string
  before: string | null
  after: string | null
}

interface Side {
  document: StudyDocument
  summary: StudySummary
}

const percent = (value: number): string => `${formatNumber(100 * value, { decimals: 2 })}\u2009%`

/** The figures that a reader compares first, as they print. */
const figures = (document: StudyDocument, result: CaseSummary): ReadonlyMap<string, string> => {
  const found = new Map<string, string>()
  for (const { busId, before, nominal, deepest } of result.places) {
    const place = busTag(document, busId)
    found.set(`voltage before at ${place}`, percent(before / nominal))
    if (deepest) found.set(`deepest change at ${place}`, percent((before - deepest.voltage) / before))
  }
  for (const { motorId, start } of result.motors) {
    if (!start) continue
    const motor = motorTag(document, motorId)
    found.set(`outcome of ${motor}`, startOutcomeWords[start.outcome.kind])
    if (start.timeToCriterion !== null)
      found.set(`run-up of ${motor}`, printQuantity(start.timeToCriterion, 'time', { unit: 's', decimals: 2 }))
    found.set(
      `highest line current of ${motor}`,
      printQuantity(start.peakLineCurrent.current, 'current', { digits: 4 }),
    )
    found.set(`least accelerating torque of ${motor}`, percent(start.leastAccelerating.ofRated))
  }
  return found
}

/** Figures of the cases that both revisions have, where they do not print the same. */
export const diffResults = (before: Side, after: Side): ResultChange[] =>
  after.summary.cases.flatMap((result) => {
    const former = before.summary.cases.find(({ caseId }) => caseId === result.caseId)
    if (!former) return []
    const [old, now] = [figures(before.document, former), figures(after.document, result)]
    return [...new Set([...now.keys(), ...old.keys()])].flatMap((what): ResultChange[] => {
      const [was, is] = [old.get(what) ?? null, now.get(what) ?? null]
      if (was === is) return []
      const { caseId } = result
      return [{ caseId, case: caseTag(after.document, caseId), what, before: was, after: is }]
    })
  })
