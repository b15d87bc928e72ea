import { Button } from '@/lib/ui/button'
import { Moment } from '@/lib/ui/moment'
import { Notice } from '@/lib/ui/notice'
import type { DraftDifference } from './compare-drafts'

interface ConflictPanelProps {
  by: string
  at: string
  /** Fields that I changed and that read differently in what was saved. */
  differences: readonly DraftDifference[]
  /** Fields that only the other person changed: they stay as saved. */
  takenOver: readonly string[]
  busy: boolean
  onKeepMine: () => void
  onTakeTheirs: () => void
}

/** Two people changed one record: both texts side by side, and nothing lost until one is chosen. */
export function ConflictPanel({ by, at, differences, takenOver, busy, onKeepMine, onTakeTheirs }: ConflictPanelProps) {
  return (
    <Notice tone="caution">
      <p className="m-0 mb-2">
        {by} saved this record at <Moment at={at} />, after you opened it.{' '}
        {differences.length === 0 ? 'Both of you typed the same.' : 'Compare both and choose what to keep.'}
      </p>
      {differences.length === 0 ? null : (
        <table className="dense mb-2">
          <caption className="sr-only">Your text and what {by} saved</caption>
          <thead>
            <tr>
              <th scope="col">Field</th>
              <th scope="col">Yours, not saved</th>
              <th scope="col">{by}</th>
            </tr>
          </thead>
          <tbody>
            {differences.map(({ name, label, mine, theirs }) => (
              <tr key={name || label}>
                <th scope="row">{label}</th>
                <td>{mine || '–'}</td>
                <td>{theirs || '–'}</td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      {takenOver.length > 0 ? (
        <p className="m-0 mb-2">
          What {by} changed and you did not, stays as saved: {takenOver.join(', ').toLowerCase()}.
        </p>
      ) : null}
      <div className="flex flex-wrap gap-2">
        <Button busy={busy} onClick={onKeepMine}>
          Keep my text and save
        </Button>
        <Button disabled={busy} onClick={onTakeTheirs}>
          Take what {by} saved
        </Button>
      </div>
    </Notice>
  )
}
