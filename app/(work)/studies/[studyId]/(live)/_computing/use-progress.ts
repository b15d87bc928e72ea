'use client'

import { useRouter } from 'next/navigation'
import { useCallback, useEffect, useState } from 'react'
import { isOpen, type Progress } from './progress'

const second = 1000

/** Follows a computation while it runs and shows the page anew once it has ended. */
export const useProgress = (studyId: string, given: Progress) => {
  const router = useRouter()
  const [progress, setProgress] = useState(given)
  useEffect(() => setProgress(given), [given])
  const open = isOpen(progress)

  const look = useCallback(async () => {
    const answer = await fetch(`/studies/${studyId}/run`, { cache: 'no-store' }).catch(() => null)
    if (!answer?.ok) return
    const next: Progress = await answer.json()
    setProgress(next)
    if (!isOpen(next)) router.refresh()
  }, [studyId, router])

  useEffect(() => {
    if (!open) return
    let over = false
    let timer: ReturnType<typeof setTimeout>
    // The next question is asked when the last one was answered, so that a slow server is not asked twice at once.
    const again = () => {
      if (!over) timer = setTimeout(() => void look().then(again), second)
    }
    again()
    return () => {
      over = true
      clearTimeout(timer)
    }
  }, [open, look])

  return { progress, open, look }
}
