import { beforeAll, describe, expect, test } from 'vitest'
import type { Role } from '@/lib/policy/role'
import { database } from '@/lib/server/db'
import { enterAsJob } from '@/lib/server/enter'
import { perform } from '@/lib/server/perform'
import { changeRecord } from '@/lib/server/plants/commands'
import { read } from '@/lib/server/read'
import { reportInputOf } from '@/lib/server/reports/report-input'
import * as reviews from '@/lib/server/reviews/commands'
import { inputTicks, myInbox, revisionComments, unreadNotices } from '@/lib/server/reviews/queries'
import { commentSheetFile } from '@/lib/server/reviews/sheet-file'
import * as revisions from '@/lib/server/revisions/commands'
import { computeStudy } from '@/lib/server/studies/commands'
import { studyView } from '@/lib/server/studies/queries'
import { demo } from '@/prisma/seed/seed-demo'
import { actorAs, memberAs } from '../support/cast-actor'
import { useDemo } from '../support/demo'
import { computed } from '../support/path-to-signing'
import { useWorker } from '../support/worker'

const { url } = useDemo()
const worker = useWorker(url)
const { studyId, projectId } = demo

let revisionId = ''
let dip = ''

const view = (role: Role, of = revisionId) => read(revisionComments, actorAs(role), { revisionId: of })
const comment = (role: Role, more: object = {}) =>
  perform(reviews.addComment, actorAs(role), {
    revisionId,
    anchor: dip,
    kind: 'question',
    text: 'Which reference is this?',
    ...more,
  })
const inbox = (role: Role) => read(myInbox, actorAs(role), {})
const one = async (role: Role, number: number, of = revisionId) =>
  (await view(role, of)).comments.find((line) => line.number === number)!

beforeAll(async () => {
  await worker.start()
  const { run } = await computed()
  const first = run.result!.cases[0]!
  dip = `case/${first.caseId}/place/${first.places[0]!.busId}/voltage/deepest`
  revisionId = (await perform(revisions.freezeRevision, actorAs('engineer'), { studyId })).revisionId
}, 120_000)

