import type { FieldIssue } from '../../errors'
import type { Entered } from '../document/entered'
import type { ProtectionElement } from '../document/motor-protection'
import type { StudyDocument } from '../document/study-document'
import { unless } from './issue'

type Path = FieldIssue['path']

const above = (value: Entered | null, path: Path, name: string): FieldIssue[] =>
  unless(value === null || value.si > 0, path, `${name} must be above 0.`)

const elementIssues = (element: ProtectionElement, path: Path, tag: string): FieldIssue[] => {
  switch (element.kind) {
    case 'inverse':
      return [
        ...above(element.pickUp, [...path, 'pickUp'], `The pick-up of the relay of ${tag}`),
        ...above(element.multiplier, [...path, 'multiplier'], `The time multiplier of the relay of ${tag}`),
      ]
    case 'definite':
      return [
        ...above(element.pickUp, [...path, 'pickUp'], `The pick-up of the relay of ${tag}`),
        ...unless(element.delay.si >= 0, [...path, 'delay'], `The delay of the relay of ${tag} cannot be below 0.`),
      ]
    case 'overload-class':
      return above(element.setting, [...path, 'setting'], `The setting of the overload relay of ${tag}`)
    case 'thermal-image':
      return [
        ...above(element.base, [...path, 'base'], `The basic current of the thermal image of ${tag}`),
        ...above(element.heating, [...path, 'heating'], `The time constant of the thermal image of ${tag}`),
        ...above(element.cooling, [...path, 'cooling'], `The time constant of the thermal image of ${tag}`),
        ...unless(
          element.factor.si >= 1,
          [...path, 'factor'],
          `The factor k of the thermal image of ${tag} cannot be below 1.`,
        ),
        ...unless(
          element.inhibit === null || (element.inhibit.si > 0 && element.inhibit.si < 1),
          [...path, 'inhibit'],
          `The heat above which the relay of ${tag} releases no start must lie between 0 and 100 %.`,
        ),
      ]
  }
}

/** Settings of relays and thermal data of motors: what no relay and no motor can have. */
export const checkProtection = ({ plant }: StudyDocument): FieldIssue[] =>
  plant.motors.flatMap(({ tag, protection, thermalLimits, coolingRunning, coolingStopped }, i) => {
    const path = ['plant', 'motors', i] as const
    const { currentTransformer: transformer = null, settingsIn = 'primary', elements = [] } = protection ?? {}
    const relay = [...path, 'protection'] as const
    return [
      ...above(coolingRunning, [...path, 'coolingRunning'], `The cooling time constant of ${tag}`),
      ...above(coolingStopped, [...path, 'coolingStopped'], `The cooling time constant of ${tag}`),
      ...thermalLimits.flatMap(({ current, time }, k) => [
        ...above(current, [...path, 'thermalLimits', k, 'current'], `The currents of the thermal limit of ${tag}`),
        ...above(time, [...path, 'thermalLimits', k, 'time'], `The times of the thermal limit of ${tag}`),
      ]),
      ...unless(
        settingsIn === 'primary' || transformer !== null,
        [...relay, 'currentTransformer'],
        `The settings of the relay of ${tag} are secondary: give its current transformer.`,
      ),
      ...above(
        transformer?.primary ?? null,
        [...relay, 'currentTransformer', 'primary'],
        `The current transformer of ${tag}`,
      ),
      ...above(
        transformer?.secondary ?? null,
        [...relay, 'currentTransformer', 'secondary'],
        `The current transformer of ${tag}`,
      ),
      ...elements.flatMap((element, k) => elementIssues(element, [...relay, 'elements', k], tag)),
    ]
  })
