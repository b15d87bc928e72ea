import 'server-only'
import type { Tx } from '../db'
import { newId } from '../identity'
import { hashPassword } from './password'

/** Somebody who signs in by e-mail address and password. */
export interface NewAccount {
  name: string
  email: string
  password: string
  /** Whether the password was handed over and should be replaced by the person. */
  initialPassword: boolean
  /** Fixed identity of a demo person. */
  id?: string
}

/** Makes an account; signing up by oneself is closed, so this is the only way in. */
export async function createAccount(
  tx: Tx,
  { name, email, password, initialPassword, id = newId() }: NewAccount,
  at: Date,
) {
  const stamps = { createdAt: at, updatedAt: at }
  await tx.user.create({ data: { id, name, email, emailVerified: true, initialPassword, ...stamps } })
  await tx.account.create({
    data: {
      id: newId(),
      accountId: id,
      providerId: 'credential',
      userId: id,
      password: await hashPassword(password),
      ...stamps,
    },
  })
  return { userId: id, name }
}
