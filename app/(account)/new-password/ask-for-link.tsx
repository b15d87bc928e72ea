'use client'

import { type FormEvent, useEffect, useState } from 'react'
import { Button } from '@/lib/ui/button'
import { Labelled } from '@/lib/ui/labelled'
import { Notice } from '@/lib/ui/notice'
import { accountRefusal, postAccount } from '../_account/post-account'

/** Asks for the mail; the answer is the same for every address. */
export function AskForLink() {
  const [ready, setReady] = useState(false)
  const [busy, setBusy] = useState(false)
  const [asked, setAsked] = useState(false)
  const [refusal, setRefusal] = useState<string | null>(null)
  useEffect(() => setReady(true), [])
  const submit = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault()
    const email = String(new FormData(event.currentTarget).get('email') ?? '')
    setBusy(true)
    const answer = await postAccount('/request-password-reset', { email })
    setBusy(false)
    setAsked(answer.ok)
    setRefusal(answer.ok ? null : accountRefusal(answer, {}))
  }
  if (asked)
    return (
      <Notice tone="good">
        If there is an account for this address, the link is on its way; it works once, for half an hour. On an
        installation without a mail program whoever runs the server finds it in the server’s output.
      </Notice>
    )
  return (
    <form method="post" onSubmit={submit} className="flex flex-col gap-3">
      <Labelled label="E-mail address">
        {(control) => (
          <input {...control} className="control" name="email" type="email" autoComplete="username" required />
        )}
      </Labelled>
      {refusal ? <Notice tone="bad">{refusal}</Notice> : null}
      <Button type="submit" tone="main" busy={busy} disabled={!ready}>
        Send link
      </Button>
    </form>
  )
}
