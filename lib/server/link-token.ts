import 'server-only'
import { createHash, randomBytes } from 'node:crypto'
import * as z from 'zod'
import { env } from './env'

/** A new secret for a link: 256 random bits. It is shown once; only its digest is kept. */
export const makeLinkToken = (): string => randomBytes(32).toString('base64url')

/** What is kept of a link's secret: SHA-256, hexadecimal. */
export const linkDigest = (token: string): string => createHash('sha256').update(token).digest('hex')

/** A link's secret as it comes in from an address: its length alone is looked at, so that every wrong one is told the same. */
export const linkToken = z.string().min(1, 'Open the whole link.').max(100, 'This is no link of ours.')

/** The address to send to somebody; under the name that people reach the application by. */
export const linkTo = (page: 'join' | 'share' | 'new-password', token: string): string =>
  new URL(`/${page}/${token}`, env().BASE_URL).href
