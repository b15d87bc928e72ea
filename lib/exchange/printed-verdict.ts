import type { Verdict } from '../engine/criteria/rule'
import type { StudyDocument } from '../study/document/study-document'
import { type FormattedVerdict, formatVerdict } from '../study/words/format-verdict'
import { perUnit } from '../units/si'

/** A verdict's figures as the report prints them; null for a limit that is no longer in the document. */
export const printedVerdict = (document: StudyDocument, verdict: Verdict): FormattedVerdict | null => {
  const limit = document.limits.find(({ id }) => id === verdict.ruleId)
  if (!limit) return null
  const { closeOfLimit, closeVoltage } = document.settings
  return formatVerdict(verdict, limit.quantity, {
    ofLimit: perUnit(closeOfLimit.si),
    voltage: perUnit(closeVoltage.si),
  })
}
