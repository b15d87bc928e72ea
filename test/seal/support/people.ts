import { type Authority, makeAuthority } from '@/lib/seal/authority'
import { issueSigner } from '@/lib/seal/issue-signer'
import { keyProofPrefix } from '@/lib/seal/key-proof'

/** An invented engineer with a key and a certificate. */
export interface Signer {
  readonly certificate: Uint8Array
  readonly sign: (data: Uint8Array) => Promise<Uint8Array>
}

export const organisation = 'Tarn Hill Power Studies'
export const year = { notBefore: new Date('2026-01-01T00:00:00Z'), notAfter: new Date('2028-01-01T00:00:00Z') }
const ecdsa = { name: 'ECDSA', namedCurve: 'P-256', hash: 'SHA-256' }

export const makeTestAuthority = (name = organisation): Promise<Authority> =>
  makeAuthority(name, new Date('2025-12-01T00:00:00Z'), new Date('2036-01-01T00:00:00Z'))

/** A P-256 key with the proof that its holder has it. */
export async function makeKey(challenge = new Uint8Array([1, 2, 3])) {
  const keys = await crypto.subtle.generateKey(ecdsa, true, ['sign', 'verify'])
  const spki = new Uint8Array(await crypto.subtle.exportKey('spki', keys.publicKey))
  const sign = async (data: Uint8Array) =>
    new Uint8Array(await crypto.subtle.sign(ecdsa, keys.privateKey, new Uint8Array(data)))
  const signature = await sign(Buffer.concat([Buffer.from(keyProofPrefix), challenge, spki]))
  return { proof: { spki, challenge, signature }, sign }
}

export async function makeSigner(
  authority: Authority,
  name: string,
  serialNumber: string,
  validity = year,
): Promise<Signer> {
  const { proof, sign } = await makeKey()
  const email = `${name.toLowerCase().replace(/[^a-z]+/g, '.')}@example.org`
  const certificate = await issueSigner(authority, { name, email, organisation }, proof, serialNumber, validity)
  return { certificate, sign }
}
