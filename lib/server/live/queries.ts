import 'server-only'
import * as z from 'zod'
import { allowed, denied } from '@/lib/policy/permission'
import type { PolicyActor } from '@/lib/policy/role'
import { idInput } from '../identity'
import { query } from '../read'

/** Where a follower stands: what the person may be there, and how far the chain has come. */
export interface LivePlace {
  organisationId: string
  projectId: string
  policy: PolicyActor
  sequence: number
}

/** Lets anybody with a part in a project follow it; what they learn is asked for each event. */
export const livePlace = query({
  input: z.object({ projectId: idInput }),
  scope: ({ projectId }) => ({ kind: 'project' as const, id: projectId }),
  load: async () => undefined,
  may: ({ roles }) => (roles.length > 0 ? allowed : denied('You have no part in this project.')),
  run: async ({ tx, policy, place: { organisationId } }, { projectId }): Promise<LivePlace> => {
    const { sequence } = await tx.project.findFirstOrThrow({ where: { id: projectId }, select: { sequence: true } })
    return { organisationId, projectId, policy, sequence }
  },
})
