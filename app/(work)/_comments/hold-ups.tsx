'use client'

import { useState } from 'react'
import { answered } from '@/app/_action/outcome'
import type { HoldUp } from '@/lib/study/review-view'
import { Confirm } from '@/lib/ui/confirm'
import { Labelled } from '@/lib/ui/labelled'
import { Moment } from '@/lib/ui/moment'
import { waive } from './actions'

interface HoldUpsProps {
  revisionId: string
  holdUps: readonly HoldUp[]
  mayWaive: boolean
  onChanged: () => void
}

/** What must be settled, or waived with a reason that the report prints, before the review can be closed. */
export function HoldUps({ revisionId, holdUps, mayWaive, onChanged }: HoldUpsProps) {
  if (holdUps.length === 0) return null
  const open = holdUps.filter(({ waived }) => !waived).length
  return (
    <section aria-labelledby="hold-ups">
      <h2 id="hold-ups" className="m-0 mb-1 text-title font-semibold">
        Before the review is closed
      </h2>
      <p className="m-0 mb-1 text-soft">
        {open === 0
          ? 'Nothing holds up the closing any more.'
          : `${open === 1 ? 'One thing holds' : `${open} things hold`} up the closing: settle each, or let an approver waive it with a reason that the report prints.`}
      </p>
      <ul className="m-0 list-none border border-hair bg-sheet p-0">
        {holdUps.map((one) => (
          <li
            key={`${one.kind}/${one.subjectId}`}
            className="flex flex-wrap items-center justify-between gap-2 border-b border-hair px-3 py-1.5 last:border-b-0"
          >
            <span className="min-w-0 flex-1">
              <span className={`font-semibold ${one.waived ? 'text-meets' : 'text-close'}`}>
                {one.waived ? 'waived' : 'to settle'}
              </span>{' '}
              {one.what}
              {one.waived ? (
                <span className="block text-label text-soft">
                  {one.waived.person}, <Moment at={one.waived.at} />: {one.waived.reason}
                </span>
              ) : null}
            </span>
            {mayWaive && !one.waived ? <WaiveButton {...{ revisionId, one, onChanged }} /> : null}
          </li>
        ))}
      </ul>
    </section>
  )
}

function WaiveButton({ revisionId, one, onChanged }: { revisionId: string; one: HoldUp; onChanged: () => void }) {
  const [reason, setReason] = useState('')
  const confirm = async (): Promise<string | null> => {
    const outcome = await answered(() => waive(revisionId, one.kind, one.subjectId, reason))
    if (!outcome.ok) return outcome.issues[0]?.message ?? outcome.message
    onChanged()
    return null
  }
  return (
    <Confirm trigger="Waive" title="Waive this?" confirm="Waive" onConfirm={confirm}>
      <p className="m-0">{one.what}</p>
      <p className="m-0">The revision may then go out in spite of it. The report prints your name and your reason.</p>
      <Labelled label="Reason">
        {(control) => (
          <textarea
            {...control}
            className="control"
            rows={3}
            value={reason}
            onChange={(event) => setReason(event.target.value)}
          />
        )}
      </Labelled>
    </Confirm>
  )
}
