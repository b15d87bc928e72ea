import { beforeAll, describe, expect, test } from 'vitest'
import { compareRevisions } from '@/lib/server/compare/queries'
import { database } from '@/lib/server/db'
import { changeMember } from '@/lib/server/people/member-commands'
import { perform } from '@/lib/server/perform'
import { changeRecord } from '@/lib/server/plants/commands'
import { read } from '@/lib/server/read'
import {
  backToDraft,
  closeReview,
  decideCheck,
  decideReview,
  freezeRevision,
  issueRevision,
  sendForCheck,
} from '@/lib/server/revisions/commands'
import { revisionView } from '@/lib/server/revisions/queries'
import { reportFile } from '@/lib/server/revisions/report-file'
import { prepareSignature } from '@/lib/server/signoff/commands'
import { verifyUpload } from '@/lib/server/signoff/verify-upload'
import { computeStudy } from '@/lib/server/studies/commands'
import { studyView } from '@/lib/server/studies/queries'
import { ensureBundles } from '@/lib/start/bundle.mjs'
import { withLock } from '@/lib/start/lock.mjs'
import { inRoot } from '@/lib/start/root.mjs'
import { demo } from '@/prisma/seed/seed-demo'
import { actorAs } from './support/cast-actor'
import { breakOf } from './support/chain'
import { useDemo } from './support/demo'
import { computed, signingBegun, waiveAll } from './support/path-to-signing'
import { signAs } from './support/signing'
import { until, useWorker } from './support/worker'

const { url, keyOf } = useDemo()
const worker = useWorker(url)

// the thread that checks uploaded files is a program of its own
beforeAll(async () => {
  await withLock(inRoot('.data', 'test', 'template.lock'), () => ensureBundles(() => {}))
})

const { projectId, studyId } = demo
const lindqvar = actorAs('engineer')
const obede = actorAs('checker')
const tharow = actorAs('approver')

let revisionId = ''
const revision = () => read(revisionView, lindqvar, { revisionId })
const study = () => read(studyView, lindqvar, { studyId })
const forbidden = (message: string | RegExp) => ({ code: 'forbidden', message: expect.stringMatching(message) })

/** Gives people further parts, so that what is refused is refused to the person and not for want of the part. */
const giveEveryPart = async () => {
  for (const { userId } of [lindqvar, obede, tharow]) {
    const roles: ('engineer' | 'checker' | 'approver')[] = ['engineer', 'checker', 'approver']
    await perform(changeMember, actorAs('administrator'), { projectId, userId, roles })
  }
}

