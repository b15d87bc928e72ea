import type { FieldIssue } from '../../errors'
import { hertz } from '../../units/si'
import { synchronousSpeed, toRpm } from '../../units/speed'
import type { Entered } from '../document/entered'
import type { MotorRecord } from '../document/machine-records'
import type { StudyDocument } from '../document/study-document'
import { checkDrivenLoads } from './check-driven-loads'
import { generatorIssues } from './check-generator'
import { checkProtection } from './check-protection'
import { checkStarters } from './check-starters'
import { unless } from './issue'

type Path = FieldIssue['path']

const above = (value: Entered | null, least: number, path: Path, name: string): FieldIssue[] =>
  unless(value === null || value.si > least, path, `${name} must be above ${least}.`)

const notBelow = (value: Entered | null, least: number, path: Path, name: string): FieldIssue[] =>
  unless(value === null || value.si >= least, path, `${name} cannot be below ${least}.`)

/** Above zero and at most one: a part of something. */
const part = (value: Entered | null, path: Path, name: string): FieldIssue[] =>
  unless(value === null || (value.si > 0 && value.si <= 1), path, `${name} must lie above 0 and at most at 1 (100 %).`)

const supplies = ({ plant }: StudyDocument): FieldIssue[] =>
  plant.supplies.flatMap((supply, i) => {
    const path = ['plant', 'supplies', i] as const
    const { level, voltageFactor, xOverR, tag } = supply
    return [
      ...unless(
        level.form === 'impedance' || level.form === 'generator' || xOverR !== null,
        [...path, 'xOverR'],
        `Give the X/R of supply ${tag}; the report cannot leave it open, and there is no default for a weak network.`,
      ),
      ...notBelow(xOverR, 0, [...path, 'xOverR'], `X/R of supply ${tag}`),
      ...(level.form === 'current'
        ? above(level.current, 0, [...path, 'level', 'current'], `The level of supply ${tag}`)
        : []),
      ...(level.form === 'generator' ? generatorIssues(level, supply, path) : []),
      ...(voltageFactor.kind === 'other'
        ? above(voltageFactor.value, 0, [...path, 'voltageFactor', 'value'], `The voltage factor of supply ${tag}`)
        : []),
    ]
  })

const branches = ({ plant }: StudyDocument): FieldIssue[] => [
  ...plant.transformers.flatMap(({ impedance, xOverR, tap, tag }, i) => {
    const path = ['plant', 'transformers', i] as const
    return [
      ...part(impedance, [...path, 'impedance'], `The impedance of transformer ${tag}`),
      ...notBelow(xOverR, 0, [...path, 'xOverR'], `X/R of transformer ${tag}`),
      ...above(tap, -0.5, [...path, 'tap'], `The tap of transformer ${tag}`),
    ]
  }),
  ...plant.plantConditions.flatMap(({ taps, tag }, i) =>
    taps.flatMap(({ tap }, k) =>
      above(tap, -0.5, ['plant', 'plantConditions', i, 'taps', k, 'tap'], `The tap in plant condition ${tag}`),
    ),
  ),
  ...plant.loads.flatMap(({ floor, tag }, i) =>
    part(floor, ['plant', 'loads', i, 'floor'], `The floor of load ${tag}`),
  ),
  ...plant.capacitors.flatMap(({ rating, tag }, i) =>
    above(rating, 0, ['plant', 'capacitors', i, 'rating'], `The rating of capacitor ${tag}`),
  ),
]

