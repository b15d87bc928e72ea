import { ask } from '@/app/_action/ask'
import { type ShareLine, shareLinks } from '@/lib/server/share/queries'
import { type Column, DataTable } from '@/lib/ui/data-table'
import { Moment } from '@/lib/ui/moment'
import { EndShareButton } from './end-share-button'
import { ShareForm } from './share-form'

const columns = (revisionId: string): readonly Column<ShareLine>[] => [
  { id: 'recipient', label: 'Recipient', cell: ({ recipient }) => recipient },
  { id: 'by', label: 'Shared by', cell: ({ createdBy }) => createdBy },
  { id: 'until', label: 'Works until', cell: ({ expiresAt }) => <Moment at={expiresAt} /> },
  {
    id: 'downloads',
    label: 'Downloads',
    numeric: true,
    cell: ({ downloads, mostDownloads }) => (mostDownloads === null ? downloads : `${downloads} of ${mostDownloads}`),
  },
  { id: 'passphrase', label: 'Passphrase', cell: ({ hasPassphrase }) => (hasPassphrase ? 'asked for' : 'none') },
  {
    id: 'log',
    label: 'Last downloads',
    cell: ({ log }) =>
      log.length === 0 ? (
        'none yet'
      ) : (
        <ul className="m-0 list-none p-0">
          {log.slice(0, 5).map(({ at, ipAddress }) => (
            <li key={at}>
              <Moment at={at} />
              {ipAddress ? ` from ${ipAddress}` : ''}
            </li>
          ))}
        </ul>
      ),
  },
  {
    id: 'action',
    label: 'Action',
    cell: ({ shareId, recipient, over }) =>
      over === 'ended' || over === 'run out' ? (
        over
      ) : (
        <>
          {over ? `${over} ` : null}
          <EndShareButton revisionId={revisionId} shareId={shareId} recipient={recipient} />
        </>
      ),
  },
]

/** Links by which the issued report was handed out, and a form for another one. */
export async function ShareSection({ revisionId, mayShare }: { revisionId: string; mayShare: boolean }) {
  const lines = await ask(shareLinks, { revisionId })
  return (
    <section aria-labelledby="share" className="flex flex-col gap-3">
      <h2 id="share" className="m-0 text-title font-semibold">
        Links for the client
      </h2>
      {lines.length > 0 ? (
        <DataTable<ShareLine>
          caption="Links to this report"
          rows={lines}
          rowId={({ shareId }) => shareId}
          columns={columns(revisionId)}
        />
      ) : (
        <p className="m-0 text-soft">No link has been made for this revision.</p>
      )}
      {mayShare ? (
        <ShareForm revisionId={revisionId} />
      ) : (
        <p className="m-0 text-soft">
          Only the revision in force is shared anew; links that are out say where this one stands.
        </p>
      )}
    </section>
  )
}
