import { perUnit } from '../../units/si'
import type { StudyDocument } from '../document/study-document'
import type { StudySummary } from '../summary'
import { formatVerdict } from '../words/format-verdict'
import { caseTag, limitTag } from '../words/tags'

/** A verdict that does not print the same in two revisions. */
export interface VerdictChange {
  limitId: string
  caseId: string
  limit: string
  case: string
  /** Figure and word; null where the limit did not apply or was not there. */
  before: string | null
  after: string | null
  /** Whether the word is another one. */
  flipped: boolean
}

interface Side {
  document: StudyDocument
  summary: StudySummary
}

const printed = ({ document, summary }: Side): ReadonlyMap<string, { word: string; text: string }> => {
  const { closeOfLimit, closeVoltage } = document.settings
  const margins = { ofLimit: perUnit(closeOfLimit.si), voltage: perUnit(closeVoltage.si) }
  return new Map(
    summary.verdicts.flatMap((row) => {
      const rule = document.limits.find(({ id }) => id === row.ruleId)
      if (!rule) return []
      const { value, unit } = formatVerdict(row, rule.quantity, margins)
      const word = row.word === 'not-assessed' ? 'not assessed' : row.word
      const figure = value === null ? '' : `${value}${unit === '' ? '' : `\u2009${unit}`}, `
      return [[`${row.ruleId}/${row.caseId}`, { word, text: `${figure}${word}` }]]
    }),
  )
}

/** Verdicts that do not read the same, those with another word first. */
export const diffVerdicts = (before: Side, after: Side): VerdictChange[] => {
  const [old, now] = [printed(before), printed(after)]
  const changes = [...new Set([...now.keys(), ...old.keys()])].flatMap((key): VerdictChange[] => {
    const [was, is] = [old.get(key), now.get(key)]
    if (was?.text === is?.text) return []
    const [limitId = '', caseId = ''] = key.split('/')
    const { document } = is ? after : before
    const names = { limit: limitTag(document, limitId), case: caseTag(document, caseId) }
    const flipped = was !== undefined && is !== undefined && was.word !== is.word
    return [{ limitId, caseId, ...names, before: was?.text ?? null, after: is?.text ?? null, flipped }]
  })
  return [...changes.filter(({ flipped }) => flipped), ...changes.filter(({ flipped }) => !flipped)]
}
