import type { CaseOutcome } from '../case-result'

/** A case that cannot be set up, with the buses it concerns. */
export type Refusal = Extract<CaseOutcome, { kind: 'refused' }>

/** What the set-up of a case yields: the thing itself, or why there is none. */
export type Setup<T> = { ok: true; value: T } | { ok: false; outcome: CaseOutcome }

export function refuse(
  cause: Refusal['cause'],
  buses: readonly string[],
  detail: string,
): { ok: false; outcome: Refusal } {
  return { ok: false, outcome: { kind: 'refused', cause, buses, detail } }
}
