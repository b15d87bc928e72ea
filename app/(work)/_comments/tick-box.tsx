'use client'

import { useState, useTransition } from 'react'
import { answered } from '@/app/_action/outcome'
import { tick } from './actions'

interface TickBoxProps {
  revisionId: string
  anchor: string
  label: string
  /** Who has ticked it; null while nobody has. */
  ticked: string | null
  mayTick: boolean
}

/** Whether an input was held against its source, and by whom. */
export function TickBox({ revisionId, anchor, label, ticked, mayTick }: TickBoxProps) {
  const [on, setOn] = useState(ticked !== null)
  const [refusal, setRefusal] = useState<string | null>(null)
  const [busy, start] = useTransition()
  if (!mayTick) return ticked ? <span>{ticked}</span> : <span className="text-soft">not yet</span>
  const change = (next: boolean) => {
    setOn(next)
    start(async () => {
      const outcome = await answered(() => tick(revisionId, anchor, next))
      setRefusal(outcome.ok ? null : outcome.message)
      if (!outcome.ok) setOn(!next)
    })
  }
  return (
    <>
      <input
        type="checkbox"
        aria-label={label}
        checked={on}
        aria-busy={busy || undefined}
        onChange={(event) => change(event.target.checked)}
      />
      {refusal ? (
        <span role="alert" className="text-label text-fails">
          {refusal}
        </span>
      ) : null}
    </>
  )
}
