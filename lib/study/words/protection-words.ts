import type { StartsAllowed, StartsSource } from '../../engine/protection/starts-allowed'
import { printQuantity } from '../../quantity/print-quantity'
import type { ProtectionElement } from '../document/motor-protection'
import { listed } from './list-words'

/** Names of inverse curves as a relay's manual has them. */
export const curveNames: Record<Extract<ProtectionElement, { kind: 'inverse' }>['curve'], string> = {
  'normal-inverse': 'IEC normal inverse',
  'very-inverse': 'IEC very inverse',
  'extremely-inverse': 'IEC extremely inverse',
  'short-time-inverse': 'IEC short-time inverse',
  'long-time-inverse': 'IEC long-time inverse',
  'moderately-inverse-us': 'IEEE moderately inverse',
  'very-inverse-us': 'IEEE very inverse',
  'extremely-inverse-us': 'IEEE extremely inverse',
}

/** An element of a relay in two or three words, for tables and the ends of lines. */
export const elementName = (element: ProtectionElement): string => {
  switch (element.kind) {
    case 'inverse':
      return curveNames[element.curve]
    case 'definite':
      return element.name === '' ? 'definite time' : element.name
    case 'overload-class':
      return `overload class ${element.class}`
    case 'thermal-image':
      return 'thermal image'
  }
}

/** An element with its settings as typed. */
export const elementPhrase = (element: ProtectionElement): string => {
  const name = elementName(element)
  switch (element.kind) {
    case 'inverse': {
      const reset = element.reset === null ? '' : `, reset ${element.reset.text}`
      return `${name}, pick-up ${element.pickUp.text}, multiplier ${element.multiplier.text}${reset}`
    }
    case 'definite':
      return `${name}, above ${element.pickUp.text} for ${element.delay.text}`
    case 'overload-class':
      return `${name}, setting ${element.setting.text}`
    case 'thermal-image': {
      const inhibit = element.inhibit === null ? '' : `, no start above ${element.inhibit.text}`
      const before = element.lastingBefore === null ? '' : `, before ${element.lastingBefore.text}`
      return `${name}, ${element.factor.text} × ${element.base.text}, ${element.heating.text} heating, ${element.cooling.text} cooling${before}${inhibit}`
    }
  }
}

/** Who limits the number of starts. */
export const startsSourceNames: Record<StartsSource, string> = {
  maker: 'maker of the motor',
  device: 'starting device',
  utility: 'class of starts of the limits',
  process: 'process',
  heat: 'heat balance',
}

const names = (sources: readonly StartsSource[]): string => listed(sources.map((source) => startsSourceNames[source]))

/** Starts an hour that are allowed, with what governs and what is not known. */
export const startsAllowedPhrase = ({ perHour, governing, unknown }: StartsAllowed): string => {
  const silent = unknown.length === 0 ? '' : `; not stated: ${names(unknown)}`
  if (perHour === null) return `not stated${silent === '' ? '' : ` (${names(unknown)})`}`
  return `${unknown.length === 0 ? '' : 'at most '}${perHour}, by the ${names(governing)}${silent}`
}

/** A margin with its sign, in s. */
export const marginText = (margin: number | null): string =>
  margin === null ? '–' : printQuantity(margin, 'time', { unit: 's', decimals: 2 })
