'use client'

import { type FormEvent, useEffect, useState } from 'react'
import { answered } from '@/app/_action/outcome'
import { Button } from '@/lib/ui/button'
import { Labelled } from '@/lib/ui/labelled'
import { Notice } from '@/lib/ui/notice'
import { join } from './actions'

const signIn = (email: string, password: string) =>
  fetch('/api/auth/sign-in/email', {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify({ email, password }),
  }).catch(() => null)

/** Somebody without an account chooses a password and is in. */
export function JoinForm({ token, email }: { token: string; email: string }) {
  const [ready, setReady] = useState(false)
  const [busy, setBusy] = useState(false)
  const [refusal, setRefusal] = useState<string | null>(null)
  useEffect(() => setReady(true), [])
  const submit = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault()
    const data = new FormData(event.currentTarget)
    const password = String(data.get('password') ?? '')
    if (password !== data.get('again')) return setRefusal('The two passwords differ: type the same twice.')
    setBusy(true)
    setRefusal(null)
    const outcome = await answered(() => join(token, password))
    if (outcome.ok) {
      const answer = await signIn(outcome.value.email, password)
      return window.location.assign(answer?.ok ? '/projects' : '/sign-in')
    }
    setRefusal(outcome.issues[0]?.message ?? outcome.message)
    setBusy(false)
  }
  return (
    <form method="post" onSubmit={submit} className="flex flex-col gap-3">
      <input type="hidden" name="username" autoComplete="username" value={email} readOnly />
      <Labelled label="Password" hint="12 characters or more; several words make a good one.">
        {(control) => (
          <input
            {...control}
            className="control"
            name="password"
            type="password"
            autoComplete="new-password"
            required
          />
        )}
      </Labelled>
      <Labelled label="Password again">
        {(control) => (
          <input {...control} className="control" name="again" type="password" autoComplete="new-password" required />
        )}
      </Labelled>
      {refusal ? <Notice tone="bad">{refusal}</Notice> : null}
      <Button type="submit" tone="main" busy={busy} disabled={!ready}>
        Join project
      </Button>
    </form>
  )
}
