'use client'

import { useState } from 'react'
import { answered } from '@/app/_action/outcome'
import { Button } from '@/lib/ui/button'
import { Notice } from '@/lib/ui/notice'
import { accept } from './actions'

/** The signed-in person takes the part. */
export function AcceptButton({ token }: { token: string }) {
  const [busy, setBusy] = useState(false)
  const [refusal, setRefusal] = useState<string | null>(null)
  const take = async () => {
    setBusy(true)
    const outcome = await answered(() => accept(token))
    if (outcome.ok) return window.location.assign('/projects')
    setRefusal(outcome.message)
    setBusy(false)
  }
  return (
    <>
      {refusal ? <Notice tone="bad">{refusal}</Notice> : null}
      <Button tone="main" busy={busy} onClick={take}>
        Accept invitation
      </Button>
    </>
  )
}
