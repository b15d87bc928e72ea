import { limitedQuantity, placePhrase } from '@/lib/study/words/limit-sentence'
import { listed, listedTags } from '@/lib/study/words/list-words'
import { caseOutcomeSentence } from '@/lib/study/words/outcome-words'
import { busTag } from '@/lib/study/words/tags'
import { verdictWords } from '@/lib/study/words/verdict-words'
import type { ReportContext } from '../report-context'
import { byWeight, figureOf, inUse, type VerdictRow, verdictRows } from '../values/verdict-rows'

/** Cases of one role that fail a limit in use, with the limits. */
export const failingCases = (rows: readonly VerdictRow[], role: VerdictRow['case']['role']) => {
  const failing = rows.filter((row) => row.case.role === role && inUse(row) && row.verdict.word === 'fails')
  const cases = [...new Map(failing.map((row) => [row.case.id, row.case])).values()]
  return cases.map((one) => ({
    case: one,
    limits: failing.filter((row) => row.case.id === one.id).map((row) => row.limit.tag),
  }))
}

/** What the program found, as sentences: the tally, every limit that is not plainly met, and what fails beside the proposal. */
export const findings = ({ input, words, whole }: ReportContext): readonly string[] => {
  const { document, result } = input
  const rows = verdictRows(document, result.verdicts)
  const design = rows.filter((row) => row.case.role === 'design' && inUse(row))
  const { counts } = whole
  const cases = document.cases.filter(({ role }) => role === 'design').length
  const notPlain = design.filter((row) => row.verdict.word !== 'meets').sort(byWeight)
  const byLimit = [...new Set(notPlain.map((row) => row.limit))]
  const sentences = byLimit.map((limit) => {
    const of = notPlain.filter((row) => row.limit === limit)
    const parts = of.map((row) => `${row.case.tag} ${verdictWords[row.verdict.word]}, ${figureOf(row, document)}`)
    return `**${limit.tag}** ${placePhrase(limit, document)}, ${limitedQuantity(limit, document)}: ${listed(parts)}.`
  })
  const compared = failingCases(rows, 'comparison')
  const comparedWords = compared.map(({ case: one, limits }) => words.verdict.failingCase(one.tag, listedTags(limits)))
  const stopped = result.cases.flatMap(({ caseId, outcome }) => {
    const one = document.cases.find(({ id }) => id === caseId)
    if (!one || outcome.kind === 'complete') return []
    return [`**${one.tag}**: ${caseOutcomeSentence(outcome, (bus) => busTag(document, bus))}`]
  })
  return [
    ...stopped,
    `${words.verdict.counted(cases, design.length)} ${words.verdict.tally(counts.meets, counts.close, counts.fails, counts['not-assessed'])}`,
    ...(sentences.length > 0 ? sentences : design.length > 0 ? [words.verdict.allMeet] : []),
    ...(comparedWords.length > 0 ? [`${words.verdict.comparedFailing} ${listed(comparedWords)}.`] : []),
  ]
}
