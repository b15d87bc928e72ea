import { DomainError } from '@/lib/errors'
import { fromBase64 } from './base64'

/**
 * A signing key as it is kept: in this browser's own storage, and in a file that its owner downloads, so that he can sign from another
 * browser. It opens with the passphrase only. Neither it nor the passphrase is ever sent to the server, which therefore cannot lose them,
 * cannot be made to give them up, and cannot sign in anybody's place; the price is that a lost passphrase means a new key.
 */
export interface KeyFile {
  readonly format: 'breakaway-signing-key'
  readonly version: 1
  /** Public key, subject public key info, base64. */
  readonly spki: string
  /** How the passphrase becomes the wrapping key: PBKDF2 with SHA-256. */
  readonly salt: string
  readonly iterations: number
  /** The private key, PKCS#8, under AES-256-GCM with the public key bound in. */
  readonly nonce: string
  readonly wrapped: string
}

/** Fewer iterations make guessing too cheap. Source: OWASP Password Storage Cheat Sheet (PBKDF2-HMAC-SHA256), from memory. */
export const leastIterations = 600_000
const mostIterations = 10_000_000
const longestFile = 10_000

/** Reads the text of a key file; refused as `invalid` when it is none or weaker than this service makes them. */
export function readKeyFile(text: string): KeyFile {
  const value = text.length <= longestFile ? parse(text) : undefined
  if (isKeyFile(value)) return value
  throw new DomainError(
    'invalid',
    'This is not a signing key file: choose the one that you downloaded when you made the key.',
  )
}

function parse(text: string): unknown {
  try {
    return JSON.parse(text)
  } catch {
    return undefined
  }
}

function isKeyFile(value: unknown): value is KeyFile {
  if (typeof value !== 'object' || value === null) return false
  const file = value as Record<string, unknown>
  const isBase64 = (field: string) => typeof file[field] === 'string' && fromBase64(file[field]) !== undefined
  const iterations = file.iterations
  return (
    file.format === 'breakaway-signing-key' &&
    file.version === 1 &&
    typeof iterations === 'number' &&
    Number.isInteger(iterations) &&
    iterations >= leastIterations &&
    iterations <= mostIterations &&
    ['spki', 'salt', 'nonce', 'wrapped'].every(isBase64)
  )
}

/** The file's own name on disk: whose key it is, in plain letters. */
export function keyFileName(person: string): string {
  const plain = person
    .normalize('NFKD')
    .replace(/[^\w .-]/g, '')
    .trim()
    .replace(/\s+/g, '-')
    .toLowerCase()
  return `signing-key-${plain || 'mine'}.json`
}
