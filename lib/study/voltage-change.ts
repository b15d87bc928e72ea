import type { PlaceResult } from '../engine/case-result'
import type { RuleInstant } from '../engine/criteria/rule'
import { type PerUnit, perUnit, type Second, type Volt } from '../units/si'

/**
 * How a voltage is set against what: change in parts of the voltage before the start, change in parts of nominal, or
 * what remains in parts of nominal. One start can read 3.48 %, 3.41 % and 94.8 %, so none is ever given unnamed.
 */
export const changeReferences = ['change-of-before', 'change-of-nominal', 'remaining-of-nominal'] as const

export type ChangeReference = (typeof changeReferences)[number]

/** Line voltage of a place at an instant, with the time where it has one; null when that state was not reached. */
export const voltageAt = (place: PlaceResult, instant: RuleInstant): { voltage: Volt; at: Second | null } | null => {
  if (instant === 'deepest') return place.deepest
  const voltage = {
    first: place.first,
    'settled-after-start': place.settledAfterStart,
    'settled-after-process': place.settledAfterProcess,
  }[instant]
  return voltage === null ? null : { voltage, at: null }
}

/** One voltage against its reference; positive changes are falls. */
export const relativeVoltage = (
  place: Pick<PlaceResult, 'before' | 'nominal'>,
  voltage: Volt,
  reference: ChangeReference,
): PerUnit =>
  perUnit(
    {
      'change-of-before': (place.before - voltage) / place.before,
      'change-of-nominal': (place.before - voltage) / place.nominal,
      'remaining-of-nominal': voltage / place.nominal,
    }[reference],
  )

/** The change, or what remains, at a place and an instant; null when that state was not reached. */
export const voltageChange = (place: PlaceResult, instant: RuleInstant, reference: ChangeReference): PerUnit | null => {
  const found = voltageAt(place, instant)
  return found === null ? null : relativeVoltage(place, found.voltage, reference)
}
