'use client'

import { useEffect, useState } from 'react'

const two = (value: number): string => String(value).padStart(2, '0')

const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec']

const universal = (date: Date): string =>
  `${date.getUTCDate()} ${months[date.getUTCMonth()]} ${date.getUTCFullYear()}, ${two(date.getUTCHours())}:${two(date.getUTCMinutes())} UTC`

const local = (date: Date): string =>
  `${date.getDate()} ${months[date.getMonth()]} ${date.getFullYear()}, ${two(date.getHours())}:${two(date.getMinutes())}`

/** An instant in the reader's own time; until the page is live, and on hovering, in universal time. */
export function Moment({ at }: { at: string }) {
  const [zone, setZone] = useState<'universal' | 'local'>('universal')
  useEffect(() => setZone('local'), [])
  const date = new Date(at)
  if (Number.isNaN(date.getTime())) return <>–</>
  return (
    <time dateTime={at} title={universal(date)}>
      {zone === 'local' ? local(date) : universal(date)}
    </time>
  )
}
