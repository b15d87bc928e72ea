'use client'

import { type FormEvent, useState } from 'react'
import { answered, type Outcome } from '@/app/_action/outcome'
import { DomainError } from '@/lib/errors'
import { Button } from '@/lib/ui/button'
import { Labelled } from '@/lib/ui/labelled'
import { Notice } from '@/lib/ui/notice'
import { fromBase64, toBase64 } from './base64'
import type { KeyFile } from './key-file'
import { forgetKeyFile, keepKeyFile } from './key-store'
import { KeyUserName } from './key-user-name'
import { passphraseHint } from './passphrase-hint'
import { plainWords } from './plain-words'
import { makeSigningKey } from './signing-key'

/** The answer to the server's challenge; all base64. It holds no secret. */
export interface KeyAnswer {
  readonly spki: string
  readonly challenge: string
  readonly proof: string
}

interface NewKeyFormProps {
  /** The server's challenge, base64. */
  challenge: string
  /** Words that must not be in the passphrase: the person's own. */
  ownWords: readonly string[]
  register: (answer: KeyAnswer) => Promise<Outcome<unknown>>
  onMade: (file: KeyFile) => void
}

/** Chooses a passphrase and makes the key; only its public part and the proof leave the browser. */
export function NewKeyForm({ challenge, ownWords, register, onMade }: NewKeyFormProps) {
  const [passphrase, setPassphrase] = useState('')
  const [again, setAgain] = useState('')
  const [busy, setBusy] = useState(false)
  const [problem, setProblem] = useState('')
  const hint = passphraseHint(passphrase, ownWords)

  const submit = async (event: FormEvent) => {
    event.preventDefault()
    if (!hint.acceptable) return setProblem(hint.sentence)
    if (passphrase !== again) return setProblem('The two passphrases differ: type the same one twice.')
    setProblem('')
    setBusy(true)
    try {
      onMade(await makeAndRegister(passphrase, challenge, register))
    } catch (error) {
      setProblem(plainWords(error))
    } finally {
      setBusy(false)
    }
  }

  return (
    <form onSubmit={submit} className="grid max-w-md gap-3">
      <KeyUserName />
      <Labelled label="Passphrase" hint={passphrase ? hint.sentence : 'Four or more unrelated words.'}>
        {(control) => (
          <input
            {...control}
            type="password"
            autoComplete="new-password"
            className="control"
            value={passphrase}
            onChange={(event) => setPassphrase(event.target.value)}
          />
        )}
      </Labelled>
      <Labelled label="Passphrase once more">
        {(control) => (
          <input
            {...control}
            type="password"
            autoComplete="new-password"
            className="control"
            value={again}
            onChange={(event) => setAgain(event.target.value)}
          />
        )}
      </Labelled>
      {problem ? <Notice tone="bad">{problem}</Notice> : null}
      <div>
        <Button type="submit" tone="main" busy={busy}>
          {busy ? 'Making signing key…' : 'Make signing key'}
        </Button>
      </div>
    </form>
  )
}

/**
 * The key is kept before the server hears of it, and forgotten only if the server says no: if its answer is lost, the certificate may well
 * be listed, and a certificate without its key would be of no use to anybody.
 */
async function makeAndRegister(
  passphrase: string,
  challenge: string,
  register: NewKeyFormProps['register'],
): Promise<KeyFile> {
  const octets = fromBase64(challenge)
  if (!octets) throw new Error('the challenge is not base64')
  const { file, spki, proof } = await makeSigningKey(passphrase, octets)
  await keepKeyFile(file)
  const outcome = await answered(() => register({ spki: toBase64(spki), challenge, proof: toBase64(proof) }))
  if (outcome.ok) return file
  if (outcome.code !== 'unavailable') await forgetKeyFile(file.spki)
  throw new DomainError(outcome.code, outcome.message, outcome.issues)
}
