'use client'

import { useEffect } from 'react'

const places = (): HTMLElement[] => [...document.querySelectorAll<HTMLElement>('[data-anchor]')]

/**
 * While pointing, everything that a comment can be about is a button: a click or Enter chooses it, Escape gives up. The page itself
 * stays as it is.
 */
export const usePointing = (pointing: boolean, choose: (anchor: string, words: string) => void, giveUp: () => void) => {
  useEffect(() => {
    if (!pointing) return
    for (const place of places()) {
      place.tabIndex = 0
      place.setAttribute('role', 'button')
    }
    const chosen = (target: EventTarget | null): boolean => {
      const place = target instanceof Element ? target.closest<HTMLElement>('[data-anchor]') : null
      const anchor = place?.dataset.anchor
      if (!place || !anchor) return false
      choose(anchor, (place.dataset.words ?? place.textContent).replace(/\s+/g, ' ').trim().slice(0, 80))
      return true
    }
    const onClick = (event: MouseEvent) => {
      if (!chosen(event.target)) return
      event.preventDefault()
      event.stopPropagation()
    }
    const onKeyDown = (event: KeyboardEvent) => {
      if (event.key === 'Escape') giveUp()
      if ((event.key === 'Enter' || event.key === ' ') && chosen(event.target)) event.preventDefault()
    }
    document.body.dataset.pointing = ''
    document.addEventListener('click', onClick, true)
    document.addEventListener('keydown', onKeyDown, true)
    return () => {
      delete document.body.dataset.pointing
      document.removeEventListener('click', onClick, true)
      document.removeEventListener('keydown', onKeyDown, true)
      for (const place of places()) {
        place.removeAttribute('tabindex')
        place.removeAttribute('role')
      }
    }
  }, [pointing, choose, giveUp])
}

/** Marks what has been commented on with the numbers of its comments. */
export const useMarks = (numbersOf: ReadonlyMap<string, string>) => {
  useEffect(() => {
    for (const place of places()) {
      const numbers = numbersOf.get(place.dataset.anchor ?? '')
      if (numbers) place.dataset.comments = numbers
      else delete place.dataset.comments
    }
  })
}
