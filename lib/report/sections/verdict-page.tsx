import type { ReactElement } from 'react'
import type { StudyVerdict } from '@/lib/engine/study-run'
import { limitedQuantity, placePhrase } from '@/lib/study/words/limit-sentence'
import { supplyTag } from '@/lib/study/words/tags'
import { verdictWords } from '@/lib/study/words/verdict-words'
import { block } from '../paper/block'
import { markWidth, paintVerdictMark, verdictInk } from '../paper/marks'
import { list, paragraph, typedText } from '../paper/text-block'
import { chapter, type ReportContext, subsection } from '../report-context'
import { band, colour } from '../theme'
import { paintLine, paintText } from '../type/paint-text'
import { plain, rich, wrapRuns } from '../type/rich-text'
import { withSeconds } from '../values/figures'
import { levelWords } from '../values/level-words'
import { figureOf, type VerdictRow, verdictRows } from '../values/verdict-rows'
import { answerStrip } from './answer-strip'
import { conditions } from './conditions'
import { findings } from './findings'

/** The governing limit in one sentence: value, limit, place, instant, case, supply. */
const governingSentence = (row: VerdictRow, { input, words }: ReportContext): string => {
  const { document } = input
  const { verdict, limit } = row
  const supply = document.plant.supplies.find(({ id }) => id === row.case.supply)
  const at = verdict.at === null ? null : withSeconds(verdict.at)
  const place = words.verdict.governingPlace(placePhrase(limit, document), at)
  const on = supply ? words.verdict.supply(supplyTag(document, supply.id), levelWords(supply)) : ''
  return `**${limit.tag}** in **${row.case.tag}**: ${limitedQuantity(limit, document)} ${figureOf(row, document)} ${place}; ${on}.`
}

/** The word on the whole, large, with its mark and the governing limit. */
const wholeBlock = (context: ReportContext, whole: StudyVerdict, governing: VerdictRow | null): ReactElement => {
  const { paper, words, width, input } = context
  const hasDesign = input.document.cases.some(({ role }) => role === 'design')
  const sentence = hasDesign ? words.verdict.whole[whole.word] : words.verdict.noDesignCase
  const held = whole.counts['not-assessed'] > 0
  const none = held ? words.verdict.noneAssessed : words.verdict.noGoverning
  const limit = governing ? governingSentence(governing, context) : none
  const pad = 12
  const sentenceLines = wrapRuns(plain(sentence), width - 2 * pad, 10.5)
  const limitLines = wrapRuns(rich(limit), width - 2 * pad, 9.5)
  const height = 46 + sentenceLines.length * 14 + 16 + limitLines.length * 13 + 10
  return block(paper, { width, height, below: 10 }, (pdf) => {
    pdf.rect(0, 0, width, height).fill(band)
    pdf.rect(0, 0, 3, height).fill(colour(verdictInk[whole.word]))
    const size = 22
    paintVerdictMark(pdf, whole.word, pad, 32, size)
    const word = verdictWords[whole.word]
    paintText(pdf, word, pad + markWidth * size + 2, 32, {
      size,
      weight: 'semibold',
      colour: colour(verdictInk[whole.word]),
    })
    let y = 51
    for (const line of sentenceLines) {
      paintLine(pdf, line, pad, y, { size: 10.5, colour: colour('ink') })
      y += 14
    }
    paintText(pdf, words.verdict.governing, pad, y + 4, { size: 7.6, weight: 'semibold', colour: colour('soft') })
    y += 17
    for (const line of limitLines) {
      paintLine(pdf, line, pad, y, { size: 9.5, colour: colour('ink') })
      y += 13
    }
  })
}

/** One page: the word on the whole, its governing limit, findings and conditions by the program, the engineer's recommendation. */
export const verdictPage = (context: ReportContext): readonly ReactElement[] => {
  const { paper, input, words, width, whole } = context
  const rows = whole.governing ? verdictRows(input.document, [whole.governing]) : []
  const governing = rows[0] ?? null
  const { recommendation } = input.document.texts
  const style = { width, size: 9, leading: 12 }
  return [
    chapter(context, 'verdict', words.verdict.title),
    wholeBlock(context, whole, governing),
    ...(governing ? answerStrip(context, governing) : []),
    subsection(context, 'findings', words.verdict.findings),
    ...list(paper, findings(context), style),
    subsection(context, 'conditions', words.verdict.conditions),
    ...list(paper, conditions(context), style),
    subsection(context, 'recommendation', words.verdict.recommendation),
    ...(recommendation.trim() === ''
      ? paragraph(paper, words.verdict.noRecommendation, { ...style, ink: 'soft' })
      : typedText(paper, recommendation, style)),
  ]
}
