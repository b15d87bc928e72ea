import 'server-only'
import { headers } from 'next/headers'
import { cache } from 'react'
import type { Actor } from './actor'
import { auth } from './auth'

/** The person behind a request's headers; null without a session that is in force. */
export async function actorOf(requestHeaders: Headers): Promise<Actor | null> {
  const session = await auth().api.getSession({ headers: requestHeaders })
  if (!session) return null
  const { id, name, email, initialPassword } = session.user
  return { userId: id, name, email, initialPassword: initialPassword ?? false }
}

/** What belongs to the present session and to no other: its secret never leaves the server. */
export interface SessionHere {
  token: string
  /** Whether signing in asks for a code of an authenticator app. */
  secondFactor: boolean
}

/** The present session; null when nobody is signed in. */
export async function sessionHere(): Promise<SessionHere | null> {
  const session = await auth().api.getSession({ headers: await headers() })
  return session && { token: session.session.token, secondFactor: session.user.twoFactorEnabled === true }
}

/** The signed-in person, looked up once a request; null when nobody is signed in. */
export const currentActor: () => Promise<Actor | null> = cache(async () => actorOf(await headers()))
