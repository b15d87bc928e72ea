'use client'

import { type FormEvent, useState } from 'react'
import { Button } from '@/lib/ui/button'
import { Labelled } from '@/lib/ui/labelled'
import { Notice } from '@/lib/ui/notice'
import { accountRefusal, postAccount } from '../_account/post-account'

const words = {
  INVALID_CODE: 'This code does not fit or was used already: wait for the next one and type that.',
  INVALID_BACKUP_CODE: 'This recovery code does not fit or was used already: try another one.',
  INVALID_TWO_FACTOR_COOKIE: 'This took too long: start again with the password.',
  TOO_MANY_ATTEMPTS_REQUEST_NEW_CODE: 'Too many wrong codes: start again with the password.',
  ACCOUNT_TEMPORARILY_LOCKED: 'Too many wrong codes: wait a quarter of an hour and try again.',
}

/** The code after the password: from the authenticator app, or one of the recovery codes. */
export function SecondStep({ onDone, onStartAgain }: { onDone: () => void; onStartAgain: () => void }) {
  const [recovery, setRecovery] = useState(false)
  const [busy, setBusy] = useState(false)
  const [refusal, setRefusal] = useState<string | null>(null)
  const submit = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault()
    const code = String(new FormData(event.currentTarget).get('code') ?? '').replace(/\s/g, '')
    setBusy(true)
    setRefusal(null)
    const path = recovery ? '/two-factor/verify-backup-code' : '/two-factor/verify-totp'
    const answer = await postAccount(path, { code })
    if (answer.ok) return onDone()
    setRefusal(accountRefusal(answer, recovery ? { ...words, INVALID_CODE: words.INVALID_BACKUP_CODE } : words))
    setBusy(false)
  }
  return (
    <form method="post" onSubmit={submit} className="flex flex-col gap-3">
      <Labelled
        key={recovery ? 'recovery' : 'app'}
        label={recovery ? 'Recovery code' : 'Code of the authenticator app'}
        hint={recovery ? 'Each recovery code works once.' : 'Six digits that change every half minute.'}
      >
        {(control) => (
          <input
            {...control}
            className="control"
            name="code"
            autoComplete="one-time-code"
            inputMode={recovery ? 'text' : 'numeric'}
            required
          />
        )}
      </Labelled>
      {refusal ? <Notice tone="bad">{refusal}</Notice> : null}
      <Button type="submit" tone="main" busy={busy}>
        Sign in
      </Button>
      <div className="flex flex-wrap gap-2">
        <Button tone="quiet" onClick={() => setRecovery(!recovery)}>
          {recovery ? 'Use the authenticator app' : 'Use a recovery code'}
        </Button>
        <Button tone="quiet" onClick={onStartAgain}>
          Start again
        </Button>
      </div>
    </form>
  )
}
