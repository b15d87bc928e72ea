'use client'

import { useCallback, useEffect, useRef, useState } from 'react'
import { onHappened } from '@/app/(work)/_live/happened'
import { whenOnline } from '@/app/(work)/_live/when-online'
import type { CommentsView } from '@/lib/study/review-view'

/** Before asking a server again that did not answer. Milliseconds. */
const pause = 1500

/** The comments of a revision as they are now: asked for anew when somebody says that one was made, answered or closed. */
export const useComments = (given: CommentsView, href: string) => {
  const [view, setView] = useState(given)
  // a page that was asked for before the last comment may arrive after it
  const take = useCallback((next: CommentsView) => {
    setView((now) => (next.revisionId === now.revisionId && next.sequence < now.sequence ? now : next))
  }, [])
  useEffect(() => take(given), [given, take])
  // rises with each asking, so that a late answer never covers a newer one
  const asked = useRef(0)
  const look = useCallback(async () => {
    asked.current += 1
    const turn = asked.current
    const answer = await fetch(href, { cache: 'no-store' }).catch(() => null)
    if (turn !== asked.current) return
    if (answer?.ok) take(await answer.json())
    else if (!answer || answer.status >= 500) setTimeout(() => whenOnline(() => void look()), pause)
  }, [href, take])
  useEffect(
    () =>
      onHappened(({ subject, action }) => {
        if (subject.kind === 'comment' || action === 'hold-up-waived') void look()
      }),
    [look],
  )
  return { view, look }
}
