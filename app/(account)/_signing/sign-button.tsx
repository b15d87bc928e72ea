'use client'

import { type FormEvent, useState } from 'react'
import { answered, type Outcome } from '@/app/_action/outcome'
import { DomainError } from '@/lib/errors'
import { Button } from '@/lib/ui/button'
import { Labelled } from '@/lib/ui/labelled'
import { Notice } from '@/lib/ui/notice'
import { fromBase64, toBase64 } from './base64'
import type { KeyFile } from './key-file'
import { KeyFileChooser } from './key-file-chooser'
import { KeyUserName } from './key-user-name'
import { plainWords } from './plain-words'
import { openSigningKey, signAttributes } from './signing-key'
import { notHere } from './signing-key-panel'
import { useCanSign } from './use-can-sign'
import { useKeptKey } from './use-kept-key'

/** The octets to sign, base64, and the token that the service wants to see again with the signature. */
export interface PreparedAttributes {
  readonly attributes: string
  readonly token: string
}

export interface SignatureAnswer {
  /** r then s, 64 octets, base64. */
  readonly value: string
  readonly token: string
}

interface SignButtonProps {
  /** A verb and its object, for example "Sign as checker". */
  label: string
  /** The public key of the person's listed certificate, base64. */
  spki: string
  prepare: () => Promise<Outcome<PreparedAttributes>>
  complete: (answer: SignatureAnswer) => Promise<Outcome<unknown>>
  onSigned?: () => void
}

/** Asks for the passphrase, signs in this browser, and hands the signature to the service. */
export function SignButton({ label, spki, prepare, complete, onSigned }: SignButtonProps) {
  const canSign = useCanSign()
  const [open, setOpen] = useState(false)
  const [done, setDone] = useState(false)
  const [file, setFile] = useKeptKey(spki)

  if (done) return <Notice tone="good">Signed. The signature stands in the report.</Notice>
  if (!open) {
    return (
      <Button tone="main" onClick={() => setOpen(true)}>
        {label}
      </Button>
    )
  }
  if (!canSign) return <Notice tone="bad">{notHere}</Notice>
  if (file === undefined) return null
  if (file === null) return <KeyFileChooser spki={spki} onLoaded={setFile} />
  const sign = async (passphrase: string) => {
    await signWith(file, passphrase, prepare, complete)
    setDone(true)
    onSigned?.()
  }
  return <PassphraseForm label={label} sign={sign} cancel={() => setOpen(false)} />
}

interface PassphraseFormProps {
  label: string
  sign: (passphrase: string) => Promise<void>
  cancel: () => void
}

function PassphraseForm({ label, sign, cancel }: PassphraseFormProps) {
  const [passphrase, setPassphrase] = useState('')
  const [busy, setBusy] = useState(false)
  const [problem, setProblem] = useState('')
  const submit = async (event: FormEvent) => {
    event.preventDefault()
    setProblem('')
    setBusy(true)
    try {
      await sign(passphrase)
    } catch (error) {
      setProblem(plainWords(error))
      setBusy(false)
    }
  }
  return (
    <form onSubmit={submit} className="grid max-w-sm gap-2">
      <KeyUserName />
      <Labelled label="Passphrase of your signing key" error={problem || undefined}>
        {(control) => (
          <input
            {...control}
            type="password"
            autoComplete="current-password"
            className="control"
            value={passphrase}
            onChange={(event) => setPassphrase(event.target.value)}
          />
        )}
      </Labelled>
      <div className="flex gap-2">
        <Button type="submit" tone="main" busy={busy} disabled={passphrase === ''}>
          {busy ? 'Signing…' : label}
        </Button>
        <Button tone="quiet" onClick={cancel} disabled={busy}>
          Cancel
        </Button>
      </div>
    </form>
  )
}

/** The key is opened first: a wrong passphrase must not leave a prepared report behind. */
async function signWith(
  file: KeyFile,
  passphrase: string,
  prepare: SignButtonProps['prepare'],
  complete: SignButtonProps['complete'],
): Promise<void> {
  const key = await openSigningKey(file, passphrase)
  const prepared = orRefuse(await answered(prepare))
  const attributes = fromBase64(prepared.attributes)
  if (!attributes) throw new Error('the octets to sign are not base64')
  const value = toBase64(await signAttributes(key, attributes))
  orRefuse(await answered(() => complete({ value, token: prepared.token })))
}

function orRefuse<T>(outcome: Outcome<T>): T {
  if (outcome.ok) return outcome.value
  throw new DomainError(outcome.code, outcome.message)
}
