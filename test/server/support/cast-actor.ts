import type { Role } from '@/lib/policy/role'
import type { Actor } from '@/lib/server/actor'
import { cast } from '@/prisma/seed/cast'

/** The demo's person who has this part in the project. */
export const memberAs = (role: Role) => cast.find((one) => one.role === role)!

/** The same person as the server knows whoever is signed in. */
export const actorAs = (role: Role): Actor => {
  const { id, name, email } = memberAs(role)
  return { userId: id, name, email }
}
