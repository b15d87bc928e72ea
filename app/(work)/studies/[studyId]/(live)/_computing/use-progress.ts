'use client'

import { useRouter } from 'next/navigation'
import { useCallback, useEffect, useState } from 'react'
import { isOpen, type Progress } from './progress'

const everySecond = 1000

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
    const timer = setInterval(() => void look(), everySecond)
    return () => clearInterval(timer)
  }, [open, look])

  return { progress, open, look }
}
