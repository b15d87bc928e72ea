'use server'

import { attempt } from '@/app/_action/attempt'
import { createProject } from '@/lib/server/people/commands'
import { perform } from '@/lib/server/perform'
import { createStudy } from '@/lib/server/studies/commands'
import type { SavedRecord } from '../_records/record-row'

export async function startProject(organisationId: string, values: Record<string, unknown>) {
  return attempt(async (actor): Promise<SavedRecord> => {
    const { name, client } = values as Parameters<typeof createProject.run>[1]
    const { projectId } = await perform(createProject, actor, { organisationId, name, client })
    return { id: projectId, version: 1 }
  })
}

export async function startStudy(projectId: string, values: Record<string, unknown>) {
  return attempt(async (actor): Promise<SavedRecord> => {
    const asked = values as Parameters<typeof createStudy.run>[1]
    const { studyId } = await perform(createStudy, actor, { ...asked, projectId })
    return { id: studyId, version: 1 }
  })
}
