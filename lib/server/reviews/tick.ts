import 'server-only'
import type * as z from 'zod'
import { DomainError } from '@/lib/errors'
import { parseAnchor } from '@/lib/study/anchors/anchor'
import { findAnchor } from '@/lib/study/anchors/find-anchor'
import type { WriteContext } from '../context'
import type { Done } from '../perform'
import { loadGround } from './ground'
import type { newTick } from './schema'

/** Puts down that the checker has held a value against its source; the tick names the value. */
export async function tick(
  { tx, actor, place: { organisationId }, at }: WriteContext,
  { revisionId, anchor, ticked }: z.output<typeof newTick>,
): Promise<Done<{ anchor: string }>> {
  const subject = { kind: 'input', id: anchor }
  if (!ticked) {
    await tx.inputTick.deleteMany({ where: { revisionId, anchor } })
    return { answer: { anchor }, events: [{ action: 'input-tick-removed', subject, payload: { revisionId } }] }
  }
  const parsed = parseAnchor(anchor)
  const found = parsed?.kind === 'record' ? findAnchor(parsed, await loadGround(tx, revisionId)) : null
  if (!found || found.value === null) throw new DomainError('invalid', 'This revision has no such input.')
  const data = { value: found.value, personId: actor.userId, personName: actor.name, at }
  await tx.inputTick.upsert({
    where: { organisationId_revisionId_anchor: { organisationId, revisionId, anchor } },
    create: { organisationId, revisionId, anchor, ...data },
    update: data,
  })
  return {
    answer: { anchor },
    events: [{ action: 'input-ticked', subject, payload: { revisionId, about: found.label, value: found.value } }],
  }
}
