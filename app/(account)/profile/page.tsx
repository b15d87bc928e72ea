import type { Metadata } from 'next'
import { ask } from '@/app/_action/ask'
import { signedIn } from '@/app/_action/signed-in'
import { WorkFrame } from '@/app/(work)/_frame/work-frame'
import { myOrganisations } from '@/lib/server/people/queries'
import { ownSessions } from '@/lib/server/people/sessions'
import { sessionHere } from '@/lib/server/session'
import { OwnSigningKey } from './own-signing-key'
import { PasswordForm } from './password-form'
import { SecondFactor } from './second-factor'
import { SessionList } from './session-list'

export const metadata: Metadata = { title: 'Profile' }

export default async function ProfilePage() {
  const actor = await signedIn()
  const organisations = await ask(myOrganisations, {})
  const here = await sessionHere()
  return (
    <WorkFrame path={[{ label: 'Projects', href: '/projects' }, { label: 'Profile' }]}>
      <div className="mx-auto flex max-w-3xl flex-col gap-6">
        <div>
          <h1 className="m-0 text-title font-semibold">{actor.name}</h1>
          <p className="m-0 text-soft">{actor.email}</p>
        </div>
        {organisations.map(({ organisationId }) => (
          <div key={organisationId} className="border border-hair bg-sheet p-4">
            <OwnSigningKey organisationId={organisationId} />
          </div>
        ))}
        <div className="border border-hair bg-sheet p-4">
          <PasswordForm />
        </div>
        <div className="border border-hair bg-sheet p-4">
          <SecondFactor set={here?.secondFactor ?? false} />
        </div>
        <div className="border border-hair bg-sheet p-4">
          <SessionList sessions={await ownSessions(actor, here?.token ?? '')} />
        </div>
      </div>
    </WorkFrame>
  )
}
