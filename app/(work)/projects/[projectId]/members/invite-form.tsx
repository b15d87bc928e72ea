'use client'

import { useRouter } from 'next/navigation'
import { type FormEvent, useEffect, useState } from 'react'
import { answered, type Refusal } from '@/app/_action/outcome'
import { guestRoles, type ProjectRole, projectRoles } from '@/app/_words/role-words'
import { Button } from '@/lib/ui/button'
import { Labelled } from '@/lib/ui/labelled'
import { LinkOnce } from '@/lib/ui/link-once'
import { Moment } from '@/lib/ui/moment'
import { Notice } from '@/lib/ui/notice'
import { invite } from './actions'
import { RoleChoice } from './role-choice'

const text = (form: FormData, name: string): string => String(form.get(name) ?? '')

/** Makes a link by which one person takes a part in the project. */
export function InviteForm({ projectId }: { projectId: string }) {
  const router = useRouter()
  const [ready, setReady] = useState(false)
  const [busy, setBusy] = useState(false)
  const [guest, setGuest] = useState(false)
  const [roles, setRoles] = useState<ProjectRole[]>([])
  const [refusal, setRefusal] = useState<Refusal | null>(null)
  const [made, setMade] = useState<{ link: string; expiresAt: string; email: string } | null>(null)
  useEffect(() => setReady(true), [])
  const issue = (name: string) => refusal?.issues.find(({ path }) => path[0] === name)?.message

  const send = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault()
    const form = event.currentTarget
    const data = new FormData(form)
    const email = text(data, 'email')
    setBusy(true)
    const invited = { name: text(data, 'name'), email, roles, guest, days: Number(text(data, 'days')) }
    const outcome = await answered(() => invite(projectId, { ...invited, lastDay: text(data, 'lastDay') || null }))
    setBusy(false)
    setRefusal(outcome.ok ? null : outcome)
    if (!outcome.ok) return
    setMade({ ...outcome.value, email })
    setRoles([])
    form.reset()
    setGuest(false)
    router.refresh()
  }

  return (
    <section aria-labelledby="invite" className="flex flex-col gap-3 border border-hair bg-sheet p-4">
      <h2 id="invite" className="m-0 text-title font-semibold">
        Invite somebody
      </h2>
      {made ? (
        <>
          <Notice tone="good">
            Send this link to {made.email}. It may be used once, until <Moment at={made.expiresAt} />; whoever holds it
            can take the part.
          </Notice>
          <LinkOnce label="Link of the invitation" link={made.link} />
        </>
      ) : null}
      <form method="post" onSubmit={send} noValidate className="flex max-w-md flex-col gap-3">
        <Labelled
          label="Name"
          hint="As it will stand in title blocks and in the signing certificate."
          error={issue('name')}
        >
          {(control) => <input {...control} className="control" name="name" autoComplete="off" maxLength={200} />}
        </Labelled>
        <Labelled label="E-mail address" error={issue('email')}>
          {(control) => (
            <input {...control} className="control" name="email" type="email" autoComplete="off" maxLength={300} />
          )}
        </Labelled>
        <label className="flex items-center gap-2">
          <input
            type="checkbox"
            name="guest"
            checked={guest}
            onChange={(event) => {
              setGuest(event.target.checked)
              if (event.target.checked) setRoles(roles.filter((role) => guestRoles.includes(role)))
            }}
          />
          Guest of the project, of the utility or the client: does not belong to the organisation
        </label>
        <RoleChoice
          offered={guest ? guestRoles : projectRoles}
          chosen={roles}
          error={issue('roles')}
          onChange={setRoles}
        />
        <Labelled
          label="Last day of access"
          aside={guest ? undefined : 'may stay empty'}
          hint="Access ends by itself after this day."
          error={issue('lastDay')}
        >
          {(control) => <input {...control} className="control" name="lastDay" type="date" />}
        </Labelled>
        <Labelled label="Days for which the link may be used" error={issue('days')}>
          {(control) => <input {...control} className="control" name="days" inputMode="numeric" defaultValue="7" />}
        </Labelled>
        {refusal ? <Notice tone="bad">{refusal.message}</Notice> : null}
        <div>
          <Button type="submit" tone="main" busy={busy} disabled={!ready}>
            Make invitation link
          </Button>
        </div>
      </form>
    </section>
  )
}
