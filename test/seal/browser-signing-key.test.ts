import { beforeAll, describe, expect, it } from 'vitest'
import { fromBase64, toBase64 } from '@/app/(account)/_signing/base64'
import { type KeyFile, keyFileName, readKeyFile } from '@/app/(account)/_signing/key-file'
import { passphraseHint } from '@/app/(account)/_signing/passphrase-hint'
import * as browser from '@/app/(account)/_signing/signing-key'
import { completeSignature } from '@/lib/seal/complete-signature'
import { issueSigner } from '@/lib/seal/issue-signer'
import { holdsKey, keyProofPrefix } from '@/lib/seal/key-proof'
import { prepareSignature } from '@/lib/seal/prepare-signature'
import { verifySignedReport } from '@/lib/seal/verify-signed-report'
import { makeTestAuthority, organisation, year } from './support/people'
import { reportToSign } from './support/report'

const passphrase = 'kettle lantern övre gravel'
const challenge = new Uint8Array([7, 7, 7])
let made: browser.NewSigningKey
beforeAll(async () => {
  made = await browser.makeSigningKey(passphrase, challenge)
})

describe('a signing key made in the browser', () => {
  it('proves to the server that its owner holds it, in the same words', () => {
    expect(browser.keyProofPrefix).toBe(keyProofPrefix)
    expect(holdsKey({ spki: made.spki, challenge, signature: made.proof })).toBe(true)
    expect(holdsKey({ spki: made.spki, challenge: new Uint8Array([8]), signature: made.proof })).toBe(false)
  })

  it('signs a report in two steps once it is opened again from its file', async () => {
    const authority = await makeTestAuthority()
    const person = { name: 'Marit Solberg', email: 'marit@example.org', organisation }
    const proof = { spki: made.spki, challenge, signature: made.proof }
    const certificate = await issueSigner(authority, person, proof, '61', year)
    const order = {
      field: 'Prepared',
      certificate,
      chain: [authority.certificate],
      at: new Date('2026-04-02T09:30:00Z'),
    }
    const prepared = prepareSignature(await reportToSign(), order)
    const key = await browser.openSigningKey(readKeyFile(JSON.stringify(made.file)), passphrase)
    const signed = completeSignature(prepared, await browser.signAttributes(key, prepared.attributes))
    const listed = [{ certificate, listedAt: year.notBefore }]
    const context = { registered: [], listed, expected: ['Prepared'], now: new Date('2026-06-01T00:00:00Z') }
    expect(verifySignedReport(signed, context).overall).toBe('valid')
    expect(key.extractable).toBe(false)
  })

  it('opens with accents typed in another way, and with no other passphrase', async () => {
    await expect(browser.openSigningKey(made.file, passphrase.normalize('NFD'))).resolves.toBeDefined()
    for (const wrong of ['', 'kettle lantern ovre gravel', `${passphrase} `]) {
      await expect(browser.openSigningKey(made.file, wrong)).rejects.toThrow(
        /does not open the signing key: type the one that you chose/,
      )
    }
  })

  it('does not open when its file was altered, not even its public key', async () => {
    const other = await browser.makeSigningKey(passphrase, challenge)
    const altered: KeyFile[] = [
      { ...made.file, spki: other.file.spki },
      { ...made.file, nonce: other.file.nonce },
      { ...made.file, iterations: made.file.iterations + 1 },
    ]
    for (const file of altered) await expect(browser.openSigningKey(file, passphrase)).rejects.toThrow(/does not open/)
  })

  it('signs attributes and nothing else, whatever it is asked', async () => {
    const key = await browser.openSigningKey(made.file, passphrase)
    await expect(browser.signAttributes(key, new TextEncoder().encode(keyProofPrefix))).rejects.toThrow(
      /not the attributes/,
    )
  })

  it('holds no word of the passphrase or the private key in the clear', async () => {
    const text = JSON.stringify(made.file)
    for (const word of passphrase.split(' ')) expect(text).not.toContain(word)
    expect(made.file.iterations).toBeGreaterThanOrEqual(600_000)
    // An unwrapped PKCS#8 key begins with these octets.
    expect(Buffer.from(fromBase64(made.file.wrapped)!).includes(Buffer.from('308187020100301306', 'hex'))).toBe(false)
  })
})

describe('a key file', () => {
  it('is read back as it was written, and anything else is refused in one sentence', () => {
    expect(readKeyFile(JSON.stringify(made.file))).toEqual(made.file)
    const weak = { ...made.file, iterations: 1000 }
    const endless = { ...made.file, iterations: 1e12 }
    const broken = { ...made.file, wrapped: 'not base64!' }
    for (const text of ['', 'null', '[]', '{"a":1}', ...[weak, endless, broken].map((file) => JSON.stringify(file))]) {
      expect(() => readKeyFile(text)).toThrow(/not a signing key file: choose the one that you downloaded/)
    }
  })

  it('is named after its owner in plain letters', () => {
    expect(keyFileName('Åse Ødegård-Lie')).toBe('signing-key-ase-degard-lie.json')
    expect(keyFileName('山田')).toBe('signing-key-mine.json')
  })
})

describe('the passphrase hint', () => {
  it('asks for length, variety and no words of one’s own', () => {
    const own = ['Marit Solberg', 'marit@example.org', organisation]
    const hint = (text: string) => passphraseHint(text, own)
    expect(hint('short')).toMatchObject({ acceptable: false, sentence: expect.stringContaining('At least 12') })
    expect(hint('aaaaaaaaaaaaaaaaaa')).toMatchObject({ acceptable: false })
    expect(hint('my solberg secret words')).toMatchObject({
      acceptable: false,
      sentence: expect.stringContaining('your own name'),
    })
    expect(hint('kettle gravel')).toMatchObject({ acceptable: true })
    expect(hint(passphrase).sentence).toBe('Strong.')
  })
})

describe('base64', () => {
  it('brings every octet back and says when a text is none', () => {
    const all = Uint8Array.from({ length: 256 }, (_, octet) => octet)
    expect(fromBase64(toBase64(all))).toEqual(all)
    expect(fromBase64('***')).toBeUndefined()
  })
})
