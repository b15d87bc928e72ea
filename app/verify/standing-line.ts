import type { Standing } from '@/lib/server/signoff/verify-upload'
import type { StandingLine } from './verify-answer'

/** Says of a registered file which report it is and whether its revision is still the one that counts. */
export function standingLine(standing: Standing): StandingLine | null {
  if (standing.kind === 'unknown') return null
  const { documentNumber, number, title, organisation, issuedAt, purpose } = standing
  const when = issuedAt ? ` on ${issuedAt.slice(0, 10)}` : ''
  const what = `Revision ${number} of ${documentNumber}, “${title}”, issued by ${organisation}${when}`
  const sentence = `${what}${purpose ? ` for this purpose: ${purpose}` : ''}. ${became(standing)}`
  return { current: standing.kind === 'issued', sentence }
}

function became(standing: Exclude<Standing, { kind: 'unknown' }>): string {
  if (standing.kind === 'issued') return 'It is the revision in force.'
  if (standing.kind === 'withdrawn') {
    const why = standing.withdrawnReason ? `: ${standing.withdrawnReason}` : ''
    return `It has been withdrawn since${why}. Do not use it.`
  }
  const next = standing.current ? ` by revision ${standing.current.number}` : ''
  return `It has been superseded since${next}: use the revision in force.`
}
