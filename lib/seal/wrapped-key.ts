import { createCipheriv, createDecipheriv, randomBytes, scryptSync } from 'node:crypto'
import { DomainError } from '@/lib/errors'
import { type Authority, signingAlgorithm } from './authority'
import { sha256 } from './sha256'

// Layout: format (1 octet), salt (16), nonce (12), tag (16), then the encrypted PKCS#8 key.
const format = 1
const saltEnd = 17
const nonceEnd = 29
const tagEnd = 45

/**
 * Wraps an authority's key for storage: AES-256-GCM under a key derived by scrypt (N 2^15, r 8, p 1) from a secret that is kept outside
 * the database. The authority's certificate is bound in, so that a wrapped key cannot be moved to another organisation.
 */
export async function wrapKey(authority: Authority, secret: string): Promise<Uint8Array> {
  const salt = randomBytes(16)
  const nonce = randomBytes(12)
  const cipher = createCipheriv('aes-256-gcm', derive(secret, salt), nonce).setAAD(sha256(authority.certificate))
  const key = Buffer.from(await crypto.subtle.exportKey('pkcs8', authority.key))
  const sealed = Buffer.concat([cipher.update(key), cipher.final()])
  key.fill(0)
  return new Uint8Array(Buffer.concat([Buffer.of(format), salt, nonce, cipher.getAuthTag(), sealed]))
}

/**
 * Opens an authority's key for use; it cannot be exported again. Refused as `unavailable` when the secret, the certificate or the
 * stored bytes are not those that it was wrapped with.
 */
export async function unwrapKey(wrapped: Uint8Array, certificate: Uint8Array, secret: string): Promise<Authority> {
  const key = decrypt(wrapped, certificate, secret)
  const opened = await crypto.subtle.importKey('pkcs8', new Uint8Array(key), signingAlgorithm, false, ['sign'])
  key.fill(0)
  return { certificate, key: opened }
}

function decrypt(wrapped: Uint8Array, certificate: Uint8Array, secret: string): Buffer {
  try {
    if (wrapped[0] !== format) throw new Error('unknown format')
    const decipher = createDecipheriv(
      'aes-256-gcm',
      derive(secret, wrapped.subarray(1, saltEnd)),
      wrapped.subarray(saltEnd, nonceEnd),
    )
      .setAAD(sha256(certificate))
      .setAuthTag(wrapped.subarray(nonceEnd, tagEnd))
    return Buffer.concat([decipher.update(wrapped.subarray(tagEnd)), decipher.final()])
  } catch {
    throw new DomainError(
      'unavailable',
      'The key of the certificate authority does not open with the configured secret: restore the secret with which it was made.',
    )
  }
}

const derive = (secret: string, salt: Uint8Array) =>
  scryptSync(secret, salt, 32, { N: 2 ** 15, r: 8, p: 1, maxmem: 64 * 2 ** 20 })
