import type { Role } from '@/lib/policy/role'

/** What somebody in a role does, as a list of parts to choose from says it. */
export const roleWords: Record<Exclude<Role, 'administrator'>, string> = {
  engineer: 'engineer, prepares',
  checker: 'checker',
  approver: 'approver, issues',
  commenter: 'commenter, reviews and comments',
  client: 'client, receives what is issued',
}

export type ProjectRole = keyof typeof roleWords

export const projectRoles: readonly ProjectRole[] = ['engineer', 'checker', 'approver', 'commenter', 'client']

/** Roles that a guest of the project may have. */
export const guestRoles: readonly ProjectRole[] = ['commenter', 'client']
