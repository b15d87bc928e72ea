import type { PolicyActor, Role } from '@/lib/policy/role'

/** What a command or query concerns; it leads to the organisation and, but for the first two kinds, to the project. */
export type Scope =
  /** The person alone: no organisation is entered. */
  | { kind: 'self' }
  | { kind: 'organisation'; id: string | undefined }
  | { kind: 'project'; id: string }
  | { kind: 'study'; id: string }
  | { kind: 'revision'; id: string }
  /** Whoever holds the link of an invitation, or of a shared report. */
  | { kind: 'invitation' | 'share'; token: string }

/** Where a transaction is: the one organisation whose rows it sees. */
export interface Place {
  organisationId: string
  projectId: string | null
  /** What the person may be here. */
  roles: readonly Role[]
}

export const policyActor = (userId: string, place: Place): PolicyActor => ({ userId, roles: place.roles })
