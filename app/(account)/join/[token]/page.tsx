import type { Metadata } from 'next'
import Link from 'next/link'
import { byLink } from '@/app/_action/by-link'
import { readInvitation } from '@/lib/server/people/join'
import { currentActor } from '@/lib/server/session'
import { Moment } from '@/lib/ui/moment'
import { Notice } from '@/lib/ui/notice'
import { AcceptButton } from './accept-button'
import { JoinForm } from './join-form'

export const metadata: Metadata = { title: 'Invitation', referrer: 'no-referrer', robots: { index: false } }

export default async function JoinPage({ params }: PageProps<'/join/[token]'>) {
  const { token } = await params
  const invitation = await byLink(() => readInvitation(token))
  const actor = await currentActor()
  const { organisation, project, name, email, roles, guest, invitedBy, expiresAt, partEndsAt } = invitation
  return (
    <main className="mx-auto flex min-h-dvh max-w-sm flex-col justify-center gap-4 px-4 py-10">
      <h1 className="m-0 text-title font-semibold">Invitation to {project}</h1>
      <p className="m-0">
        {invitedBy} of {organisation} invites {name}, {email}, to take part as {roles.join(', ')}
        {guest ? ', a guest of the project' : ''}
        {partEndsAt ? (
          <>
            , until <Moment at={partEndsAt} />
          </>
        ) : null}
        . This link works once, until <Moment at={expiresAt} />.
      </p>
      {actor === null ? (
        <>
          <JoinForm token={token} email={email} />
          <p className="m-0">
            You have an account for this address already?{' '}
            <Link prefetch={false} className="link" href={`/sign-in?then=${encodeURIComponent(`/join/${token}`)}`}>
              Sign in first
            </Link>
            .
          </p>
        </>
      ) : actor.email.toLowerCase() === email ? (
        <AcceptButton token={token} />
      ) : (
        <Notice tone="caution">
          You are signed in as {actor.email}. Sign out, then open this link again to accept it as {email}.
        </Notice>
      )}
    </main>
  )
}
