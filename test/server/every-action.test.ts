import { beforeAll, describe, expect, test } from 'vitest'
import type { Role } from '@/lib/policy/role'
import type { Actor } from '@/lib/server/actor'
import { now } from '@/lib/server/clock'
import { database } from '@/lib/server/db'
import { createAccount } from '@/lib/server/people/create-account'
import { foundOrganisation } from '@/lib/server/people/found-organisation'
import { perform } from '@/lib/server/perform'
import { read } from '@/lib/server/read'
import * as commands from '@/lib/server/revisions/commands'
import { revisionView } from '@/lib/server/revisions/queries'
import { reportFile } from '@/lib/server/revisions/report-file'
import { demo } from '@/prisma/seed/seed-demo'
import { actorAs } from './support/cast-actor'
import { useDemo } from './support/demo'
import { type Attempt, furtherAttempts, liveAttempts, type Place, revisionAttempts } from './support/every-action'
import { computed, signingBegun, waiveAll } from './support/path-to-signing'
import { signAs } from './support/signing'
import { useWorker } from './support/worker'

const { url, keyOf } = useDemo()
const worker = useWorker(url)

/** One letter a person: the preparer, the checker and the approver of this revision, commenter, client, administrator. */
const people: Record<string, Role> = {
  P: 'engineer',
  C: 'checker',
  A: 'approver',
  m: 'commenter',
  l: 'client',
  s: 'administrator',
}
const stranger: Actor = { userId: 'stranger', name: 'T. Elsewhere', email: 't.elsewhere@another-office.example' }
const place: Place = { ...demo, revisionId: '' }
const seen: Record<string, Record<string, string>> = {}

const letIn = async (attempt: Attempt): Promise<string> => {
  let letters = ''
  for (const [letter, role] of Object.entries(people))
    if ((await attempt.try(actorAs(role), place)) === 'let in') letters += letter
  return letters || '-'
}

/** Tries everything on the revision as it stands now, as everybody. */
async function look(moment: string) {
  for (const attempt of revisionAttempts) seen[attempt.name] = { ...seen[attempt.name], [moment]: await letIn(attempt) }
}

const tabled = (rows: Record<string, Record<string, string>>): string => {
  const row = (cells: readonly string[]) =>
    cells
      .map((cell, i) => cell.padEnd(i === 0 ? 20 : 10))
      .join('')
      .trimEnd()
  const moments = Object.keys(Object.values(rows)[0] ?? {})
  return [
    row(['', ...moments]),
    ...Object.entries(rows).map(([name, cells]) => row([name, ...Object.values(cells)])),
  ].join('\n')
}

beforeAll(async () => {
  await worker.start()
  await computed()
  place.revisionId = (await perform(commands.freezeRevision, actorAs('engineer'), { studyId: demo.studyId })).revisionId
  await database().$transaction(async (tx) => {
    const account = { ...stranger, id: stranger.userId, password: 'of nobody else here', initialPassword: false }
    await createAccount(tx, account, now())
    await foundOrganisation(tx, stranger, { id: 'another-office', name: 'Another office' }, now())
  })
}, 180_000)

