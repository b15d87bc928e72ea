import 'server-only'
import type { AnchorGround } from '@/lib/study/anchors/find-anchor'
import { readFrozenStudy } from '@/lib/study/read/read-frozen-study'
import type { Tx } from '../db'
import { keptChecks } from '../revisions/kept-checks'
import { loadSummary } from '../studies/run-state'

/** What is frozen never changes, so that the last ones read are kept; who may see them was asked before. */
const kept = new Map<string, AnchorGround>()
const mostKept = 12

/** The frozen revision as anchors are looked for in it. */
export async function loadGround(tx: Tx, revisionId: string): Promise<AnchorGround> {
  const known = kept.get(revisionId)
  if (known) return known
  const ground = await readGround(tx, revisionId)
  const oldest = kept.keys().next()
  if (kept.size >= mostKept && !oldest.done) kept.delete(oldest.value)
  kept.set(revisionId, ground)
  return ground
}

async function readGround(tx: Tx, revisionId: string): Promise<AnchorGround> {
  const row = await tx.revision.findFirstOrThrow({
    where: { id: revisionId },
    select: { document: true, checks: true, run: { select: { id: true, result: true } } },
  })
  return {
    document: readFrozenStudy(row.document),
    summary: await loadSummary(tx, row.run),
    checks: keptChecks(row.checks),
  }
}
