import { printAnchor } from '@/lib/study/anchors/anchor'
import { sectionNames } from '@/lib/study/anchors/section-names'
import type { StudyDocument } from '@/lib/study/document/study-document'
import type { PlaceGroup } from './comment-form'

/** What a comment can be about without pointing: the whole, cases, limits, checks, parts of the report. */
export const placeGroups = (
  { cases, limits }: StudyDocument,
  checks: readonly { id: string; sentence: string }[],
): PlaceGroup[] => [
  { label: 'Revision', places: [{ anchor: 'revision', words: 'The revision as a whole' }] },
  {
    label: 'Cases',
    places: cases.map(({ id, tag }) => ({ anchor: printAnchor({ kind: 'case', caseId: id }), words: `Case ${tag}` })),
  },
  {
    label: 'Limits',
    places: limits.map(({ id, tag }) => ({
      anchor: printAnchor({ kind: 'record', list: 'limits', id, path: [] }),
      words: `Limit ${tag}`,
    })),
  },
  {
    label: 'Pre-issue checks',
    places: checks.map(({ id, sentence }) => ({
      anchor: printAnchor({ kind: 'check', checkId: id }),
      words: sentence,
    })),
  },
  {
    label: 'Report',
    places: Object.entries(sectionNames).map(([key, words]) => ({
      anchor: printAnchor({ kind: 'section', key }),
      words: `Report, ${words}`,
    })),
  },
]
