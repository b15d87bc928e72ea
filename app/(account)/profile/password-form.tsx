'use client'

import { type FormEvent, useEffect, useState } from 'react'
import { Button } from '@/lib/ui/button'
import { Labelled } from '@/lib/ui/labelled'
import { Notice } from '@/lib/ui/notice'

type Answer = { tone: 'good' | 'bad'; sentence: string }

const refused = async (answer: Response | null): Promise<string> => {
  const body: unknown = await answer?.json().catch(() => null)
  const code = typeof body === 'object' && body !== null && 'code' in body ? body.code : null
  if (code === 'INVALID_PASSWORD') return 'The present password is not right: type it again.'
  if (code === 'PASSWORD_TOO_SHORT') return 'The new password is too short: use 12 characters or more.'
  if (answer?.status === 401) return 'Your session has ended: sign in again, then change the password.'
  return 'The password was not changed: try again in a moment.'
}

const change = async (currentPassword: string, newPassword: string): Promise<Answer> => {
  const answer = await fetch('/api/auth/change-password', {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify({ currentPassword, newPassword, revokeOtherSessions: true }),
  }).catch(() => null)
  if (!answer?.ok) return { tone: 'bad', sentence: await refused(answer) }
  return { tone: 'good', sentence: 'The password is changed; every other session of yours has ended.' }
}

/** Replaces the password of the signed-in person. */
export function PasswordForm() {
  const [ready, setReady] = useState(false)
  const [busy, setBusy] = useState(false)
  const [answer, setAnswer] = useState<Answer | null>(null)
  useEffect(() => setReady(true), [])
  const submit = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault()
    const form = event.currentTarget
    const data = new FormData(form)
    const next = String(data.get('new') ?? '')
    if (next !== data.get('again'))
      return setAnswer({ tone: 'bad', sentence: 'The two new passwords differ: type the same twice.' })
    setBusy(true)
    const outcome = await change(String(data.get('present') ?? ''), next)
    setBusy(false)
    setAnswer(outcome)
    if (outcome.tone === 'good') form.reset()
  }
  return (
    <form method="post" onSubmit={submit} className="flex max-w-sm flex-col gap-3">
      <h2 className="m-0 text-title font-semibold">Password</h2>
      <Labelled label="Present password">
        {(control) => (
          <input
            {...control}
            className="control"
            name="present"
            type="password"
            autoComplete="current-password"
            required
          />
        )}
      </Labelled>
      <Labelled label="New password">
        {(control) => (
          <input {...control} className="control" name="new" type="password" autoComplete="new-password" required />
        )}
      </Labelled>
      <Labelled label="New password again">
        {(control) => (
          <input {...control} className="control" name="again" type="password" autoComplete="new-password" required />
        )}
      </Labelled>
      {answer ? <Notice tone={answer.tone}>{answer.sentence}</Notice> : null}
      <div>
        <Button type="submit" busy={busy} disabled={!ready}>
          Change password
        </Button>
      </div>
    </form>
  )
}
