import type { CaseInput } from './case-input'
import type { CaseResult } from './case-result'
import { computeCase } from './runup/compute'

/**
 * Computes one case: state before the start, run-up of every started motor with the network solved at every instant,
 * settled states. Pure: the same input gives the same result.
 *
 * Refusals, collapse and starts that fail are outcomes in the result; an exception is a bug.
 */
export const runCase = (input: CaseInput): CaseResult => computeCase(input)
