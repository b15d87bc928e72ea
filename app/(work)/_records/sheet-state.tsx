import type { Refusal } from '@/app/_action/outcome'
import { Button } from '@/lib/ui/button'
import { Moment } from '@/lib/ui/moment'
import { Notice } from '@/lib/ui/notice'

interface SheetStateProps {
  refusal: Refusal | null
  restoredFrom: number | null
  onDiscard: () => void
}

/** Why the text of a sheet is not saved, and what to do about it. */
export function SheetState({ refusal, restoredFrom, onDiscard }: SheetStateProps) {
  if (refusal?.code === 'not-signed-in')
    return (
      <Notice tone="bad">
        Not saved: your session has ended. Your text stays here.{' '}
        <a className="link" href="/sign-in?then=close" target="_blank" rel="noreferrer">
          Sign in again in another tab
        </a>
        , then save once more.
      </Notice>
    )
  if (refusal) return <Notice tone="bad">{refusal.message}</Notice>
  if (restoredFrom === null) return null
  return (
    <Notice tone="plain">
      Unsaved text from <Moment at={new Date(restoredFrom).toISOString()} /> was found in this browser and stands above.{' '}
      <Button tone="quiet" onClick={onDiscard}>
        Discard it
      </Button>
    </Notice>
  )
}
