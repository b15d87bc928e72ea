'use client'

import Link from 'next/link'
import { type FormEvent, useEffect, useState } from 'react'
import { Button } from '@/lib/ui/button'
import { Labelled } from '@/lib/ui/labelled'
import { Notice } from '@/lib/ui/notice'
import { accountRefusal, postAccount } from '../../_account/post-account'

const used = 'This link was used, has run out or was not copied whole: ask for another one.'

/** A new password by the link that was sent. */
export function NewPasswordForm({ token }: { token: string }) {
  const [ready, setReady] = useState(false)
  const [busy, setBusy] = useState(false)
  const [done, setDone] = useState(false)
  const [refusal, setRefusal] = useState<string | null>(null)
  useEffect(() => setReady(true), [])
  const submit = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault()
    const data = new FormData(event.currentTarget)
    const newPassword = String(data.get('new') ?? '')
    if (newPassword !== data.get('again')) return setRefusal('The two passwords differ: type the same twice.')
    setBusy(true)
    const answer = await postAccount('/reset-password', { token, newPassword })
    setBusy(false)
    setDone(answer.ok)
    setRefusal(answer.ok ? null : accountRefusal(answer, { INVALID_TOKEN: used }))
  }
  const toSignIn = (
    <Link prefetch={false} className="link" href="/sign-in">
      Sign in
    </Link>
  )
  if (done) return <Notice tone="good">The password is changed. {toSignIn} with it.</Notice>
  return (
    <form method="post" onSubmit={submit} className="flex flex-col gap-3">
      <Labelled label="New password" hint="12 characters or more; several words make a good one.">
        {(control) => (
          <input {...control} className="control" name="new" type="password" autoComplete="new-password" required />
        )}
      </Labelled>
      <Labelled label="New password again">
        {(control) => (
          <input {...control} className="control" name="again" type="password" autoComplete="new-password" required />
        )}
      </Labelled>
      {refusal ? <Notice tone="bad">{refusal}</Notice> : null}
      <Button type="submit" tone="main" busy={busy} disabled={!ready}>
        Change password
      </Button>
    </form>
  )
}
