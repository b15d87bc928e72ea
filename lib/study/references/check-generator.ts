import type { FieldIssue } from '../../errors'
import type { GeneratorLevel } from '../document/generator-level'
import type { SupplyRecord } from '../document/network-records'
import { unless } from './issue'

/** What no generator can be: values at or below zero, reactances in the wrong order, a voltage that it does not hold. */
export const generatorIssues = (
  level: GeneratorLevel,
  { before, tag }: SupplyRecord,
  path: FieldIssue['path'],
): FieldIssue[] => {
  const at = [...path, 'level']
  const who = `generator ${tag}`
  const { subtransient, quadrature, regulator, governor, resistance } = level
  const positive: readonly (readonly [string, { si: number } | null | undefined, string])[] = [
    ['rating', level.rating, 'The rating'],
    ['synchronous', level.synchronous, 'X_d'],
    ['transient', level.transient, 'X′_d'],
    ['transientTime', level.transientTime, 'T′_d0'],
    ['inertia', level.inertia, 'The inertia constant H'],
    ['subtransient', subtransient?.reactance, 'X″_d'],
    ['subtransient', subtransient?.time, 'T″_d'],
    ['quadrature', quadrature?.reactance, 'X_q'],
    ['quadrature', quadrature?.time, 'T″_q0'],
    ['regulator', regulator?.gain, 'The gain of the regulator'],
    ['regulator', regulator?.time, 'The time constant of the regulator'],
    ['regulator', regulator?.reset, 'The reset time of the regulator'],
    ['regulator', regulator?.ceiling, 'The ceiling of the excitation'],
    ['governor', governor?.droop, 'The droop'],
    ['governor', governor?.time, 'The lag of the governor'],
    ['governor', governor?.power, 'The power of the prime mover'],
  ]
  return [
    ...positive.flatMap(([field, value, name]) =>
      unless(!value || value.si > 0, [...at, field], `${name} of ${who} must be above 0.`),
    ),
    ...unless(!resistance || resistance.si >= 0, [...at, 'resistance'], `The resistance of ${who} cannot be below 0.`),
    ...unless(
      level.transient.si <= level.synchronous.si,
      [...at, 'transient'],
      `X′_d of ${who} cannot be above its X_d; check the two.`,
    ),
    ...unless(
      !subtransient || subtransient.reactance.si <= level.transient.si,
      [...at, 'subtransient'],
      `X″_d of ${who} cannot be above its X′_d; check the two.`,
    ),
    ...unless(
      before.kind === 'bus-voltage',
      [...path, 'before'],
      `The regulator of ${who} holds the voltage of its bus; give that voltage before the start.`,
    ),
  ]
}
