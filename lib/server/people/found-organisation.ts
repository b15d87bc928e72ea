import 'server-only'
import { makeAuthority } from '@/lib/seal/authority'
import { sha256Hex } from '@/lib/seal/sha256'
import { wrapKey } from '@/lib/seal/wrapped-key'
import type { Actor } from '../actor'
import { appendEvents, chainStart, lockHead } from '../audit'
import type { Tx } from '../db'
import { enterAsFounder } from '../enter'
import { env } from '../env'

/** The root certificate outlives what is filed for ten years. */
const years = 25

/** Founds an organisation with its certificate authority; whoever founds it is its first administrator. */
export async function foundOrganisation(
  tx: Tx,
  founder: Actor,
  { id, name }: { id: string; name: string },
  at: Date,
): Promise<void> {
  await enterAsFounder(tx, id)
  await tx.organisation.create({ data: { id, name, createdAt: at, auditHash: chainStart } })
  await tx.membership.create({
    data: { organisationId: id, userId: founder.userId, role: 'administrator', addedAt: at },
  })
  const notBefore = new Date(Math.floor(at.getTime() / 1000) * 1000)
  const notAfter = new Date(notBefore)
  notAfter.setUTCFullYear(notAfter.getUTCFullYear() + years)
  const authority = await makeAuthority(name, notBefore, notAfter)
  const fingerprint = sha256Hex(authority.certificate)
  await tx.authority.create({
    data: {
      organisationId: id,
      certificate: new Uint8Array(authority.certificate),
      fingerprint,
      wrappedKey: new Uint8Array(await wrapKey(authority, env().CA_WRAP_SECRET)),
      createdAt: at,
    },
  })
  const head = await lockHead(tx, id, null)
  await appendEvents(tx, head, founder, at, [
    {
      action: 'organisation-founded',
      subject: { kind: 'organisation', id },
      payload: { name, authority: fingerprint },
    },
  ])
}