// one life of one revision: each step stands on those before it
describe.sequential('from records to an issued report', () => {
  test('nothing is frozen without results', async () => {
    const attempt = perform(freezeRevision, lindqvar, { studyId })
    await expect(attempt).rejects.toMatchObject({
      code: 'wrong-state',
      message: expect.stringMatching(/^Compute the cases first/),
    })
    expect((await study()).revisions).toEqual([])
  })

  test('a worker computes every case, and says so of these records', async () => {
    await worker.start()
    const { run, rows } = await computed()
    expect(run).toMatchObject({ state: 'done', failure: null, stale: false, done: rows.case.length })
    expect(run.result?.cases.map(({ caseId }) => caseId)).toEqual(rows.case.map(({ id }) => id))
  })

  test('results of records that have changed since are not frozen either', async () => {
    const { id, version, values } = (await study()).plant.capacitor[0]!
    const rating = { text: '1.3 Mvar', provenance: values.rating.provenance }
    const kind = 'capacitor' as const
    const changed = await perform(changeRecord, lindqvar, {
      projectId,
      kind,
      id,
      version,
      values: { ...values, rating },
    })
    expect((await study()).run.stale).toBe(true)
    await expect(perform(freezeRevision, lindqvar, { studyId })).rejects.toMatchObject({ code: 'wrong-state' })
    await perform(changeRecord, lindqvar, { projectId, kind, id, version: changed.version, values })
    expect((await study()).run.stale).toBe(false)
  })

  test('frozen, it stays as it was while the records go on', async () => {
    const frozen = await perform(freezeRevision, lindqvar, { studyId, note: 'First issue.' })
    expect(frozen).toMatchObject({ number: expect.any(Number), attempt: 1 })
    revisionId = frozen.revisionId
    const before = await revision()
    expect(before).toMatchObject({ state: 'draft', preparedBy: 'A. Lindqvar', movedSince: [] })
    const { id, version, values } = (await study()).plant.capacitor[0]!
    const change = {
      projectId,
      kind: 'capacitor' as const,
      id,
      version,
      values: { ...values, note: 'After the freeze.' },
    }
    await perform(changeRecord, lindqvar, change)
    const after = await revision()
    expect(after.documentHash).toBe(before.documentHash)
    expect(after.movedSince).toMatchObject([{ kind: 'capacitor', id, change: 'changed', by: 'A. Lindqvar' }])
  })

  test('nobody checks what was not sent, and the preparer never checks', async () => {
    await giveEveryPart()
    const check = { revisionId, accepted: true } as const
    await expect(perform(decideCheck, obede, check)).rejects.toMatchObject(forbidden(/while the revision is a draft/))
    const sendOthers = perform(sendForCheck, obede, { revisionId })
    await expect(sendOthers).rejects.toMatchObject(forbidden(/Only the engineer who prepared/))
    await perform(sendForCheck, lindqvar, { revisionId })
    await expect(perform(decideCheck, lindqvar, check)).rejects.toMatchObject(
      forbidden(/^Whoever prepared a revision neither checks/),
    )
    expect((await revision()).state).toBe('in-check')
  })

  test('a check that is not accepted sends it back with its reason, and it can be sent again', async () => {
    const unsaid = perform(decideCheck, obede, { revisionId, accepted: false, note: ' ' })
    await expect(unsaid).rejects.toMatchObject({ code: 'invalid' })
    await perform(decideCheck, obede, { revisionId, accepted: false, note: 'Say where the cable data are from.' })
    expect(await revision()).toMatchObject({ state: 'draft' })
    await perform(sendForCheck, lindqvar, { revisionId, note: 'Said in the assumptions.' })
    await perform(decideCheck, obede, { revisionId, accepted: true })
    expect(await revision()).toMatchObject({ state: 'in-review' })
  })

  test('neither preparer nor checker reviews, and a review is accepted before it is closed', async () => {
    const review = { revisionId, accepted: true } as const
    const close = { revisionId, purpose: 'For approval by the utility' }
    await expect(perform(decideReview, lindqvar, review)).rejects.toMatchObject(forbidden(/^Whoever prepared/))
    await expect(perform(decideReview, obede, review)).rejects.toMatchObject(forbidden(/^Whoever checked/))
    await expect(perform(closeReview, tharow, close)).rejects.toMatchObject(forbidden(/^Accept the review before/))
    await perform(decideReview, tharow, review)
    await waiveAll(revisionId)
    await perform(closeReview, tharow, close)
    const { renderFailure, roundStartedAt } = await signingBegun(revisionId)
    expect(renderFailure).toBe(null)
    expect(roundStartedAt).not.toBe(null)
  })

  test('signatures are given in their order, by three people, each with the key on the list', async () => {
    const ask = (actor: typeof lindqvar, role: 'prepared' | 'checked' | 'approved') =>
      perform(prepareSignature, actor, { revisionId, role })
    await expect(ask(obede, 'checked')).rejects.toMatchObject(forbidden(/due next is “prepared”/))
    await expect(ask(tharow, 'approved')).rejects.toMatchObject(forbidden(/due next is “prepared”/))
    await expect(ask(obede, 'prepared')).rejects.toMatchObject(forbidden(/^Only the engineer who prepared/))
    const foreign = signAs(lindqvar, revisionId, 'prepared', await keyOf('checker'))
    await expect(foreign).rejects.toMatchObject({ name: 'DomainError' })
    expect((await revision()).signoffs).toEqual([])

    expect(await signAs(lindqvar, revisionId, 'prepared', await keyOf('engineer'))).toMatchObject({ next: 'checked' })
    await expect(ask(lindqvar, 'prepared')).rejects.toMatchObject(forbidden(/due next is “checked”/))
    await expect(ask(lindqvar, 'checked')).rejects.toMatchObject(forbidden(/^Whoever prepared/))
    await expect(ask(tharow, 'checked')).rejects.toMatchObject(forbidden(/^Only the checker who accepted/))
    expect(await signAs(obede, revisionId, 'checked', await keyOf('checker'))).toMatchObject({ next: 'approved' })
    await expect(ask(obede, 'approved')).rejects.toMatchObject(forbidden(/^Whoever checked/))
    await expect(perform(issueRevision, tharow, { revisionId })).rejects.toMatchObject(
      forbidden(/“approved” is missing/),
    )
    expect(await signAs(tharow, revisionId, 'approved', await keyOf('approver'))).toMatchObject({ next: null })
    const signed = (await revision()).signoffs
    expect(signed.map(({ role, person }) => [role, person])).toEqual([
      ['prepared', 'A. Lindqvar'],
      ['checked', 'R. Obede'],
      ['approved', 'S. Tharow'],
    ])
    expect(new Set(signed.map(({ certificate }) => certificate)).size).toBe(3)
  })

  test("signed by all and not issued yet, the file is nobody's issued report", async () => {
    const { verdict, standing } = await verifyUpload((await reportFile(tharow, revisionId)).bytes)
    expect(verdict.registered).toBe(false)
    expect(standing).toEqual({ kind: 'unknown' })
    const back = perform(backToDraft, lindqvar, { revisionId, reason: 'One more thought.' })
    await expect(back).rejects.toMatchObject(forbidden(/^All three have signed/))
  })

  test('issued, the client has it, and anybody who holds the file is told that it is valid and issued', async () => {
    const client = actorAs('client')
    await expect(reportFile(client, revisionId)).rejects.toMatchObject(forbidden(/not issued/))
    await expect(perform(issueRevision, obede, { revisionId })).rejects.toMatchObject(forbidden(/approver who signed/))
    await perform(issueRevision, tharow, { revisionId })
    const { bytes, sha256 } = await reportFile(client, revisionId)
    const { verdict, standing, organisation, study } = await verifyUpload(bytes)
    expect(verdict).toMatchObject({ overall: 'valid', registered: true, sha256, findings: [] })
    expect(verdict.signatures.map(({ signer, trust, stands }) => [signer.name, trust, stands])).toEqual([
      ['A. Lindqvar', 'trusted', true],
      ['R. Obede', 'trusted', true],
      ['S. Tharow', 'trusted', true],
    ])
    const { number } = await revision()
    expect(standing).toMatchObject({ kind: 'issued', number, purpose: 'For approval by the utility' })
    expect(organisation).toBe('Harrowgate & Quill Power Consultants')
    expect(JSON.parse(study ?? '{}')).toHaveProperty('format')
  })

  test('with one byte other than issued, the file is not the issued one any more', async () => {
    const bytes = new Uint8Array((await reportFile(tharow, revisionId)).bytes)
    bytes[Math.floor(bytes.length / 3)]! ^= 1
    const { verdict, standing } = await verifyUpload(bytes)
    expect(verdict.registered).toBe(false)
    expect(['changed', 'unreadable']).toContain(verdict.overall)
    expect(standing).toEqual({ kind: 'unknown' })
  })

  test('the audit chain over all of it holds', async () => {
    expect(await database().$transaction(breakOf)).toBe(null)
  })

  test('the next revision supersedes it, and its file says so from then on', async () => {
    const { bytes } = await reportFile(tharow, revisionId)
    const { number } = await revision()
    await perform(computeStudy, lindqvar, { studyId })
    await until(study, ({ run }) => run.state === 'done' && !run.stale)
    const next = await perform(freezeRevision, lindqvar, { studyId, note: 'Capacitor noted.' })
    expect(next).toMatchObject({ number: number + 1, attempt: 1 })
    await perform(sendForCheck, lindqvar, { revisionId: next.revisionId })
    await perform(decideCheck, obede, { revisionId: next.revisionId, accepted: true })
    await perform(decideReview, tharow, { revisionId: next.revisionId, accepted: true })
    await waiveAll(next.revisionId)
    await perform(closeReview, tharow, { revisionId: next.revisionId, purpose: 'For construction' })
    const compared = await read(compareRevisions, lindqvar, { from: revisionId, to: next.revisionId })
    expect(compared.inputs).toMatchObject([{ field: 'note', after: 'After the freeze.' }])
    expect(compared).toMatchObject({ verdicts: [], results: [] })
    await signingBegun(next.revisionId)
    await signAs(lindqvar, next.revisionId, 'prepared', await keyOf('engineer'))
    await signAs(obede, next.revisionId, 'checked', await keyOf('checker'))
    await signAs(tharow, next.revisionId, 'approved', await keyOf('approver'))
    await perform(issueRevision, tharow, { revisionId: next.revisionId })
    const { verdict, standing } = await verifyUpload(bytes)
    expect(verdict).toMatchObject({ overall: 'valid', registered: true })
    expect(standing).toMatchObject({ kind: 'superseded', number, current: { number: number + 1 } })
  })
})
