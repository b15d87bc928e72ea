'use client'

import { useRouter } from 'next/navigation'
import { useEffect } from 'react'

const everyTwoSeconds = 2000

/** Shows the page anew every two seconds while something is being made for it. */
export function RefreshWhile({ waiting }: { waiting: boolean }) {
  const router = useRouter()
  useEffect(() => {
    if (!waiting) return
    const timer = setInterval(() => router.refresh(), everyTwoSeconds)
    return () => clearInterval(timer)
  }, [waiting, router])
  return null
}
