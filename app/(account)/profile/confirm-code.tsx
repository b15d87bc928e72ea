'use client'

import { type FormEvent, useState } from 'react'
import { Button } from '@/lib/ui/button'
import { Labelled } from '@/lib/ui/labelled'
import { Notice } from '@/lib/ui/notice'
import { accountRefusal, postAccount } from '../_account/post-account'

const grouped = (secret: string): string => secret.match(/.{1,4}/g)?.join(' ') ?? secret

interface ConfirmCodeProps {
  /** What the app is told, an otpauth address. */
  address: string
  onDone: () => void
  onStop: () => void
}

/** The key for the app, and the first code that shows that the app has it; until then nothing changes. */
export function ConfirmCode({ address, onDone, onStop }: ConfirmCodeProps) {
  const [busy, setBusy] = useState(false)
  const [refusal, setRefusal] = useState<string | null>(null)
  const secret = new URL(address).searchParams.get('secret') ?? ''
  const submit = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault()
    const code = String(new FormData(event.currentTarget).get('code') ?? '').replace(/\s/g, '')
    setBusy(true)
    const answer = await postAccount('/two-factor/verify-totp', { code })
    setBusy(false)
    if (answer.ok) return onDone()
    const unfit = 'This code does not fit: check the clock of the device, wait for the next code and type that.'
    setRefusal(accountRefusal(answer, { INVALID_CODE: unfit }))
  }
  return (
    <form method="post" onSubmit={submit} className="flex max-w-md flex-col gap-3">
      <p className="m-0">
        Add an account to the authenticator app with this key (time based, 6 digits), or{' '}
        <a className="link" href={address}>
          open the app on this device
        </a>
        .
      </p>
      <p className="m-0 font-semibold break-all">{grouped(secret)}</p>
      <Labelled label="Code that the app shows now">
        {(control) => (
          <input
            {...control}
            className="control"
            name="code"
            inputMode="numeric"
            autoComplete="one-time-code"
            required
          />
        )}
      </Labelled>
      {refusal ? <Notice tone="bad">{refusal}</Notice> : null}
      <div className="flex gap-2">
        <Button type="submit" tone="main" busy={busy}>
          Confirm code
        </Button>
        <Button onClick={onStop}>Go back</Button>
      </div>
    </form>
  )
}
