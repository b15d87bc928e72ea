import 'server-only'
import { createHash } from 'node:crypto'
import { appendEvents, type Event, lockHead } from '../audit'
import { now } from '../clock'
import type { Database, Tx } from '../db'
import { enterAsJob } from '../enter'
import { newId } from '../identity'
import type { ClaimedReport } from './claim-report'
import { enqueue } from './enqueue'

const system = { userId: null, name: 'Breakaway' }

const held = ({ reportId, attempt }: ClaimedReport) => ({ id: reportId, attempt, state: 'running' })

/** A rendered PDF and its number of pages. */
export interface RenderedReport {
  pdf: Uint8Array
  pages: number
}

/**
 * Stores the rendered file. With the final report of a revision whose review is closed the signing round begins: these bytes, and no
 * others, are what is signed.
 */
export function storeReport(db: Database, report: ClaimedReport, { pdf, pages }: RenderedReport): Promise<boolean> {
  const file = new Uint8Array(pdf)
  const sha256 = createHash('sha256').update(file).digest('hex')
  return commit(db, report, async (tx) => {
    const at = now()
    const { count } = await tx.report.updateMany({
      where: held(report),
      data: { state: 'done', file, sha256, pages, bytes: file.length, finishedAt: at },
    })
    if (count === 0) return []
    const { organisationId, revisionId, reportId, kind } = report
    const subject = { kind: 'revision', id: revisionId }
    const rendered: Event = { action: 'report-rendered', subject, payload: { kind, reportId, sha256, pages } }
    if (!(await awaitsRound(tx, report))) return [rendered]
    const roundId = newId()
    await tx.signatureRound.create({
      data: { organisationId, id: roundId, revisionId, reportId, startedAt: at, file, sha256 },
    })
    return [rendered, { action: 'signing-begun', subject, payload: { roundId, sha256 } }]
  })
}

/** Only the newest final report of a revision that is still closed for review is signed. */
async function awaitsRound(tx: Tx, { revisionId, reportId, kind }: ClaimedReport): Promise<boolean> {
  if (kind !== 'final') return false
  const revision = await tx.revision.findFirstOrThrow({ where: { id: revisionId }, select: { state: true } })
  if (revision.state !== 'review-closed') return false
  const newest = await tx.report.findFirst({
    where: { revisionId, kind: 'final' },
    orderBy: { queuedAt: 'desc' },
    select: { id: true },
  })
  const open = await tx.signatureRound.findFirst({ where: { revisionId, endedAt: null }, select: { id: true } })
  return newest?.id === reportId && open === null
}

export const failReport = (db: Database, report: ClaimedReport, failure: string): Promise<boolean> =>
  commit(db, report, async (tx) => {
    const data = { state: 'failed', failure, finishedAt: now() }
    const { count } = await tx.report.updateMany({ where: held(report), data })
    const { revisionId, reportId, kind } = report
    const subject = { kind: 'revision', id: revisionId }
    return count === 0 ? [] : [{ action: 'report-failed', subject, payload: { kind, reportId, failure } }]
  })

/** Gives the report back to the queue, as new. */
export const handBackReport = (db: Database, report: ClaimedReport): Promise<void> =>
  db.$transaction(async (tx) => {
    const { organisationId, reportId } = report
    await enterAsJob(tx, organisationId)
    const { count } = await tx.report.updateMany({ where: held(report), data: { state: 'queued' } })
    if (count === 1) await enqueue(tx, 'render', { organisationId, reportId })
  })

function commit(db: Database, report: ClaimedReport, write: (tx: Tx) => Promise<Event[]>): Promise<boolean> {
  return db.$transaction(async (tx) => {
    await enterAsJob(tx, report.organisationId)
    const head = await lockHead(tx, report.organisationId, report.projectId)
    const events = await write(tx)
    await appendEvents(tx, head, system, now(), events)
    return events.length > 0
  })
}
