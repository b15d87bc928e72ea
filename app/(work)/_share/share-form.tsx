'use client'

import { useRouter } from 'next/navigation'
import { type FormEvent, useEffect, useState } from 'react'
import { answered, type Refusal } from '@/app/_action/outcome'
import { Button } from '@/lib/ui/button'
import { Labelled } from '@/lib/ui/labelled'
import { LinkOnce } from '@/lib/ui/link-once'
import { Moment } from '@/lib/ui/moment'
import { Notice } from '@/lib/ui/notice'
import { share } from './actions'

const text = (form: FormData, name: string): string => String(form.get(name) ?? '').trim()

/** Makes a link by which one recipient downloads the report without an account. */
export function ShareForm({ revisionId }: { revisionId: string }) {
  const router = useRouter()
  const [ready, setReady] = useState(false)
  const [busy, setBusy] = useState(false)
  const [refusal, setRefusal] = useState<Refusal | null>(null)
  const [made, setMade] = useState<{ link: string; expiresAt: string } | null>(null)
  useEffect(() => setReady(true), [])
  const issue = (name: string) => refusal?.issues.find(({ path }) => path[0] === name)?.message
  const send = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault()
    const form = event.currentTarget
    const data = new FormData(form)
    const wanted = {
      recipient: text(data, 'recipient'),
      days: Number(text(data, 'days')),
      mostDownloads: text(data, 'most') === '' ? null : Number(text(data, 'most')),
      passphrase: text(data, 'passphrase') || null,
    }
    setBusy(true)
    const outcome = await answered(() => share(revisionId, wanted))
    setBusy(false)
    setRefusal(outcome.ok ? null : outcome)
    if (!outcome.ok) return
    setMade(outcome.value)
    form.reset()
    router.refresh()
  }
  return (
    <form method="post" onSubmit={send} noValidate className="flex max-w-md flex-col gap-3">
      {made ? (
        <>
          <Notice tone="good">
            The link works until <Moment at={made.expiresAt} />. Send a passphrase another way than the link.
          </Notice>
          <LinkOnce label="Link to the report" link={made.link} />
        </>
      ) : null}
      <Labelled label="Recipient" hint="Stands in the log of downloads." error={issue('recipient')}>
        {(control) => <input {...control} className="control" name="recipient" autoComplete="off" maxLength={200} />}
      </Labelled>
      <Labelled label="Days for which the link works" error={issue('days')}>
        {(control) => <input {...control} className="control" name="days" inputMode="numeric" defaultValue="30" />}
      </Labelled>
      <Labelled label="Most downloads" aside="may stay empty" error={issue('mostDownloads')}>
        {(control) => <input {...control} className="control" name="most" inputMode="numeric" />}
      </Labelled>
      <Labelled
        label="Passphrase"
        aside="may stay empty"
        hint="Asked for before the download; 8 characters or more."
        error={issue('passphrase')}
      >
        {(control) => (
          <input {...control} className="control" name="passphrase" type="text" autoComplete="off" maxLength={200} />
        )}
      </Labelled>
      {refusal ? <Notice tone="bad">{refusal.message}</Notice> : null}
      <div>
        <Button type="submit" tone="main" busy={busy} disabled={!ready}>
          Share with client
        </Button>
      </div>
    </form>
  )
}
