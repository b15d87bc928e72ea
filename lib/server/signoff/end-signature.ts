import 'server-only'
import { createHash } from 'node:crypto'
import { DomainError } from '@/lib/errors'
import type { RevisionSubject } from '@/lib/policy/subject'
import { completeSignature } from '@/lib/seal/complete-signature'
import { prepareSignature } from '@/lib/seal/prepare-signature'
import { nextSignature, type SignOffRole } from '@/lib/study/states'
import type { Actor } from '../actor'
import type { WriteContext } from '../context'
import type { Tx } from '../db'
import type { Done } from '../perform'
import { loadRevision, type RevisionWithSubject, signOffRole } from '../revisions/subject'
import { tokenHash } from './begin-signature'
import { orderOf } from './order-of'
import { certificateFor, openRound } from './round-of'

interface Begun {
  row: RevisionWithSubject
  subject: RevisionSubject
  role: SignOffRole
  begun: { token: string; fingerprint: string; baseSha256: string; at: Date; expiresAt: Date }
}

export interface GivenSignature {
  role: SignOffRole
  /** Hash of the file with this signature in it. */
  sha256: string
  /** What is due next; null when all have signed. */
  next: SignOffRole | null
}

const startAgain = (why: string) => new DomainError('wrong-state', `${why}: begin the signature again.`)

/** The signature that this person began for this revision. A token of somebody else, or of another revision, is unknown here. */
async function load(tx: Tx, actor: Actor, revisionId: string, token: string): Promise<Begun> {
  const { row, subject } = await loadRevision(tx, revisionId)
  const begun = await tx.preparedSignature.findFirst({
    where: { token: tokenHash(token), userId: actor.userId, round: { revisionId, endedAt: null } },
  })
  if (!begun) throw startAgain('This signature is not waiting any more')
  return { row, subject, role: signOffRole(begun.role), begun }
}

async function run(
  { tx, actor, at, place }: WriteContext,
  { row, subject, role, begun }: Begun,
  value: Uint8Array,
): Promise<Done<GivenSignature>> {
  const { organisationId } = place
  if (begun.expiresAt < at) throw startAgain('This took longer than ten minutes')
  const round = await openRound(tx, row.id)
  const { certificate, chain } = await certificateFor(tx, round, actor.userId)
  if (round.sha256 !== begun.baseSha256 || certificate.fingerprint !== begun.fingerprint) {
    throw startAgain('The file has changed meanwhile')
  }
  const waiting = prepareSignature(round.file, orderOf(role, certificate.certificate, chain, begun.at))
  const file = new Uint8Array(completeSignature(waiting, value))
  const sha256 = createHash('sha256').update(file).digest('hex')
  const next = nextSignature([...subject.signed, role])
  await tx.preparedSignature.deleteMany({ where: { roundId: round.id } })
  await tx.signatureRound.update({
    where: { organisationId_id: { organisationId, id: round.id } },
    data: { file, sha256, ...(next === null ? { completedAt: at } : {}) },
  })
  await tx.signoff.create({
    data: {
      organisationId,
      roundId: round.id,
      role,
      userId: actor.userId,
      personName: actor.name,
      fingerprint: certificate.fingerprint,
      at: begun.at,
      sha256,
    },
  })
  return {
    answer: { role, sha256, next },
    events: [
      {
        action: `revision-signed-${role}`,
        subject: { kind: 'revision', id: row.id },
        payload: { number: row.number, certificate: certificate.fingerprint, sha256 },
      },
    ],
  }
}

export const endSignature = { load, run }
