import type { Verdict } from '../engine/criteria/rule'
import type { StudyDocument } from '../study/document/study-document'
import { limitedQuantity, placePhrase } from '../study/words/limit-sentence'
import { busTag, caseTag, limitTag, motorTag } from '../study/words/tags'
import { notAssessedReasons, verdictWords } from '../study/words/verdict-words'
import type { Cell, Table } from './csv-text'
import { printedVerdict } from './printed-verdict'

/** A printed figure as a number again: its minus is a sign of its own and its thousands stand apart. */
const asNumber = (printed: string | null | undefined): Cell =>
  printed ? Number(printed.replace('\u2212', '-').replaceAll('\u2009', '')) : null

/** Every limit held against every case it applies to, at the digits that the report prints. */
export const verdictTable = (document: StudyDocument, verdicts: readonly Verdict[]): Table => ({
  name: 'limits',
  heads: [
    'limit',
    'place',
    'quantity',
    'case',
    'bus',
    'motor',
    'value',
    'limit value',
    'margin',
    'unit',
    'verdict',
    'reason',
    'class of starts in use',
    'at, s',
  ],
  rows: verdicts.map((verdict) => {
    const limit = document.limits.find(({ id }) => id === verdict.ruleId)
    const printed = printedVerdict(document, verdict)
    return [
      limitTag(document, verdict.ruleId),
      limit ? placePhrase(limit, document) : null,
      limit ? limitedQuantity(limit, document) : null,
      caseTag(document, verdict.caseId),
      verdict.busId && busTag(document, verdict.busId),
      verdict.motorId && motorTag(document, verdict.motorId),
      asNumber(printed?.value),
      asNumber(printed?.limit),
      asNumber(printed?.margin),
      printed?.unit ?? null,
      verdictWords[verdict.word],
      verdict.reason && notAssessedReasons[verdict.reason],
      verdict.inUse ? 'yes' : 'no',
      verdict.at,
    ]
  }),
})
