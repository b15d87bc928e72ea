import type { ProtectionInput, RelayElement, ThermalData } from '../../engine/protection-input'
import { ampere, perUnit, second } from '../../units/si'
import type { MotorRecord } from '../document/machine-records'
import type { MotorProtection, ProtectionElement } from '../document/motor-protection'
import type { StudySettings } from '../document/study-document'

/** Primary amperes of one ampere of the settings. */
export const settingRatio = ({ settingsIn, currentTransformer }: MotorProtection): number =>
  settingsIn === 'secondary' && currentTransformer !== null
    ? currentTransformer.primary.si / currentTransformer.secondary.si
    : 1

const elementInput = (
  element: ProtectionElement,
  ratio: number,
  motor: MotorRecord,
  state: StudySettings['thermalState'],
): RelayElement => {
  switch (element.kind) {
    case 'inverse':
      return {
        kind: 'inverse',
        curve: element.curve,
        pickUp: ampere(ratio * element.pickUp.si),
        multiplier: element.multiplier.si,
        reset: element.reset && second(element.reset.si),
      }
    case 'definite':
      return { kind: 'definite', pickUp: ampere(ratio * element.pickUp.si), delay: second(element.delay.si) }
    case 'overload-class':
      return { kind: 'overload-class', setting: ampere(ratio * element.setting.si), class: element.class }
    case 'thermal-image': {
      const base = ratio * element.base.si
      const hot = element.lastingBefore === null ? (motor.ratedCurrent?.si ?? base) : ratio * element.lastingBefore.si
      return {
        kind: 'thermal-image',
        heating: second(element.heating.si),
        cooling: second(element.cooling.si),
        lasting: ampere(element.factor.si * base),
        before: ampere(state === 'hot' ? hot : 0),
        inhibit: element.inhibit && perUnit(element.inhibit.si),
      }
    }
  }
}

/** The relay of a motor's feeder in primary amperes; nothing where none is stated. */
export const protectionInput = (
  motor: MotorRecord,
  state: StudySettings['thermalState'],
): { protection?: ProtectionInput } => {
  const { protection } = motor
  if (protection === null) return {}
  const ratio = settingRatio(protection)
  return {
    protection: {
      measures: protection.measures,
      elements: protection.elements.map((element) => elementInput(element, ratio, motor, state)),
    },
  }
}

/** What the maker states about heat; nothing where the record has none of it. */
export const thermalInput = (motor: MotorRecord): { thermal?: ThermalData } => {
  const { permissibleCold, permissibleHot, thermalLimits, coolingRunning, coolingStopped } = motor
  if (permissibleCold === null && permissibleHot === null && thermalLimits.length === 0) return {}
  const time = (value: { si: number } | null) => (value === null ? null : second(value.si))
  return {
    thermal: {
      cold: time(permissibleCold),
      hot: time(permissibleHot),
      limits: thermalLimits.map((point) => ({
        state: point.state,
        current: ampere(point.current.si),
        time: second(point.time.si),
      })),
      coolingRunning: time(coolingRunning),
      coolingStopped: time(coolingStopped),
    },
  }
}
