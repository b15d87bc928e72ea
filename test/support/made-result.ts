import type { CaseInput } from '@/lib/engine/case-input'
import type { CaseResult } from '@/lib/engine/case-result'
import type { RuleInput } from '@/lib/engine/criteria/rule'
import { runCase } from '@/lib/engine/run-case'
import { simpleMotor, simplePlant, squareLoad, started } from './simple-plant'

/** A computed case on which limits are tried: a running motor R, a started motor M, one bus B. */
export const tried: CaseInput = simplePlant(
  [
    simpleMotor('R', { kind: 'running', load: squareLoad(900) }),
    simpleMotor('M', started({ kind: 'direct' }, squareLoad(700))),
  ],
  0.012,
)

export const triedResult: CaseResult = runCase(tried)

/** A limit on the bus, overridden where a test needs it. */
export const limitOn = (changes: Partial<RuleInput> = {}): RuleInput => ({
  id: 'R1',
  place: { kind: 'bus', busId: 'B' },
  quantity: 'voltage-change',
  instant: 'deepest',
  reference: 'before',
  limit: { kind: 'value', value: 0.1 },
  appliesTo: { caseIds: null, methods: null, motorIds: null },
  startClass: null,
  ...changes,
})
