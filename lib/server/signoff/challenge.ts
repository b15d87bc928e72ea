import 'server-only'
import { createHmac, randomBytes, timingSafeEqual } from 'node:crypto'
import { env } from '../env'

// Layout: random (16 octets), end of validity in ms (8), seal (32).
const sealAt = 24
const lifetime = 15 * 60_000

/** A challenge for one person's new signing key. It is not stored: its seal says that it was made here, for whom, and until when. */
export function makeChallenge(userId: string, at: Date, secret = env().BETTER_AUTH_SECRET): Uint8Array {
  const open = Buffer.alloc(sealAt)
  randomBytes(16).copy(open)
  open.writeBigUInt64BE(BigInt(at.getTime() + lifetime), 16)
  return new Uint8Array(Buffer.concat([open, seal(open, userId, secret)]))
}

/** True for a challenge that was made for this person and has not run out. */
export function isOwnChallenge(
  challenge: Uint8Array,
  userId: string,
  at: Date,
  secret = env().BETTER_AUTH_SECRET,
): boolean {
  if (challenge.length !== sealAt + 32) return false
  const bytes = Buffer.from(challenge)
  const open = bytes.subarray(0, sealAt)
  if (!timingSafeEqual(bytes.subarray(sealAt), seal(open, userId, secret))) return false
  return Number(open.readBigUInt64BE(16)) >= at.getTime()
}

const seal = (open: Buffer, userId: string, secret: string): Buffer =>
  createHmac('sha256', secret).update('signing key challenge\0').update(open).update(userId).digest()
