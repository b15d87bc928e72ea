'use server'

import { attempt } from '@/app/_action/attempt'
import { perform } from '@/lib/server/perform'
import { changeStudy } from '@/lib/server/studies/commands'

export async function saveStudy(studyId: string, version: number, values: Record<string, unknown>) {
  return attempt(async (actor) => {
    // The values come from a form; the command checks every one of them.
    const change = { ...values, studyId, version } as Parameters<typeof changeStudy.run>[1]
    const saved = await perform(changeStudy, actor, change)
    return { id: studyId, version: saved.version }
  })
}
