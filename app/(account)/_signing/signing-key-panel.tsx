'use client'

import { useState } from 'react'
import type { Outcome } from '@/app/_action/outcome'
import { Button } from '@/lib/ui/button'
import { Notice } from '@/lib/ui/notice'
import { type KeyFile, keyFileName } from './key-file'
import { KeyFileChooser } from './key-file-chooser'
import { type KeyAnswer, NewKeyForm } from './new-key-form'
import { saveFile } from './save-file'
import { useCanSign } from './use-can-sign'
import { useKeptKey } from './use-kept-key'

/** The person's certificate as the organisation has listed it. */
export interface OwnCertificate {
  /** SHA-256, hexadecimal. */
  readonly fingerprint: string
  /** ISO 8601. */
  readonly notAfter: string
  /** Public key, base64. */
  readonly spki: string
}

interface SigningKeyPanelProps {
  person: { readonly name: string; readonly email: string; readonly organisation: string }
  certificate: OwnCertificate | null
  /** The server's challenge for a new key, base64. */
  challenge: string
  register: (answer: KeyAnswer) => Promise<Outcome<unknown>>
}

/** The person's signing key: makes it, says whether this browser holds it, and gives its file out or takes it in. */
export function SigningKeyPanel({ person, certificate, challenge, register }: SigningKeyPanelProps) {
  const canSign = useCanSign()
  const [made, setMade] = useState<KeyFile | null>(null)
  const [kept, setKept] = useKeptKey(certificate?.spki ?? null)
  const file = made ?? kept
  const save = (kept: KeyFile) => saveFile(keyFileName(person.name), JSON.stringify(kept, null, 2))
  const showMade = (fresh: KeyFile) => {
    setMade(fresh)
    save(fresh)
  }

  if (!canSign) return <Notice tone="bad">{notHere}</Notice>
  return (
    <section aria-label="Signing key" className="grid max-w-2xl gap-3">
      <p className="m-0 text-soft">
        Your sign-offs are made with a key of your own. It is made in this browser and kept under your passphrase; the
        service never sees either, and nobody can restore them for you. A sign-off shows who stands behind the report
        within {person.organisation}; it is not a qualified electronic signature and not a professional seal.
      </p>
      {certificate ? <CertificateLine certificate={certificate} /> : null}
      {made ? (
        <Notice tone="good">
          Your signing key is made and its certificate is listed. Its key file was downloaded: keep it safe.
        </Notice>
      ) : null}
      {file ? (
        <div className="grid gap-2">
          <p className="m-0">
            This browser holds the key. With the key file and the passphrase you can sign from another browser, too.
          </p>
          <div>
            <Button tone={made ? 'main' : 'plain'} onClick={() => save(file)}>
              Download key file
            </Button>
          </div>
        </div>
      ) : null}
      {certificate && file === null ? <KeyFileChooser spki={certificate.spki} onLoaded={setKept} /> : null}
      {!certificate && !made ? (
        <NewKeyForm
          challenge={challenge}
          ownWords={[person.name, person.email, person.organisation]}
          register={register}
          onMade={showMade}
        />
      ) : null}
    </section>
  )
}

function CertificateLine({ certificate }: { certificate: OwnCertificate }) {
  const groups = certificate.fingerprint.slice(0, 16).toUpperCase().match(/.{4}/g) ?? []
  return (
    <p className="m-0">
      Certificate <strong title={`SHA-256 ${certificate.fingerprint}`}>{groups.join(' ')}</strong>, valid until{' '}
      <time dateTime={certificate.notAfter}>{certificate.notAfter.slice(0, 10)}</time>.
    </p>
  )
}

/** Why signing is not possible on this page, and what to do. */
export const notHere =
  'Signing needs a secure address: open this service by https, or on the computer that it runs on by localhost.'
