'use client'

import { useRouter } from 'next/navigation'
import { type FormEvent, useState } from 'react'
import { Button } from '@/lib/ui/button'
import { Notice } from '@/lib/ui/notice'
import { accountRefusal, postAccount } from '../_account/post-account'
import { ConfirmCode } from './confirm-code'
import { PasswordField } from './password-field'
import { RecoveryCodes } from './recovery-codes'

type Wanted = 'set' | 'remove' | 'codes'

const paths: Record<Wanted, string> = {
  set: '/two-factor/enable',
  remove: '/two-factor/disable',
  codes: '/two-factor/generate-backup-codes',
}
const verbs: Record<Wanted, string> = {
  set: 'Set second factor',
  remove: 'Remove second factor',
  codes: 'Make new recovery codes',
}

const codesIn = (value: unknown): string[] =>
  Array.isArray(value) ? value.filter((one): one is string => typeof one === 'string') : []

/** The second factor of the signed-in person: an authenticator app, and recovery codes for the day it is lost. */
export function SecondFactor({ set }: { set: boolean }) {
  const router = useRouter()
  const [wanted, setWanted] = useState<Wanted | null>(null)
  const [busy, setBusy] = useState(false)
  const [refusal, setRefusal] = useState<string | null>(null)
  const [begun, setBegun] = useState<{ address: string; codes: string[] } | null>(null)
  const [codes, setCodes] = useState<string[]>([])

  const choose = (next: Wanted | null) => {
    setWanted(next)
    setRefusal(null)
  }
  const send = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault()
    if (!wanted) return
    const password = String(new FormData(event.currentTarget).get('password') ?? '')
    setBusy(true)
    const answer = await postAccount(paths[wanted], { password })
    setBusy(false)
    if (!answer.ok) return setRefusal(accountRefusal(answer, {}))
    choose(null)
    const fresh = codesIn(answer.body.backupCodes)
    if (wanted === 'set') setBegun({ address: String(answer.body.totpURI), codes: fresh })
    else {
      setCodes(fresh)
      router.refresh()
    }
  }
  const confirmed = () => {
    setCodes(begun?.codes ?? [])
    setBegun(null)
    router.refresh()
  }

  return (
    <section aria-labelledby="second-factor" className="flex flex-col gap-3">
      <h2 id="second-factor" className="m-0 text-title font-semibold">
        Second factor
      </h2>
      <p className="m-0">
        {set
          ? 'Signing in asks for a code of your authenticator app after the password.'
          : 'With an authenticator app, somebody who learns your password still cannot sign in.'}
      </p>
      {codes.length > 0 ? <RecoveryCodes codes={codes} /> : null}
      {begun ? <ConfirmCode address={begun.address} onDone={confirmed} onStop={() => setBegun(null)} /> : null}
      {wanted ? (
        <form method="post" onSubmit={send} className="flex max-w-sm flex-col gap-3">
          <PasswordField />
          {refusal ? <Notice tone="bad">{refusal}</Notice> : null}
          <div className="flex gap-2">
            <Button type="submit" tone={wanted === 'remove' ? 'danger' : 'main'} busy={busy}>
              {verbs[wanted]}
            </Button>
            <Button onClick={() => choose(null)}>Go back</Button>
          </div>
        </form>
      ) : begun ? null : (
        <div className="flex flex-wrap gap-2">
          {(set ? (['codes', 'remove'] as const) : (['set'] as const)).map((one) => (
            <Button key={one} tone={one === 'remove' ? 'danger' : 'plain'} onClick={() => choose(one)}>
              {verbs[one]}
            </Button>
          ))}
        </div>
      )}
    </section>
  )
}
