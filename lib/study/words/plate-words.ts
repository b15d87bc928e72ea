import { estimateCircuit } from '../../engine/estimate/estimate-circuit'
import { type PlateContradiction, plateContradictions } from '../../engine/estimate/plate-problems'
import type { MotorRecord } from '../document/machine-records'
import { nameplateOf } from '../to-engine/nameplate-of-motor'

/** What to check on a plate whose values cannot all be true; one sentence, the motor's tag in front. */
export const contradictionSentence: Record<PlateContradiction, (tag: string) => string> = {
  'rated-current': (tag) =>
    `Motor ${tag}: the rated current is not the one that rated power, efficiency and power factor give; check the four.`,
  'rated-torque': (tag) =>
    `Motor ${tag}: the rated torque is not rated power over rated speed; check the three and the unit of the torque.`,
  'locked-rotor-code': (tag) =>
    `Motor ${tag}: the locked-rotor current lies outside the range of its code letter; check both, and the voltage of the current.`,
  'breakdown-below-locked-rotor': (tag) =>
    `Motor ${tag}: the breakdown torque is below the locked-rotor torque; ask the maker which one is the largest torque.`,
  'pull-up-above-locked-rotor': (tag) =>
    `Motor ${tag}: the pull-up torque is above the locked-rotor torque, which is not possible for the least torque of the run-up; check both.`,
  'pull-up-above-breakdown': (tag) => `Motor ${tag}: the pull-up torque is above the breakdown torque; check both.`,
}

/** Said beside a circuit that misses its plate by more than a part in a thousand. */
export const plateNotMetSentence = (tag: string): string =>
  `Motor ${tag}: no circuit has all the values of its plate; the nearest one is computed with, and every quantity is off by a little. Saturation often is the reason in small motors; ask the maker for curves.`

/** What there is to say of one motor's plate: values that cannot all be true, and an estimated circuit that misses it. */
export const plateSentences = (motor: MotorRecord, frequency: number): readonly string[] => {
  const plate = nameplateOf(motor, frequency)
  if (plate === null) return []
  const said = plateContradictions(plate).map((kind) => contradictionSentence[kind](motor.tag))
  if (motor.circuit.kind !== 'estimated') return said
  const outcome = estimateCircuit(plate)
  const missed = outcome.kind === 'estimated' && outcome.flags.some(({ kind }) => kind === 'not-met')
  return missed ? [...said, plateNotMetSentence(motor.tag)] : said
}
