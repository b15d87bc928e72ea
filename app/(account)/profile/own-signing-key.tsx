import { ask } from '@/app/_action/ask'
import { ownCertificate } from '@/app/_action/own-certificate'
import { signingChallenge } from '@/lib/server/signoff/queries'
import { SigningKeyPanel } from '../_signing/signing-key-panel'
import { registerSigningKey } from './actions'

/** The person's signing key at one organisation. */
export async function OwnSigningKey({ organisationId }: { organisationId: string }) {
  const { challenge, subject } = await ask(signingChallenge, { organisationId })
  const certificate = await ownCertificate(organisationId)
  return (
    <div className="flex flex-col gap-3">
      <h2 className="m-0 text-title font-semibold">Signing key</h2>
      <SigningKeyPanel
        person={subject}
        certificate={certificate}
        challenge={challenge}
        register={registerSigningKey.bind(null, organisationId)}
      />
    </div>
  )
}
