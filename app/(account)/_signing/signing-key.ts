import { DomainError } from '@/lib/errors'
import { fromBase64, toBase64 } from './base64'
import { type KeyFile, leastIterations } from './key-file'
import { wrappingKey } from './wrapping-key'

const ecdsa = { name: 'ECDSA', namedCurve: 'P-256', hash: 'SHA-256' } as const

/** The words before the challenge in a proof of possession; the server checks the same ones. */
export const keyProofPrefix = 'Breakaway signing key, proof of possession, version 1\n'

/** A new key: what its owner keeps, and what the server gets to issue a certificate. */
export interface NewSigningKey {
  readonly file: KeyFile
  /** Subject public key info, DER. */
  readonly spki: Uint8Array<ArrayBuffer>
  /** Signature over prefix, challenge and public key: r then s, 64 octets. */
  readonly proof: Uint8Array<ArrayBuffer>
}

/** Makes a P-256 signing key, wraps it under the passphrase and answers the server's challenge with it. */
export async function makeSigningKey(passphrase: string, challenge: Uint8Array): Promise<NewSigningKey> {
  const keys = await crypto.subtle.generateKey(ecdsa, true, ['sign', 'verify'])
  const spki = new Uint8Array(await crypto.subtle.exportKey('spki', keys.publicKey))
  const salt = crypto.getRandomValues(new Uint8Array(16))
  const nonce = crypto.getRandomValues(new Uint8Array(12))
  const wrapping = await wrappingKey(passphrase, salt, leastIterations)
  const wrapped = await crypto.subtle.wrapKey('pkcs8', keys.privateKey, wrapping, cipher(nonce, spki))
  const file: KeyFile = {
    format: 'breakaway-signing-key',
    version: 1,
    spki: toBase64(spki),
    salt: toBase64(salt),
    iterations: leastIterations,
    nonce: toBase64(nonce),
    wrapped: toBase64(new Uint8Array(wrapped)),
  }
  const words = new TextEncoder().encode(keyProofPrefix)
  const statement = new Uint8Array([...words, ...challenge, ...spki])
  const proof = new Uint8Array(await crypto.subtle.sign(ecdsa, keys.privateKey, statement))
  return { file, spki, proof }
}

/** Opens a kept key for signing; it cannot be exported from here. Refused as `invalid` when the passphrase is another. */
export async function openSigningKey(file: KeyFile, passphrase: string): Promise<CryptoKey> {
  const [spki, salt, nonce, wrapped] = [file.spki, file.salt, file.nonce, file.wrapped].map(fromBase64)
  if (!spki || !salt || !nonce || !wrapped)
    throw new DomainError('invalid', 'This key file is damaged: use your copy of it.')
  const wrapping = await wrappingKey(passphrase, salt, file.iterations)
  try {
    return await crypto.subtle.unwrapKey('pkcs8', wrapped, wrapping, cipher(nonce, spki), ecdsa, false, ['sign'])
  } catch {
    throw new DomainError(
      'invalid',
      'This passphrase does not open the signing key: type the one that you chose when you made it.',
    )
  }
}

/**
 * Signs the attributes of a prepared report (r then s, 64 octets). The octets must be a set of attributes, so that this key never signs
 * anything of another kind, whatever it is asked.
 */
export async function signAttributes(key: CryptoKey, attributes: Uint8Array): Promise<Uint8Array<ArrayBuffer>> {
  // 0x31 is the tag of a SET, which the signed attributes of a signature are. Source: RFC 5652, section 5.4.
  if (attributes[0] !== 0x31) throw new Error('these are not the attributes of a signature')
  return new Uint8Array(await crypto.subtle.sign(ecdsa, key, new Uint8Array(attributes)))
}

const cipher = (iv: Uint8Array<ArrayBuffer>, additionalData: Uint8Array<ArrayBuffer>) => ({
  name: 'AES-GCM',
  iv,
  additionalData,
})