const motor = (record: MotorRecord, path: Path, frequency: number): FieldIssue[] => {
  const { tag, ratedSpeed, poles } = record
  const synchronous = synchronousSpeed(hertz(frequency), poles)
  const rpm = Number(toRpm(synchronous).toFixed(1))
  const needed = [
    ['efficiency', 'efficiency'],
    ['powerFactor', 'power factor'],
    ['lockedRotorCurrent', 'locked-rotor current'],
  ] as const
  return [
    ...above(record.ratedPower, 0, [...path, 'ratedPower'], `Rated power of motor ${tag}`),
    ...unless(
      ratedSpeed.si > 0.7 * synchronous && ratedSpeed.si < synchronous,
      [...path, 'ratedSpeed'],
      `Rated speed of motor ${tag} must lie a little below ${rpm} r/min, which ${poles} poles give; check speed and poles.`,
    ),
    ...part(record.efficiency, [...path, 'efficiency'], `Efficiency of motor ${tag}`),
    ...part(record.powerFactor, [...path, 'powerFactor'], `Power factor of motor ${tag}`),
    ...part(
      record.lockedRotorPowerFactor,
      [...path, 'lockedRotorPowerFactor'],
      `Locked-rotor power factor of motor ${tag}`,
    ),
    ...above(record.lockedRotorCurrent, 0, [...path, 'lockedRotorCurrent'], `Locked-rotor current of motor ${tag}`),
    ...above(record.lockedRotorTorque, 0, [...path, 'lockedRotorTorque'], `Locked-rotor torque of motor ${tag}`),
    ...above(
      record.breakdownTorque,
      1,
      [...path, 'breakdownTorque'],
      `Breakdown torque of motor ${tag}, as a multiple of rated,`,
    ),
    ...above(record.ratedTorque, 0, [...path, 'ratedTorque'], `Rated torque of motor ${tag}`),
    ...above(record.inertia, 0, [...path, 'inertia'], `Inertia of motor ${tag}`),
    ...above(record.permissibleCold, 0, [...path, 'permissibleCold'], `Permissible time of motor ${tag}`),
    ...above(record.permissibleHot, 0, [...path, 'permissibleHot'], `Permissible time of motor ${tag}`),
    ...machineCurves(record, path),
    ...(record.circuit.kind !== 'estimated'
      ? []
      : needed.flatMap(([key, name]) =>
          unless(
            record[key] !== null,
            [...path, key],
            `The circuit of motor ${tag} is estimated from its nameplate, which needs its ${name}; enter it or type the circuit.`,
          ),
        )),
  ]
}

/** Typed curves of a motor begin at standstill, rise in speed and end at synchronous speed or before it. */
const machineCurves = (record: MotorRecord, path: Path): FieldIssue[] => {
  const table = record.circuit.kind === 'table' ? record.circuit.points : []
  const sound = (points: readonly { speed: { si: number } }[], at: Path, what: string): FieldIssue[] => {
    if (points.length === 0) return []
    const rises = points.every(({ speed }, k) => k === 0 || speed.si > points[k - 1]!.speed.si)
    return [
      ...unless(points.length >= 3, at, `${what} of motor ${record.tag} needs three points or more.`),
      ...unless(points[0]!.speed.si === 0, at, `${what} of motor ${record.tag} begins at standstill: 0 r/min.`),
      ...unless(rises, at, `The speeds of ${what.toLowerCase()} of motor ${record.tag} must rise.`),
    ]
  }
  return [
    ...sound(table, [...path, 'circuit', 'points'], 'The curve'),
    ...sound(record.torquePoints, [...path, 'torquePoints'], 'The torque curve'),
  ]
}

const cases = ({ cases }: StudyDocument): FieldIssue[] =>
  cases.flatMap(({ changes, tag }, i) =>
    changes.flatMap((change, k) => {
      const path = ['cases', i, 'changes', k] as const
      if ('factor' in change) return above(change.factor, 0, [...path, 'factor'], `A factor of case ${tag}`)
      if ('value' in change) return above(change.value, 0, [...path, 'value'], `The voltage factor of case ${tag}`)
      return 'impedance' in change ? part(change.impedance, [...path, 'impedance'], `The impedance in case ${tag}`) : []
    }),
  )

const settings = ({ settings }: StudyDocument): FieldIssue[] => [
  ...part(settings.speedCriterion, ['settings', 'speedCriterion'], 'The speed criterion'),
  ...above(settings.timeLimit, 0, ['settings', 'timeLimit'], 'The time limit'),
  ...notBelow(settings.closeOfLimit, 0, ['settings', 'closeOfLimit'], 'The margin'),
  ...notBelow(settings.closeVoltage, 0, ['settings', 'closeVoltage'], 'The margin'),
  ...above(settings.startsPerDay, 0, ['settings', 'startsPerDay'], 'The number of starts a day'),
  ...above(settings.startsPerHour, 0, ['settings', 'startsPerHour'], 'The number of starts an hour'),
]

/** Values that read well and cannot be: an efficiency above one, a tap of zero, points that go backwards. */
export const checkValues = (document: StudyDocument): FieldIssue[] => [
  ...supplies(document),
  ...branches(document),
  ...document.plant.motors.flatMap((record, i) => motor(record, ['plant', 'motors', i], document.frequency.si)),
  ...checkDrivenLoads(document),
  ...checkStarters(document),
  ...checkProtection(document),
  ...cases(document),
  ...settings(document),
]
