import { canonicalJson } from '../study/canonical-json'
import type { StudyDocument } from '../study/document/study-document'
import type { StudySummary } from '../study/summary'
import { printedVerdict } from './printed-verdict'

/** Nine digits: engines differ in the last place of a double, and no figure is good for more. */
const rounded = (value: unknown): unknown => {
  if (typeof value === 'number') return Number(value.toPrecision(9)) || 0
  if (Array.isArray(value)) return value.map(rounded)
  if (typeof value !== 'object' || value === null) return value
  return Object.fromEntries(Object.entries(value).map(([key, inner]) => [key, rounded(inner)]))
}

const tags = (records: readonly { id: string; tag: string }[]): Record<string, string> =>
  Object.fromEntries(records.map(({ id, tag }) => [id, tag]))

/**
 * The results of a study, without curves, as canonical JSON (RFC 8785): SI at nine digits, verdicts also as they print.
 * The same document and engine version give the same bytes on every machine.
 */
export const resultsJson = (
  document: StudyDocument,
  { engineVersion, cases, verdicts, overall }: StudySummary,
): string => {
  const { plant, head } = document
  return canonicalJson(
    rounded({
      format: 'breakaway-results',
      formatVersion: 1,
      engineVersion,
      document: { documentNumber: head.documentNumber, title: head.title, project: head.project },
      tags: {
        buses: tags(plant.buses),
        motors: tags(plant.motors),
        cases: tags(document.cases),
        limits: tags(document.limits),
      },
      cases,
      verdicts: verdicts.map((verdict) => ({ ...verdict, printed: printedVerdict(document, verdict) })),
      overall,
    }),
  )
}
