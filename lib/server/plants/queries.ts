import 'server-only'
import * as z from 'zod'
import { can } from '@/lib/policy/can'
import { idInput } from '../identity'
import { query } from '../read'
import type { PlantRows } from '../row'
import { loadPlantRows } from './rows'

export interface PlantView {
  project: { projectId: string; name: string; client: string; organisationId: string }
  rows: PlantRows
  /** Whether the person may change records. */
  editable: boolean
}

/** All records of a project's plant, in the order of the sheet. */
export const plantRecords = query({
  input: z.object({ projectId: idInput }),
  scope: ({ projectId }) => ({ kind: 'project' as const, id: projectId }),
  load: async () => undefined,
  may: (actor) => can(actor, 'read-plant'),
  run: async ({ tx, policy }, { projectId }): Promise<PlantView> => {
    const { id, name, client, organisationId } = await tx.project.findFirstOrThrow({ where: { id: projectId } })
    return {
      project: { projectId: id, name, client, organisationId },
      rows: await loadPlantRows(tx, projectId),
      editable: can(policy, 'edit-plant').allowed,
    }
  },
})
