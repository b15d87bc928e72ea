import { stateWords } from '@/app/_words/state-words'
import type { TitleCell } from '@/app/(work)/_frame/title-block'
import type { RevisionView } from '@/lib/server/revisions/view'
import { Moment } from '@/lib/ui/moment'

/** The block of a frozen revision, with the hash of what was frozen. */
export const revisionTitleCells = (revision: RevisionView): readonly TitleCell[] => [
  { label: 'Document', value: revision.documentNumber },
  { label: 'Title', value: revision.title, wide: true },
  { label: 'Revision', value: revision.number },
  { label: 'State', value: stateWords[revision.state] },
  { label: 'Purpose', value: revision.purpose ?? 'not set' },
  { label: 'Frozen', value: <Moment at={revision.frozenAt} /> },
  {
    label: 'Hash',
    value: <span title={`SHA-256 ${revision.documentHash}`}>{revision.documentHash.slice(0, 12)}</span>,
  },
]
