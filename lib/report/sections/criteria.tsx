import type { LimitRecord } from '@/lib/study/document/limit-record'
import { appliesToPhrases, limitedQuantity, limitValuePhrase, placePhrase } from '@/lib/study/words/limit-sentence'
import { listed } from '@/lib/study/words/list-words'
import { dataTable, emptyTable } from '../paper/data-table'
import { paragraph } from '../paper/text-block'
import { chapter, type ReportContext } from '../report-context'
import { limitsInUse } from '../values/limits-in-use'
import type { Section } from './section'

const source = (limit: LimitRecord, { words }: ReportContext): string => {
  const { criteria } = words.records
  const parts = [limit.document, limit.clause, limit.edition].filter((part) => part.trim() !== '')
  return parts.length === 0 ? criteria.noDocument : parts.join(', ')
}

/** The limits sheet: place, quantity, value, what it is written for, document, clause and edition. */
export const criteria: Section = (context) => {
  const { paper, input, words, width } = context
  const { document } = input
  const { criteria: say } = words.records
  const { settings, limits } = document
  const used = limitsInUse(input)
  const rows = limits.map((limit) => {
    const applies = listed(appliesToPhrases(limit, document)) || say.all
    const idle = used.has(limit.id) ? '' : ` (${say.notInUse})`
    const verify = limit.verify ? ` – ${say.verify}` : ''
    return [
      { text: limit.tag, weight: 'semibold' as const },
      placePhrase(limit, document),
      limitedQuantity(limit, document),
      { text: limitValuePhrase(limit), weight: 'semibold' as const },
      applies + idle,
      source(limit, context) + verify,
    ]
  })
  return [
    chapter(context, 'criteria', say.title),
    ...paragraph(paper, say.intro(settings.closeOfLimit.text, settings.closeVoltage.text), { width }),
    ...paragraph(paper, say.references, { width }),
    limits.length === 0
      ? emptyTable(paper, words.records.input.empty, width)
      : dataTable(paper, {
          width,
          id: 'limits-sheet',
          columns: [
            { head: say.heads.tag, width: 28, fixed: true },
            { head: say.heads.place, width: 0.9 },
            { head: say.heads.what, width: 1.35 },
            { head: say.heads.value, width: 1.35 },
            { head: say.heads.applies, width: 1.3 },
            { head: say.heads.source, width: 1.9 },
          ],
          rows,
        }),
  ]
}
