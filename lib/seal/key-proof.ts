import { createPublicKey, verify } from 'node:crypto'

/** What a signing key signs to prove that its owner holds it: fixed words, the challenge, then the public key. */
export const keyProofPrefix = 'Breakaway signing key, proof of possession, version 1\n'

/** A public key with the proof that whoever sent it holds the private one. */
export interface KeyProof {
  /** Subject public key info, DER. */
  readonly spki: Uint8Array
  /** The challenge that was answered. */
  readonly challenge: Uint8Array
  /** P-256 signature over prefix, challenge and public key: r then s, 32 octets each. */
  readonly signature: Uint8Array
}

/** True when the key is a P-256 key and the proof was made with it. */
export function holdsKey(proof: KeyProof): boolean {
  return verifiesP256(
    proof.spki,
    Buffer.concat([Buffer.from(keyProofPrefix), proof.challenge, proof.spki]),
    proof.signature,
  )
}

/** True when `value` (r then s, 64 octets) is the signature of SHA-256(`data`) by the P-256 key; false for any other kind of key. */
export function verifiesP256(spki: Uint8Array, data: Uint8Array, value: Uint8Array): boolean {
  if (value.length !== 64) return false
  try {
    const key = createPublicKey({ key: Buffer.from(spki), format: 'der', type: 'spki' })
    if (key.asymmetricKeyType !== 'ec' || key.asymmetricKeyDetails?.namedCurve !== 'prime256v1') return false
    return verify('sha256', data, { key, dsaEncoding: 'ieee-p1363' }, value)
  } catch {
    return false
  }
}
