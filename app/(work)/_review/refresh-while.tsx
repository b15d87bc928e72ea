'use client'

import { useRouter } from 'next/navigation'
import { useEffect, useTransition } from 'react'

const twoSeconds = 2000

/** Shows the page anew while something is being made for it: two seconds after each time it has arrived, never twice at once. */
export function RefreshWhile({ waiting }: { waiting: boolean }) {
  const router = useRouter()
  const [arriving, start] = useTransition()
  useEffect(() => {
    if (!waiting || arriving) return
    const timer = setTimeout(() => start(() => router.refresh()), twoSeconds)
    return () => clearTimeout(timer)
  }, [waiting, arriving, router])
  return null
}
