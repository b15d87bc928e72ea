import type { StarterKind } from '../../engine/case-input'
import type { RuleInstant, RuleQuantity, RuleReference } from '../../engine/criteria/rule'
import type { ChangeReference } from '../voltage-change'

/** Names of what is limited. */
export const quantityNames: Record<RuleQuantity, string> = {
  'voltage-change': 'voltage change',
  'remaining-voltage': 'remaining voltage',
  'highest-voltage': 'highest voltage',
  'run-up-time': 'run-up time',
  'accelerating-torque': 'least accelerating torque',
  'heat-used': 'heat used',
}

/** At which instant a voltage is taken. */
export const instantNames: Record<RuleInstant, string> = {
  first: 'first instant',
  deepest: 'deepest',
  'settled-after-start': 'settled after the start',
  'settled-after-process': 'settled after the process loads',
}

/** What a voltage is set against. */
export const referenceNames: Record<RuleReference, string> = {
  before: 'the voltage before the start',
  nominal: 'nominal voltage',
  rated: 'rated voltage',
}

/** Heads of the three figures that one start has at each place. */
export const changeReferenceNames: Record<ChangeReference, string> = {
  'change-of-before': 'change, % of the voltage before',
  'change-of-nominal': 'change, % of nominal',
  'remaining-of-nominal': 'remaining, % of nominal',
}

/** Starting methods as one says them. */
export const methodNames: Record<StarterKind, string> = {
  direct: 'direct-on-line',
  autotransformer: 'autotransformer',
  'star-delta': 'star-delta',
}
