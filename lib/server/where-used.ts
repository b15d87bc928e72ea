import 'server-only'
import { DomainError } from '@/lib/errors'
import type { RecordKind } from '@/lib/study/document/record-kinds'
import type { Tx } from './db'
import { pointedAtBy, pointsAt } from './reference-keys'
import type { UsedIn } from './row'

interface Removed {
  kind: RecordKind
  id: string
  tag: string
  values: unknown
}

/** Refuses to remove a record that others point at, and lists them. The study is given for a record that belongs to one. */
export async function refuseIfUsed(tx: Tx, projectId: string, studyId: string | null, removed: Removed): Promise<void> {
  const { kind, id, tag, values } = removed
  const select = { kind: true, id: true, tag: true, values: true } as const
  const others = [
    ...(studyId ? [] : await tx.plantRecord.findMany({ where: { projectId }, select })),
    ...(await tx.studyRecord.findMany({ where: studyId ? { studyId } : { study: { projectId } }, select })),
  ]
  const ids = pointedAtBy(kind, id, values)
  const users = others.filter((other) => !(other.kind === kind && other.id === id) && pointsAt(other.values, kind, ids))
  if (users.length === 0) return
  const usedIn = users.map((user) => ({ kind: user.kind as RecordKind, id: user.id, tag: user.tag }))
  const named = usedIn.slice(0, 5).map((user) => user.tag)
  const more = usedIn.length > 5 ? ` and ${usedIn.length - 5} more` : ''
  const detail: UsedIn = { usedIn }
  throw new DomainError(
    'conflict',
    `${tag} is used by ${named.join(', ')}${more}: change or remove those first.`,
    [],
    detail,
  )
}
