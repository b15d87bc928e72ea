import 'server-only'
import { randomInt } from 'node:crypto'
import { hash, verify } from '@node-rs/argon2'

// Argon2id, 64 MiB, 3 passes: about 40 ms of one core.
const cost = { memoryCost: 65_536, timeCost: 3, parallelism: 1 }

/** Fewer characters are refused. */
export const leastPasswordLength = 12

/** More characters are refused: hashing them would cost everybody time. */
export const mostPasswordLength = 128

export const hashPassword = (password: string): Promise<string> => hash(password.normalize('NFKC'), cost)

export const verifyPassword = (hashed: string, password: string): Promise<boolean> =>
  verify(hashed, password.normalize('NFKC'))

// Without letters and digits that look alike.
const alphabet = 'abcdefghjkmnpqrstuvwxyz23456789'

/** A random password to be read out or typed off a screen: 4 groups of 5, 99 bits. */
export const makePassword = (): string =>
  Array.from({ length: 4 }, () => Array.from({ length: 5 }, () => alphabet[randomInt(alphabet.length)]).join('')).join(
    '-',
  )
