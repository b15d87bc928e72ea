import { needsListing, provenanceMark } from '@/lib/quantity/provenance'
import { listedTags } from '@/lib/study/words/list-words'
import { dataTable } from '../paper/data-table'
import { list, paragraph } from '../paper/text-block'
import { chapter, subsection } from '../report-context'
import { openItems, type StatedValue, statedValues } from '../values/stated-values'
import type { Section } from './section'

/** The same value with the same source in several records is one row. */
const merged = (values: readonly StatedValue[]) => {
  const rows = new Map<string, { tags: string[]; value: StatedValue }>()
  for (const value of values) {
    const key = JSON.stringify([value.field, value.text, value.provenance])
    const row = rows.get(key) ?? { tags: [], value }
    row.tags.push(value.record)
    rows.set(key, row)
  }
  return [...rows.values()]
}

/** Everything that nobody stated, and everything that is missing. */
export const assumptions: Section = (context) => {
  const { paper, input, words, width } = context
  const { assumptions: say } = words.records
  const values = statedValues(input.document, words)
  const listedValues = merged(values.filter(({ provenance }) => provenance !== null && needsListing(provenance.kind)))
  const unsourced = merged(values.filter(({ provenance }) => provenance === null))
  const open = openItems(input.document, words)
  return [
    chapter(context, 'assumptions', say.title),
    ...paragraph(paper, say.intro, { width }),
    subsection(context, 'assumed', say.assumed),
    ...(listedValues.length === 0
      ? paragraph(paper, say.noneAssumed, { width })
      : [
          dataTable(paper, {
            width,
            columns: [
              { head: say.heads.record, width: 1.6 },
              { head: say.heads.field, width: 1.3 },
              { head: say.heads.value, width: 1.7 },
              { head: say.heads.kind, width: 62, fixed: true },
              { head: say.heads.reason, width: 2.6 },
            ],
            rows: listedValues.map(({ tags, value }) => [
              { text: listedTags(tags), weight: 'semibold' as const },
              { text: value.field, markup: true },
              value.text,
              value.provenance
                ? `${provenanceMark[value.provenance.kind].mark} ${provenanceMark[value.provenance.kind].word}`
                : '',
              value.provenance?.source ?? '',
            ]),
          }),
        ]),
    subsection(context, 'unsourced', say.unsourced),
    ...(unsourced.length === 0
      ? paragraph(paper, say.noneUnsourced, { width })
      : [
          dataTable(paper, {
            width,
            columns: [
              { head: say.heads.record, width: 1.4 },
              { head: say.heads.field, width: 1.4 },
              { head: say.heads.value, width: 2.4 },
            ],
            rows: unsourced.map(({ tags, value }) => [
              { text: listedTags(tags), weight: 'semibold' as const },
              { text: value.field, markup: true },
              value.text,
            ]),
          }),
        ]),
    subsection(context, 'open-data', say.open),
    ...(open.length === 0 ? paragraph(paper, say.noneOpen, { width }) : list(paper, open, { width })),
  ]
}
