'use client'

import { type FormEvent, useEffect, useState } from 'react'
import { Button } from '@/lib/ui/button'
import { Labelled } from '@/lib/ui/labelled'
import { Notice } from '@/lib/ui/notice'
import { SecondStep } from './second-step'
import { whereNext } from './where-next'

const asksForCode = async (answer: Response): Promise<boolean> => {
  const body: unknown = await answer
    .clone()
    .json()
    .catch(() => null)
  return typeof body === 'object' && body !== null && 'twoFactorRedirect' in body && body.twoFactorRedirect === true
}

const refusalOf = async (answer: Response | null): Promise<string> => {
  if (!answer) return 'The server did not answer: try again in a moment.'
  const body: unknown = await answer.json().catch(() => null)
  const message = typeof body === 'object' && body !== null && 'message' in body ? body.message : null
  if (answer.status === 429)
    return typeof message === 'string' ? message : 'Too many attempts: wait a minute and try again.'
  if (answer.status < 500) return 'Address and password do not belong together: check both and try again.'
  return 'Signing in failed on our side: try again in a moment.'
}

/** Address and password; `close` stands for a tab that was opened only to sign in again. */
export function SignInForm({ then }: { then: string | null }) {
  const [ready, setReady] = useState(false)
  const [busy, setBusy] = useState(false)
  const [step, setStep] = useState<'password' | 'code' | 'done'>('password')
  const [refusal, setRefusal] = useState<string | null>(null)
  useEffect(() => setReady(true), [])

  const goOn = () => {
    if (then === 'close') setStep('done')
    else window.location.assign(whereNext(then))
  }
  const startAgain = () => {
    setStep('password')
    setBusy(false)
  }

  const signIn = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault()
    const form = new FormData(event.currentTarget)
    setBusy(true)
    setRefusal(null)
    const answer = await fetch('/api/auth/sign-in/email', {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: JSON.stringify({ email: form.get('email'), password: form.get('password') }),
    }).catch(() => null)
    if (answer?.ok) return (await asksForCode(answer)) ? setStep('code') : goOn()
    setRefusal(await refusalOf(answer))
    setBusy(false)
  }

  if (step === 'code') return <SecondStep onDone={goOn} onStartAgain={startAgain} />
  if (step === 'done')
    return <Notice tone="good">You are signed in again. Close this tab and save once more in the other one.</Notice>
  return (
    <form method="post" onSubmit={signIn} className="flex flex-col gap-3">
      <Labelled label="E-mail address">
        {(control) => (
          <input {...control} className="control" name="email" type="email" autoComplete="username" required />
        )}
      </Labelled>
      <Labelled label="Password">
        {(control) => (
          <input
            {...control}
            className="control"
            name="password"
            type="password"
            autoComplete="current-password"
            required
          />
        )}
      </Labelled>
      {refusal ? <Notice tone="bad">{refusal}</Notice> : null}
      <Button type="submit" tone="main" busy={busy} disabled={!ready}>
        Sign in
      </Button>
    </form>
  )
}
