import { makeSigningKey, type NewSigningKey } from '@/app/(account)/_signing/signing-key'
import velmoor from '@/lib/cli/examples/velmoor.json'
import type { Actor } from '@/lib/server/actor'
import { appendEvents, chainStart, lockHead } from '@/lib/server/audit'
import { now } from '@/lib/server/clock'
import type { WriteContext } from '@/lib/server/context'
import { type Database, database, type Tx } from '@/lib/server/db'
import { createAccount } from '@/lib/server/people/create-account'
import { foundOrganisation } from '@/lib/server/people/found-organisation'
import { makeChallenge } from '@/lib/server/signoff/challenge'
import { issueCertificate } from '@/lib/server/signoff/issue-certificate'
import { requestRun } from '@/lib/server/studies/request-run'
import { loadStudy } from '@/lib/server/studies/study-of'
import { takeInDocument } from '@/lib/server/studies/take-in-document'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { readStudyValue } from '@/lib/study/read/read-study'
import type { CastMember } from './cast'
import { makeDemoPeople, writeDemoSecrets } from './demo-secrets'

export const demo = {
  organisationId: 'demo-harrowgate-quill',
  projectId: 'demo-velmoor',
  studyId: 'demo-velmoor-starting',
}

/** When the invented records were entered. Accounts and certificates are real and carry the real time. */
const entered = new Date('2026-05-20T08:00:00.000Z')

interface Enrolled {
  member: CastMember
  password: string
  challenge: Uint8Array<ArrayBuffer>
  key: NewSigningKey | null
}

const actorOf = ({ id, name, email }: CastMember): Actor => ({ userId: id, name, email })

/** Fills an empty database with the demo: people, plant, study, and the request to compute it. False when anybody is there already. */
export async function seedDemo(secretsFile: string, db: Database = database()): Promise<boolean> {
  if ((await db.user.count()) > 0) return false
  const people = makeDemoPeople(secretsFile)
  const enrolled: Enrolled[] = []
  for (const { member, password, passphrase } of people) {
    const challenge = new Uint8Array(makeChallenge(member.id, now()))
    enrolled.push({ member, password, challenge, key: passphrase ? await makeSigningKey(passphrase, challenge) : null })
  }
  // before the database: people whose passwords nobody knows would be lost
  writeDemoSecrets(
    secretsFile,
    people.map((person, index) => ({ ...person, key: enrolled[index]?.key?.file })),
  )
  await db.$transaction((tx) => fill(tx, enrolled), { timeout: 60_000 })
  return true
}

async function fill(tx: Tx, enrolled: readonly Enrolled[]): Promise<void> {
  const document = velmoorStudy()
  const at = now()
  for (const { member, password } of enrolled) {
    await createAccount(tx, { ...member, password, initialPassword: false }, at)
  }
  const administrator = enrolled.find(({ member }) => member.role === 'administrator')
  const engineer = enrolled.find(({ member }) => member.role === 'engineer')
  if (!administrator || !engineer) throw new Error('the cast lacks an administrator or an engineer')
  const { organisationId, projectId } = demo
  await foundOrganisation(
    tx,
    actorOf(administrator.member),
    { id: organisationId, name: document.head.organisation },
    at,
  )
  await tx.project.create({
    data: {
      organisationId,
      id: projectId,
      name: document.head.project,
      client: document.head.client,
      createdAt: entered,
      auditHash: chainStart,
    },
  })
  for (const { member } of enrolled) await enrol(tx, member, at)
  for (const one of enrolled) await certify(tx, one, at)
  await takeIn(tx, document, actorOf(engineer.member), at)
}

function velmoorStudy(): StudyDocument {
  const read = readStudyValue(velmoor)
  if (read.ok) return read.value
  throw new Error(
    `the example study is wrong: ${read.error.issues.map(({ path, message }) => `${path.join('.')}: ${message}`).join('; ')}`,
  )
}

async function enrol(tx: Tx, { id, role, member }: CastMember, at: Date): Promise<void> {
  const { organisationId, projectId } = demo
  const added = { organisationId, userId: id, addedAt: at }
  if (role === 'administrator') return
  if (member) await tx.membership.create({ data: { ...added, role: 'member' } })
  await tx.projectMembership.create({ data: { ...added, projectId, roles: [role] } })
}

async function certify(tx: Tx, { member, challenge, key }: Enrolled, at: Date): Promise<void> {
  if (!key) return
  const { organisationId } = demo
  const head = await lockHead(tx, organisationId, null)
  const context = contextOf(tx, actorOf(member), null, at)
  const { events } = await issueCertificate(context, { spki: key.spki, challenge, proof: key.proof })
  await appendEvents(tx, head, context.actor, at, events)
}

async function takeIn(tx: Tx, document: StudyDocument, engineer: Actor, at: Date): Promise<void> {
  const { organisationId, projectId, studyId } = demo
  await takeInDocument(tx, demo, document, engineer, entered)
  let head = await lockHead(tx, organisationId, projectId)
  const { title, documentNumber, project, client } = document.head
  head = await appendEvents(tx, head, engineer, entered, [
    { action: 'project-created', subject: { kind: 'project', id: projectId }, payload: { name: project, client } },
    { action: 'study-taken-in', subject: { kind: 'study', id: studyId }, payload: { title, documentNumber } },
  ])
  const { events } = await requestRun(contextOf(tx, engineer, projectId, at), await loadStudy(tx, studyId))
  await appendEvents(tx, head, engineer, at, events)
}

const contextOf = (tx: Tx, actor: Actor, projectId: string | null, at: Date): WriteContext => ({
  tx,
  actor,
  place: { organisationId: demo.organisationId, projectId, roles: [] },
  policy: { userId: actor.userId, roles: [] },
  at,
})
