import { runCase } from '@/lib/engine/run-case'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { studyRunInput } from '@/lib/study/to-engine/study-run-input'
import type { HandCheckResult } from '../report-input'
import { chosenStart } from './chosen-start'
import { reducedCase } from './reduced-case'

/** The program's own figures for the start that is checked by hand, in the network reduced to that motor; null where no case starts one. */
export const computeHandCheck = (document: StudyDocument): HandCheckResult | null => {
  const start = chosenStart(document)
  if (!start) return null
  const { record, motor } = start
  const input = studyRunInput(document).cases.find(({ id }) => id === record.id)
  const reduced = input ? reducedCase(input, motor.id) : null
  return reduced && { caseId: record.id, motorId: motor.id, result: runCase(reduced) }
}
