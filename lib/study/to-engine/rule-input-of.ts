import type { RuleInput, RuleLimit, RulePlace } from '../../engine/criteria/rule'
import { perUnit, second } from '../../units/si'
import type { CaseRecord } from '../document/case-records'
import type { LimitRecord } from '../document/limit-record'

const placeInput = ({ place }: LimitRecord): RulePlace =>
  place.kind === 'bus' ? { kind: 'bus', busId: place.bus } : { kind: place.kind }

const limitInput = ({ limit }: LimitRecord): RuleLimit =>
  limit.kind === 'envelope'
    ? {
        kind: 'envelope',
        steps: limit.steps.map(({ from, value }) => ({ from: second(from.si), value: perUnit(value.si) })),
      }
    : { kind: 'value', value: limit.value.si }

/** The cases that a limit is written for; null means all. */
const caseIds = ({ appliesTo }: LimitRecord, cases: readonly CaseRecord[]): string[] | null => {
  const { supplies, plantConditions } = appliesTo
  if (supplies === null && plantConditions === null) return null
  return cases
    .filter(({ supply }) => supplies?.includes(supply) ?? true)
    .filter(({ plantCondition }) => plantConditions?.includes(plantCondition) ?? true)
    .map(({ id }) => id)
}

/** One limit as the engine holds it against the cases. */
export const ruleInputOf = (limit: LimitRecord, cases: readonly CaseRecord[]): RuleInput => ({
  id: limit.id,
  place: placeInput(limit),
  quantity: limit.quantity,
  instant: limit.instant,
  reference: limit.reference,
  limit: limitInput(limit),
  appliesTo: {
    caseIds: caseIds(limit, cases),
    methods: limit.appliesTo.methods,
    motorIds: limit.appliesTo.motors,
  },
  startClass: limit.startClass,
})
