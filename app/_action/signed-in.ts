import 'server-only'
import { headers } from 'next/headers'
import { redirect } from 'next/navigation'
import type { Actor } from '@/lib/server/actor'
import { currentActor } from '@/lib/server/session'

/** The signed-in person of a page; anybody else signs in first and comes back to the same page. */
export const signedIn = async (): Promise<Actor> => {
  const actor = await currentActor()
  if (actor) return actor
  const path = (await headers()).get('x-path') ?? '/projects'
  redirect(`/sign-in?then=${encodeURIComponent(path)}`)
}
