import type { Happened } from './happened'

/** Somebody else with a page of the project open. */
export interface Other {
  name: string
  where: string
  own: boolean
}

interface Following {
  projectId: string
  /** Place in the chain of events that the page was made at. */
  after: number
  where: string
  onHappened: (happened: Happened) => void
  onOthers: (others: readonly Other[]) => void
  /** Too much was missed to be told one by one. */
  onReload: () => void
  onStanding: (connected: boolean) => void
}

/** A hidden page gives its connection back after this time and catches up when it is looked at again. Milliseconds. */
const hiddenFor = 60_000
const pause = 1500

/**
 * Follows a project: what is missed while asleep, without a network or while the server starts anew is made up for, because each
 * connection begins behind the last event that arrived. The answer ends it.
 */
export function follow({ projectId, after, where, onHappened, onOthers, onReload, onStanding }: Following): () => void {
  let last = after
  let source: EventSource | null = null
  let timer: ReturnType<typeof setTimeout> | undefined
  let over = false

  const close = () => {
    source?.close()
    source = null
    onStanding(false)
  }
  const open = () => {
    if (over || source) return
    const query = new URLSearchParams({ after: String(last), where })
    const fresh = new EventSource(`/api/live/${projectId}?${query}`)
    source = fresh
    const heard = (event: MessageEvent) => {
      const sequence = Number(event.lastEventId)
      if (Number.isSafeInteger(sequence) && sequence > last) last = sequence
    }
    fresh.addEventListener('happened', (event) => {
      heard(event)
      onHappened(JSON.parse(event.data))
    })
    fresh.addEventListener('standing', (event) => {
      heard(event)
      onStanding(true)
    })
    fresh.addEventListener('reload', (event) => {
      heard(event)
      onReload()
    })
    fresh.addEventListener('present', (event) => onOthers(JSON.parse(event.data)))
    fresh.onerror = () => {
      onStanding(false)
      // the browser tries again by itself unless it was answered by something else than a stream
      if (fresh.readyState !== EventSource.CLOSED || source !== fresh) return
      close()
      timer = setTimeout(open, pause)
    }
  }
  const onVisibility = () => {
    clearTimeout(timer)
    if (document.visibilityState === 'visible') open()
    else timer = setTimeout(close, hiddenFor)
  }
  document.addEventListener('visibilitychange', onVisibility)
  window.addEventListener('online', open)
  open()
  return () => {
    over = true
    clearTimeout(timer)
    document.removeEventListener('visibilitychange', onVisibility)
    window.removeEventListener('online', open)
    source?.close()
  }
}
