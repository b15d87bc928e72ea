import type { StarterKind } from '../../engine/case-input'
import type { RuleInstant } from '../../engine/criteria/rule'
import type { ChangeReference } from '../voltage-change'

/** At which instant a voltage is taken. */
export const instantNames: Record<RuleInstant, string> = {
  first: 'first instant',
  deepest: 'deepest',
  'settled-after-start': 'settled after the start',
  'settled-after-process': 'settled after the process loads',
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
  reactor: 'series reactor',
  resistor: 'series resistor',
  'soft-starter': 'soft starter',
  'part-winding': 'part winding',
  'rotor-resistance': 'rotor resistance',
  'captive-transformer': 'captive transformer',
  drive: 'variable-speed drive',
}