describe.sequential('the server itself lets in', () => {
  test('to live records and people exactly whom the table names', async () => {
    const table: Record<string, Record<string, string>> = {}
    for (const attempt of liveAttempts) table[attempt.name] = { 'lets in': await letIn(attempt) }
    expect(`\n${tabled(table)}\n`).toBe(`
                    lets in
createProject       Ps
inviteMember        s
withdrawInvitation  s
changeMember        s
projectMembers      PCAs
livePlace           PCAmls
projectTimeline     PCAs
plantRecords        PCAs
addRecord           P
changeRecord        P
removeRecord        P
createStudy         P
studyView           PCAs
runProgress         PCAs
studyResults        PCAs
caseSeries          PCAs
changeStudy         P
addStudyRecord      P
changeStudyRecord   P
removeStudyRecord   P
computeStudy        PCA
stopComputing       PCA
freezeRevision      P
`)
  })

  test('to a revision, from the freeze to the withdrawal, exactly whom the table names', async () => {
    const revisionId = place.revisionId
    const of = { revisionId }
    await look('draft')
    await perform(commands.sendForCheck, actorAs('engineer'), of)
    await look('in check')
    await perform(commands.decideCheck, actorAs('checker'), { ...of, accepted: true })
    await look('in review')
    await perform(commands.decideReview, actorAs('approver'), { ...of, accepted: true })
    await look('accepted')
    await waiveAll(revisionId)
    await perform(commands.closeReview, actorAs('approver'), { ...of, purpose: 'For approval by the utility' })
    await signingBegun(revisionId)
    await look('round 0')
    await signAs(actorAs('engineer'), revisionId, 'prepared', await keyOf('engineer'))
    await look('round 1')
    await signAs(actorAs('checker'), revisionId, 'checked', await keyOf('checker'))
    await look('round 2')
    await signAs(actorAs('approver'), revisionId, 'approved', await keyOf('approver'))
    await look('round 3')
    await perform(commands.issueRevision, actorAs('approver'), of)
    await look('issued')
    await perform(commands.withdrawRevision, actorAs('approver'), { ...of, reason: 'The supply was changed.' })
    await look('withdrawn')
    expect(`\n${tabled(seen)}\n`).toBe(`
                    draft     in check  in review accepted  round 0   round 1   round 2   round 3   issued    withdrawn
revisionView        PCAs      PCAs      PCAms     PCAms     PCAms     PCAms     PCAms     PCAms     PCAmls    PCAmls
revisionDocument    PCAs      PCAs      PCAms     PCAms     PCAms     PCAms     PCAms     PCAms     PCAmls    PCAmls
revisionSeries      PCAs      PCAs      PCAms     PCAms     PCAms     PCAms     PCAms     PCAms     PCAmls    PCAmls
revisionComments    PCAs      PCAs      PCAms     PCAms     PCAms     PCAms     PCAms     PCAms     PCAms     PCAms
compareRevisions    PCAs      PCAs      PCAms     PCAms     PCAms     PCAms     PCAms     PCAms     PCAmls    PCAmls
inputTicks          PCAs      PCAs      PCAms     PCAms     PCAms     PCAms     PCAms     PCAms     PCAms     PCAms
addComment          -         PC        PCAm      PCAm      -         -         -         -         -         -
respondToComment    PCA       PCA       PCA       PCA       -         -         -         -         -         -
replyToComment      -         PC        PCAm      PCAm      -         -         -         -         -         -
closeComment        PCAs      PCAs      PCAms     PCAms     -         -         -         -         -         -
reopenComment       PCAs      PCAs      PCAms     PCAms     -         -         -         -         -         -
waive               -         -         A         A         -         -         -         -         -         -
tickInput           -         C         -         -         -         -         -         -         -         -
readNotices         PCAs      PCAs      PCAms     PCAms     PCAms     PCAms     PCAms     PCAms     PCAms     PCAms
sendForCheck        P         -         -         -         -         -         -         -         -         -
decideCheck yes     -         C         -         -         -         -         -         -         -         -
decideCheck no      -         C         -         -         -         -         -         -         -         -
decideReview yes    -         -         A         A         -         -         -         -         -         -
decideReview no     -         -         A         A         -         -         -         -         -         -
closeReview         -         -         -         A         -         -         -         -         -         -
renderAgain         PCAs      PCAs      PCAs      PCAs      PCAs      PCAs      PCAs      PCAs      PCAs      PCAs
backToDraft         -         PCA       PCA       PCA       PCA       PCA       PCA       -         -         -
sign prepared       -         -         -         -         P         -         -         -         -         -
sign checked        -         -         -         -         -         C         -         -         -         -
sign approved       -         -         -         -         -         -         A         -         -         -
issueRevision       -         -         -         -         -         -         -         A         -         -
withdrawRevision    -         -         -         -         -         -         -         As        As        -
shareReport         -         -         -         -         -         -         -         -         PAs       -
endShare            -         -         -         -         -         -         -         -         PAs       PAs
shareLinks          -         -         -         -         -         -         -         -         PAs       PAs
`)
  }, 180_000)

  test('nobody of another organisation to anything, and tells them the same of what is not there', async () => {
    const nothing: Place = { organisationId: 'none', projectId: 'none', studyId: 'none', revisionId: 'none' }
    for (const attempt of [...liveAttempts, ...revisionAttempts, ...furtherAttempts])
      for (const where of [place, nothing])
        expect([attempt.name, await attempt.try(stranger, where)]).toEqual([attempt.name, 'unreachable'])
    const refused = { code: 'not-found', message: expect.stringMatching(/nothing here that you can open/) }
    await expect(reportFile(stranger, place.revisionId)).rejects.toMatchObject(refused)
  })

  test('nobody by an account that has no part anywhere', async () => {
    const nobody: Actor = { userId: '', name: 'nobody', email: '' }
    for (const attempt of [...liveAttempts, ...revisionAttempts, ...furtherAttempts])
      expect([attempt.name, await attempt.try(nobody, place)]).toEqual([attempt.name, 'unreachable'])
  })

  test('and trying it all has changed nothing', async () => {
    expect((await read(revisionView, actorAs('engineer'), { revisionId: place.revisionId })).state).toBe('withdrawn')
  })
})

test('every command and query of the server is tried here', async () => {
  const files = import.meta.glob(
    '/lib/server/{compare,live,people,plants,reviews,studies,timeline,revisions,share,signoff}/*{commands,queries,invite}.ts',
    { eager: true },
  )
  const isAction = (one: unknown) => typeof one === 'object' && one !== null && 'scope' in one && 'may' in one
  const names = Object.values(files)
    .flatMap((file) => Object.entries(file as object))
    .filter(([, one]) => isAction(one))
    .map(([name]) => name)
  // these concern the person's own organisation only: they are let in by being its member, and have tests of their own
  const own = ['registerCertificate', 'listedCertificates', 'authorityCertificate', 'signingChallenge']
  const tried = [...liveAttempts, ...revisionAttempts, ...furtherAttempts].map(({ name }) => name.split(' ')[0]!)
  expect([...new Set(names)].sort()).toEqual(
    [...new Set([...tried.filter((name) => name !== 'sign'), 'prepareSignature', ...own])].sort(),
  )
})
