import { Document, type DocumentProps, Page } from '@react-pdf/renderer'
import { createElement, type ReactElement } from 'react'
import type { ExtensiblePart, OptionalPart } from '@/lib/study/document/study-document'
import { stack } from './paper/block'
import { heading } from './paper/heading'
import { type ChromeWords, pageChrome } from './paper/page-chrome'
import type { Paper } from './paper/paper'
import { Numbering, type ReportContext } from './report-context'
import type { ReportInput } from './report-input'
import { addedTexts } from './sections/added-texts'
import { assumptions } from './sections/assumptions'
import { calculationRecord } from './sections/calculation-record'
import { cases } from './sections/cases'
import { cautions, glossary } from './sections/cautions'
import { commissioning } from './sections/commissioning'
import { conclusions } from './sections/conclusions'
import { contents } from './sections/contents'
import { cover } from './sections/cover'
import { criteria } from './sections/criteria'
import { decisions } from './sections/decisions'
import { handCheck } from './sections/hand-check'
import { inputData } from './sections/input-data'
import { matrix } from './sections/matrix'
import { method } from './sections/method'
import { methodComparison } from './sections/method-comparison'
import { plots } from './sections/plots'
import { fullTables, results } from './sections/results/results'
import { scope } from './sections/scope'
import type { Section } from './sections/section'
import { startCard } from './sections/start-card'
import { diagramPages, system } from './sections/system'
import { utilitySheet } from './sections/utility-sheet'
import { verdictPage } from './sections/verdict-page'
import { contentWidth, type PageFormat, pageFormats } from './theme'
import { SourceList } from './values/source-list'
import type { Wording } from './wording/en'

/** A part of the report in its place: what it may be left out as, and what an author's text is added to. */
interface Part {
  key: OptionalPart | ExtensiblePart | null
  section: Section
  /** Begins on a page of its own. */
  fresh?: true
}

const opening: readonly Part[] = [
  { key: null, section: scope },
  { key: 'criteria', section: criteria },
  { key: 'system', section: system },
]

/** Parts behind the diagram; each starts where the one before ends unless it is `fresh`. */
const middle: readonly Part[] = [
  { key: 'input', section: inputData, fresh: true },
  { key: 'assumptions', section: assumptions },
  { key: 'method', section: method, fresh: true },
  { key: 'cases', section: cases, fresh: true },
  { key: 'results', section: results, fresh: true },
  { key: 'matrix', section: matrix, fresh: true },
  { key: 'plots', section: plots, fresh: true },
  { key: 'comparison', section: methodComparison },
  { key: null, section: conclusions },
  { key: 'commissioning', section: commissioning },
  { key: 'cautions', section: cautions },
]

const appendices: readonly Part[] = [
  { key: 'hand-check', section: handCheck, fresh: true },
  { key: 'tables', section: fullTables, fresh: true },
  { key: 'utility-sheet', section: utilitySheet, fresh: true },
  { key: 'start-card', section: startCard, fresh: true },
  { key: null, section: calculationRecord },
  { key: null, section: decisions },
  { key: 'glossary', section: glossary },
]

const chromeWords = ({ document, revision, draft }: ReportInput, { frame }: Wording): ChromeWords => ({
  headLeft: `${document.head.documentNumber}  ${document.head.title}`,
  headRight: `${frame.revision} ${revision.number}, ${frame.states[revision.state]}`,
  footLeft: `${document.head.organisation}${revision.purpose === '' ? '' : ` · ${revision.purpose}`}`,
  page: frame.page,
  watermark: draft ? frame.watermark : null,
})

/**
 * The whole report as elements. Contents stand in front but are written last, because the sections number the headings;
 * page numbers are looked up when the laid-out pages are painted.
 */
export const studyReport = (input: ReportInput, words: Wording, paper: Paper): ReactElement<DocumentProps> => {
  const { texts } = input.document
  const formats = pageFormats(texts.paper)
  const { portrait } = formats
  const context: ReportContext = {
    paper,
    input,
    words,
    formats,
    width: contentWidth(portrait),
    whole: input.result.overall,
    sources: new SourceList(words.records.input.noSourceMark),
    numbers: new Numbering(),
  }
  const front = cover(context)
  const verdict = verdictPage(context)
  const left: ReadonlySet<Part['key']> = new Set(texts.leftOut)
  const written = (parts: readonly Part[]) =>
    parts
      .filter(({ key }) => !left.has(key))
      .map(({ key, section, fresh }, i) =>
        stack([...section(context), ...addedTexts(context, key)], { breakBefore: i > 0 && fresh === true }),
      )
  const first = written(opening)
  const diagram = diagramPages(context)
  const rest = written([...middle, ...appendices])
  const listing = contents(context, paper.headings)
  const contentsHead = heading(paper, context.width, {
    id: 'contents',
    level: 1,
    number: '',
    title: words.frame.contents,
  })
  const chrome = chromeWords(input, words)
  // A break is honoured on the direct children of a page only.
  const page = (format: PageFormat, children: readonly ReactElement[]) =>
    createElement(Page, { size: [format.width, format.height], layout: pageChrome(paper, format, chrome) }, ...children)
  return createElement(
    Document,
    {},
    page(portrait, front),
    page(portrait, verdict),
    page(portrait, [contentsHead, ...listing]),
    page(portrait, first),
    ...diagram.map((one) => page(one.format, one.content)),
    page(portrait, rest),
  )
}
