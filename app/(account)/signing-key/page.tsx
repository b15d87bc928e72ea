import type { Metadata } from 'next'
import { read } from '@/lib/server/read'
import { requireActor } from '@/lib/server/session'
import { listedCertificates, signingChallenge } from '@/lib/server/signoff/queries'
import { publicKeyOf } from '../_signing/public-key-of'
import { SigningKeyPanel } from '../_signing/signing-key-panel'
import { registerKey } from './register-key'

export const metadata: Metadata = { title: 'Signing key' }

/** The person's own signing key: made here, used on the pages of revisions. */
export default async function SigningKeyPage() {
  const actor = await requireActor()
  const { challenge, subject } = await read(signingChallenge, actor, {})
  const listed = await read(listedCertificates, actor, {})
  const own = listed.findLast((line) => line.subject.email === subject.email && line.revokedAt === null)
  const certificate = own
    ? { fingerprint: own.fingerprint, notAfter: own.notAfter, spki: publicKeyOf(own.certificate) }
    : null
  return (
    <main className="mx-auto max-w-3xl px-4 py-6">
      <h1 className="m-0 mb-3 text-title font-semibold">Signing key</h1>
      <SigningKeyPanel person={subject} certificate={certificate} challenge={challenge} register={registerKey} />
    </main>
  )
}
