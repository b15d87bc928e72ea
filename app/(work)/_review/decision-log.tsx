import type { DecisionLine } from '@/lib/server/revisions/view'
import { DataTable } from '@/lib/ui/data-table'
import { Moment } from '@/lib/ui/moment'

const words: Record<DecisionLine['move'], string> = {
  freeze: 'frozen',
  'send-for-check': 'sent for check',
  'accept-check': 'check accepted',
  'reject-check': 'sent back to the preparer',
  'accept-review': 'review accepted',
  'reject-review': 'review rejected',
  'close-review': 'review closed',
  'back-to-draft': 'taken back to draft',
  issue: 'issued',
  supersede: 'superseded',
  withdraw: 'withdrawn',
}

/** What was decided on the revision, by whom, and why. */
export function DecisionLog({ decisions }: { decisions: readonly DecisionLine[] }) {
  if (decisions.length === 0) return null
  return (
    <section aria-labelledby="decisions">
      <h2 id="decisions" className="m-0 mb-1 text-title font-semibold">
        Decisions
      </h2>
      <DataTable
        caption="Decisions"
        rows={decisions}
        rowId={({ at, move }) => `${at} ${move}`}
        columns={[
          { id: 'move', label: 'Decision', cell: ({ move }) => words[move] },
          { id: 'person', label: 'By', cell: ({ person }) => person },
          { id: 'at', label: 'At', cell: ({ at }) => <Moment at={at} /> },
          { id: 'note', label: 'Note or reason', cell: ({ note }) => note || '–' },
        ]}
      />
    </section>
  )
}
