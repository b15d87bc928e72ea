'use client'

import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { answered } from '@/app/_action/outcome'
import { Button } from '@/lib/ui/button'
import { DataTable } from '@/lib/ui/data-table'
import { Moment } from '@/lib/ui/moment'
import { Notice } from '@/lib/ui/notice'
import { endOwnSession } from './actions'

interface OpenSession {
  sessionId: string
  client: string
  ipAddress: string | null
  since: string
  lastUsed: string
  here: boolean
}

/** Where the person is signed in, with a way to end what should not be. */
export function SessionList({ sessions }: { sessions: readonly OpenSession[] }) {
  const router = useRouter()
  const [busy, setBusy] = useState(false)
  const [refusal, setRefusal] = useState<string | null>(null)
  const end = async (sessionId: string | null) => {
    setBusy(true)
    const outcome = await answered(() => endOwnSession(sessionId))
    setBusy(false)
    setRefusal(outcome.ok ? null : outcome.message)
    router.refresh()
  }
  return (
    <section aria-labelledby="sessions" className="flex flex-col gap-3">
      <h2 id="sessions" className="m-0 text-title font-semibold">
        Where you are signed in
      </h2>
      <DataTable<OpenSession>
        caption="Your sessions"
        rows={sessions}
        rowId={({ sessionId }) => sessionId}
        columns={[
          { id: 'client', label: 'Browser', cell: ({ client, here }) => (here ? `${client} (this one)` : client) },
          { id: 'address', label: 'Address', cell: ({ ipAddress }) => ipAddress ?? 'not known' },
          { id: 'since', label: 'Signed in', cell: ({ since }) => <Moment at={since} /> },
          { id: 'used', label: 'Last renewed', cell: ({ lastUsed }) => <Moment at={lastUsed} /> },
          {
            id: 'end',
            label: 'Action',
            cell: ({ sessionId, here }) =>
              here ? (
                'in use'
              ) : (
                <Button tone="quiet" className="text-dense" disabled={busy} onClick={() => end(sessionId)}>
                  End session
                </Button>
              ),
          },
        ]}
      />
      {refusal ? <Notice tone="bad">{refusal}</Notice> : null}
      {sessions.length > 1 ? (
        <div>
          <Button busy={busy} onClick={() => end(null)}>
            End all other sessions
          </Button>
        </div>
      ) : null}
    </section>
  )
}
