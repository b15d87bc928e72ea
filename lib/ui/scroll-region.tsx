'use client'

import { type ReactNode, useEffect, useRef } from 'react'

/** Content that may be wider than its place: it scrolls by itself, and takes the keyboard only while there is something to scroll. */
export function ScrollRegion({
  label,
  className = '',
  children,
}: {
  label: string
  className?: string
  children: ReactNode
}) {
  const region = useRef<HTMLElement>(null)

  useEffect(() => {
    const element = region.current
    if (!element) return
    const measure = () => {
      const scrolls = element.scrollWidth > element.clientWidth + 1 || element.scrollHeight > element.clientHeight + 1
      if (scrolls) element.tabIndex = 0
      else element.removeAttribute('tabindex')
    }
    const observer = new ResizeObserver(measure)
    observer.observe(element)
    for (const child of element.children) observer.observe(child)
    return () => observer.disconnect()
  }, [])

  return (
    <section ref={region} aria-label={label} className={`overflow-x-auto ${className}`}>
      {children}
    </section>
  )
}
