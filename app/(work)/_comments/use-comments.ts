'use client'

import { useCallback, useEffect, useState } from 'react'
import { onHappened } from '@/app/(work)/_live/happened'
import type { CommentsView } from '@/lib/study/review-view'

/** The comments of a revision as they are now: asked for anew when somebody says that one was made, answered or closed. */
export const useComments = (given: CommentsView, href: string) => {
  const [view, setView] = useState(given)
  useEffect(() => setView(given), [given])
  const look = useCallback(async () => {
    const answer = await fetch(href, { cache: 'no-store' }).catch(() => null)
    if (answer?.ok) setView(await answer.json())
  }, [href])
  useEffect(
    () =>
      onHappened(({ subject, action }) => {
        if (subject.kind === 'comment' || action === 'hold-up-waived') void look()
      }),
    [look],
  )
  return { view, look }
}
