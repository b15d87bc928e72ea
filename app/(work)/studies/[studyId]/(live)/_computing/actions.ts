'use server'

import { attempt } from '@/app/_action/attempt'
import { perform } from '@/lib/server/perform'
import { computeStudy, stopComputing } from '@/lib/server/studies/commands'

export async function computeCases(studyId: string) {
  return attempt((actor) => perform(computeStudy, actor, { studyId }))
}

export async function stopCases(studyId: string) {
  return attempt((actor) => perform(stopComputing, actor, { studyId }))
}
