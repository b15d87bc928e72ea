import type { StudyResult } from '../engine/study-run'
import { printedVerdict } from '../exchange/printed-verdict'
import type { StudyDocument } from '../study/document/study-document'
import { verdictFigure } from '../study/words/format-verdict'
import { limitSentence } from '../study/words/limit-sentence'
import { caseTag, limitTag } from '../study/words/tags'
import { verdictWords } from '../study/words/verdict-words'

/** The verdict of the whole and the governing limit, in sentences for a terminal. */
export function verdictLines(document: StudyDocument, { overall, cases }: StudyResult): string[] {
  const { counts, governing } = overall
  const rows = (['meets', 'close', 'fails', 'not-assessed'] as const).map(
    (word) => `${counts[word]} ${verdictWords[word]}`,
  )
  const first = `Verdict: ${verdictWords[overall.word]} (${cases.length} cases computed; design cases: ${rows.join(', ')})`
  const limit = document.limits.find(({ id }) => id === governing?.ruleId)
  if (!governing || !limit) return [first]
  const formatted = printedVerdict(document, governing)
  const figure = formatted ? verdictFigure(formatted, limit.quantity, governing.reason) : 'no figure'
  const tags = `${limitTag(document, limit.id)} in ${caseTag(document, governing.caseId)}`
  return [first, `Governing: ${tags}, ${limitSentence(limit, document)}: ${figure}`]
}
