import 'server-only'
import { DomainError } from '@/lib/errors'
import type { Tx } from '../db'

/** A study's row. The scope has found it already, so that its absence is a race. */
export async function loadStudy(tx: Tx, studyId: string) {
  const study = await tx.study.findFirst({ where: { id: studyId } })
  if (!study) throw new DomainError('not-found', 'There is no such study.')
  return study
}

export type StudyRow = Awaited<ReturnType<typeof loadStudy>>