// one life of one review: each step stands on those before it
describe.sequential('a review', () => {
  test('begins with the check: until then nobody comments, then the checker does', async () => {
    await expect(comment('checker')).rejects.toMatchObject({ code: 'forbidden' })
    await perform(revisions.sendForCheck, actorAs('engineer'), { revisionId })
    await expect(comment('commenter')).rejects.toMatchObject({ code: 'forbidden' })
    expect(await comment('checker', { kind: 'error', assigneeId: memberAs('engineer').id })).toMatchObject({
      number: 1,
    })
  })

  test('keeps words and value of what a comment is about', async () => {
    const line = await one('engineer', 1)
    expect(line).toMatchObject({ kind: 'error', state: 'open', orphaned: false, carriedFrom: null, author: 'R. Obede' })
    expect(line.about).toMatch(/^Case .*, voltage at .*, deepest$/)
    expect(line.valueThen).toMatch(/kV, .* of nominal$/)
    expect(line.valueNow).toBe(line.valueThen)
  })

  test('refuses a comment on what is not there, without a text, or for somebody outside', async () => {
    await expect(comment('checker', { anchor: 'case/none' })).rejects.toMatchObject({ code: 'invalid' })
    await expect(comment('checker', { anchor: '../etc' })).rejects.toMatchObject({ code: 'invalid' })
    await expect(comment('checker', { text: '  ' })).rejects.toMatchObject({ code: 'invalid' })
    await expect(comment('checker', { assigneeId: memberAs('client').id })).rejects.toMatchObject({ code: 'invalid' })
    expect((await view('checker')).comments).toHaveLength(1)
  })

  test('puts what concerns a person into their inbox, and only theirs', async () => {
    expect(await inbox('engineer')).toMatchObject([{ kind: 'assigned', by: 'R. Obede', comment: 1, read: false }])
    expect(await read(unreadNotices, actorAs('engineer'), {})).toBe(1)
    expect(await inbox('checker')).toEqual([])
    await perform(reviews.readNotices, actorAs('engineer'), { revisionId })
    expect(await read(unreadNotices, actorAs('engineer'), {})).toBe(0)
  })

  test('goes on in a thread in which names call people', async () => {
    const { commentId } = await one('engineer', 1)
    const reply = { revisionId, commentId, text: 'Of the voltage before the start. @S. Tharow please note.' }
    await perform(reviews.replyToComment, actorAs('engineer'), reply)
    expect(await inbox('approver')).toMatchObject([{ kind: 'mention', by: 'A. Lindqvar' }])
    expect(await inbox('checker')).toMatchObject([{ kind: 'reply', by: 'A. Lindqvar' }])
    expect((await one('checker', 1)).entries).toMatchObject([{ kind: 'reply', author: 'A. Lindqvar' }])
  })

  test('lets the checker tick an input with the value that was seen, and nobody else', async () => {
    const motor = (await read(studyView, actorAs('engineer'), { studyId })).plant.motor[0]!
    const anchor = `record/motors/${motor.id}/ratedPower`
    const tick = { revisionId, anchor, ticked: true }
    await expect(perform(reviews.tickInput, actorAs('engineer'), tick)).rejects.toMatchObject({ code: 'forbidden' })
    await perform(reviews.tickInput, actorAs('checker'), tick)
    expect(await read(inputTicks, actorAs('engineer'), { revisionId })).toMatchObject([
      { anchor, value: motor.values.ratedPower.text, person: 'R. Obede' },
    ])
    const none = { ...tick, anchor: 'record/motors/gone/ratedPower' }
    await expect(perform(reviews.tickInput, actorAs('checker'), none)).rejects.toMatchObject({ code: 'invalid' })
  })

  test('goes out to the guests, who comment and do not answer', async () => {
    await perform(revisions.decideCheck, actorAs('checker'), { revisionId, accepted: true })
    await comment('commenter', {
      anchor: 'section/method',
      kind: 'request',
      text: '=HYPERLINK("x")',
      dueOn: '2026-12-24',
    })
    const { commentId } = await one('commenter', 2)
    const answer = { revisionId, commentId, response: 'accepted' as const, text: 'Added.' }
    await expect(perform(reviews.respondToComment, actorAs('commenter'), answer)).rejects.toMatchObject({
      code: 'forbidden',
    })
    await perform(reviews.respondToComment, actorAs('engineer'), answer)
    expect(await one('commenter', 2)).toMatchObject({ state: 'answered', response: 'accepted', dueOn: '2026-12-24' })
    const refusal = { ...answer, response: 'refused' as const, text: ' ' }
    await expect(perform(reviews.respondToComment, actorAs('engineer'), refusal)).rejects.toMatchObject({
      code: 'invalid',
    })
  })

  test('never shows comments to a client', async () => {
    await expect(view('client')).rejects.toMatchObject({ code: 'forbidden' })
  })

  test('lets only the author close a comment, an administrator with a reason', async () => {
    const { commentId } = await one('engineer', 2)
    const close = { revisionId, commentId }
    for (const role of ['engineer', 'approver'] as const)
      await expect(perform(reviews.closeComment, actorAs(role), close)).rejects.toMatchObject({ code: 'forbidden' })
    await expect(perform(reviews.closeComment, actorAs('administrator'), close)).rejects.toMatchObject({
      message: expect.stringMatching(/^Say why/),
    })
    await perform(reviews.closeComment, actorAs('commenter'), close)
    await perform(reviews.reopenComment, actorAs('commenter'), close)
    expect(await one('engineer', 2)).toMatchObject({ state: 'open', response: null })
    await perform(reviews.closeComment, actorAs('administrator'), { ...close, reason: 'The guest has left.' })
    expect((await one('engineer', 2)).entries.at(-1)).toMatchObject({ kind: 'closed', text: 'The guest has left.' })
  })

  test('is not closed while an error is open or a check is not passed, unless each is waived with a reason', async () => {
    await perform(revisions.decideReview, actorAs('approver'), { revisionId, accepted: true })
    const closing = () => perform(revisions.closeReview, actorAs('approver'), { revisionId, purpose: 'For review' })
    await expect(closing()).rejects.toMatchObject({ code: 'wrong-state', message: expect.stringMatching(/hold.* up/) })
    const { holdUps } = await view('approver')
    const error = holdUps.find(({ kind }) => kind === 'comment')!
    expect(error.what).toMatch(/^Comment 1, error/)
    const waiver = { revisionId, kind: error.kind, subjectId: error.subjectId, reason: ' ' }
    await expect(perform(reviews.waive, actorAs('approver'), waiver)).rejects.toMatchObject({ code: 'invalid' })
    const said = { ...waiver, reason: 'Answered in the letter of 3 June.' }
    for (const role of ['engineer', 'checker', 'administrator'] as const)
      await expect(perform(reviews.waive, actorAs(role), said)).rejects.toMatchObject({ code: 'forbidden' })
    await perform(reviews.waive, actorAs('approver'), said)
    await expect(perform(reviews.waive, actorAs('approver'), said)).rejects.toMatchObject({ code: 'wrong-state' })
    expect((await view('engineer')).holdUps.find(({ kind }) => kind === 'comment')?.waived).toMatchObject({
      person: 'S. Tharow',
    })
  })

  test('hands waivers and the comment sheet to the report', async () => {
    const { revision } = await database().$transaction(async (tx) => {
      await enterAsJob(tx, demo.organisationId)
      return reportInputOf(tx, revisionId, true)
    })
    expect(revision.waivers).toMatchObject([{ reason: 'Answered in the letter of 3 June.', who: 'S. Tharow' }])
    expect(revision.comments).toMatchObject([
      { number: 1, kind: 'error', state: 'open', thread: [{ what: 'Reply' }] },
      { number: 2, state: 'closed' },
    ])
  })

  test('gives the sheet to a spreadsheet without letting a comment run as a formula', async () => {
    const sheet = commentSheetFile(await view('engineer'))
    expect(sheet).toContain(`"'=HYPERLINK(""x"")"`)
    expect(sheet.split('\r\n')[0]).toContain('number,kind,state')
  })

  test('carries what is unsettled over to the next revision, with the value that stands there now', async () => {
    await perform(revisions.backToDraft, actorAs('approver'), { revisionId, reason: 'One more case.' })
    const study = await read(studyView, actorAs('engineer'), { studyId })
    const { id, version, values } = study.plant.supply[0]!
    const voltage = { text: '32.6 kV', provenance: values.before.voltage.provenance }
    const before = { kind: 'bus-voltage' as const, voltage }
    await perform(changeRecord, actorAs('engineer'), {
      projectId,
      kind: 'supply',
      id,
      version,
      values: { ...values, before },
    })
    await perform(computeStudy, actorAs('engineer'), { studyId })
    await computed()
    const next = await perform(revisions.freezeRevision, actorAs('engineer'), { studyId })
    const { comments } = await view('engineer', next.revisionId)
    expect(comments.map(({ number }) => number)).toEqual([1])
    const line = comments[0]!
    expect(line).toMatchObject({ carriedFrom: 1, orphaned: false, state: 'open' })
    const made = next.revisionId
    expect((await view('engineer')).comments.map(({ number }) => number)).toEqual([1, 2])
    const answer = { revisionId: made, commentId: line.commentId, response: 'accepted' as const, text: 'Stated now.' }
    await perform(reviews.respondToComment, actorAs('engineer'), answer)
    expect(await one('checker', 1, made)).toMatchObject({ state: 'answered' })
  }, 120_000)
})
