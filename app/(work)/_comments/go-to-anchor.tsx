'use client'

import { useSearchParams } from 'next/navigation'
import { useEffect } from 'react'

/** Brings what the address names into sight, and marks it until something else is looked at. */
export function GoToAnchor() {
  const asked = useSearchParams().get('at')
  useEffect(() => {
    if (!asked) return
    const place = asked.startsWith('series/') ? (asked.split('@')[0] ?? asked) : asked
    const found = [...document.querySelectorAll<HTMLElement>('[data-anchor]')].find(
      (one) => one.dataset.anchor === place,
    )
    if (!found) return
    for (let outer = found.closest('details'); outer; outer = outer.parentElement?.closest('details') ?? null)
      outer.open = true
    found.dataset.found = ''
    found.scrollIntoView({ block: 'center' })
    return () => {
      delete found.dataset.found
    }
  }, [asked])
  return null
}
