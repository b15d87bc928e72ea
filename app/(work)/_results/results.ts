import type { CloseMargins } from '@/lib/engine/criteria/rule'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { designCases } from '@/lib/study/study-verdict'
import type { CaseSummary, StudySummary } from '@/lib/study/summary'
import { perUnit } from '@/lib/units/si'

/** Results with the document that gives their identities a name. */
export interface Results {
  document: StudyDocument
  summary: StudySummary
}

export const margins = ({ settings }: StudyDocument): CloseMargins => ({
  ofLimit: perUnit(settings.closeOfLimit.si),
  voltage: perUnit(settings.closeVoltage.si),
})

/** The results of a case; undefined where it was added since. */
export const caseResult = ({ summary }: Results, caseId: string): CaseSummary | undefined =>
  summary.cases.find((result) => result.caseId === caseId)

/** Results of the cases that count in the verdict, of those that are still in the document. */
export const designResults = (results: Results): readonly CaseSummary[] => {
  const counted = designCases(results.document)
  return results.summary.cases.filter(({ caseId }) => counted.has(caseId))
}

/** Whether every bus and motor of a result is still in the document, so that it can be drawn. */
export const canBeDrawn = ({ document }: Results, result: CaseSummary): boolean => {
  const buses = new Set(document.plant.buses.map(({ id }) => id))
  const motors = new Set(document.plant.motors.map(({ id }) => id))
  return (
    document.cases.some(({ id }) => id === result.caseId) &&
    result.places.every(({ busId }) => buses.has(busId)) &&
    result.motors.every(({ motorId }) => motors.has(motorId))
  )
}
