import 'server-only'
import type { Tx } from '../db'
import type { ExpectedSigner } from './view'

interface Decided {
  organisationId: string
  frozenById: string
  checkedById: string | null
  reviewAcceptedById: string | null
}

/** Who signs as what, as far as it is known: the preparer, whoever accepted the check, whoever accepted the review. */
export async function expectedSigners(tx: Tx, row: Decided): Promise<ExpectedSigner[]> {
  const signers = [
    { role: 'prepared', userId: row.frozenById },
    { role: 'checked', userId: row.checkedById },
    { role: 'approved', userId: row.reviewAcceptedById },
  ] as const
  const ids = signers.flatMap(({ userId }) => (userId ? [userId] : []))
  const people = await tx.user.findMany({ where: { id: { in: ids } }, select: { id: true, name: true } })
  const certified = await tx.certificate.findMany({
    where: { organisationId: row.organisationId, userId: { in: ids }, revokedAt: null },
    select: { userId: true },
  })
  return signers.map(({ role, userId }) => ({
    role,
    userId,
    person: people.find((person) => person.id === userId)?.name ?? null,
    hasCertificate: certified.some((certificate) => certificate.userId === userId),
  }))
}
