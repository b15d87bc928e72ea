import { createHash } from 'node:crypto'

/** SHA-256 of the pieces, one after the other. */
export function sha256(...pieces: readonly Uint8Array[]): Uint8Array {
  const hash = createHash('sha256')
  for (const piece of pieces) hash.update(piece)
  return new Uint8Array(hash.digest())
}

/** SHA-256 as 64 lower-case hexadecimal digits: the form in which files and certificates are named everywhere. */
export function sha256Hex(...pieces: readonly Uint8Array[]): string {
  return Buffer.from(sha256(...pieces)).toString('hex')
}
