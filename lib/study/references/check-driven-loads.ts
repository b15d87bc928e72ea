import type { FieldIssue } from '../../errors'
import type { LoadCurveRecord } from '../document/driven-load-record'
import type { Entered } from '../document/entered'
import type { StudyDocument } from '../document/study-document'
import { parseFormula } from '../formula/formula'
import { openingSpeed, sampledFormula } from '../to-engine/load-curve-input'
import { unless } from './issue'

type Path = FieldIssue['path']
type Of<K extends LoadCurveRecord['kind']> = Extract<LoadCurveRecord, { kind: K }>

const above = (value: Entered | null, path: Path, name: string): FieldIssue[] =>
  unless(value === null || value.si > 0, path, `${name} must be above 0.`)

const pointIssues = (record: Of<'points'>, path: Path, tag: string): FieldIssue[] =>
  record.points.flatMap(({ speed }, k) => {
    const at = [...path, 'points', k, 'speed']
    if (k > 0)
      return unless(
        speed.si > (record.points[k - 1]?.speed.si ?? 0),
        at,
        `The points of a curve of ${tag} must stand at rising speeds.`,
      )
    return record.active
      ? unless(speed.si <= 0, at, `The first point of an active curve of ${tag} stands at 0 r/min or below it.`)
      : unless(speed.si === 0, at, `The first point of a curve of ${tag} stands at 0 r/min; add it.`)
  })

const pumpIssues = (record: Of<'pump-open'>, path: Path, tag: string): FieldIssue[] => {
  const { staticHead, shutHead, points, breakaway } = record
  if (!(staticHead.si > 0 && staticHead.si < shutHead.si))
    return unless(
      false,
      [...path, 'staticHead'],
      `The static head of ${tag} must lie above 0 and below the head against a shut valve; otherwise the pump never delivers.`,
    )
  const opens = openingSpeed(record)
  return [
    ...points.flatMap(({ speed }, k) =>
      unless(
        speed.si > (points[k - 1]?.speed.si ?? opens),
        [...path, 'points', k, 'speed'],
        `The points of a curve of ${tag} must rise from above the speed at which the check valve opens.`,
      ),
    ),
    ...unless(
      breakaway === null || breakaway.until.si < opens,
      [...path, 'breakaway', 'until'],
      `The breakaway line of ${tag} must end before the check valve opens.`,
    ),
  ]
}

const formulaIssues = (record: Of<'formula'>, path: Path, tag: string): FieldIssue[] => {
  const parsed = parseFormula(record.formula)
  if (!parsed.ok) return unless(false, [...path, 'formula'], `The formula of ${tag} cannot be read. ${parsed.message}`)
  const from = record.from?.si ?? 0
  if (record.ratedSpeed.si <= 0 || record.upTo.si <= Math.max(0, from))
    return unless(false, [...path, 'upTo'], `The formula of ${tag} needs a rated speed and an end above 0.`)
  if (record.active ? from > 0 : from !== 0)
    return unless(false, [...path, 'from'], `The formula of ${tag} begins at 0 r/min, an active one there or below it.`)
  const sampled = sampledFormula(record)
  if (sampled === null) return unless(false, [...path, 'formula'], `The formula of ${tag} has no value at some speed.`)
  return [
    ...unless(
      record.active || sampled.values.every((torque) => torque >= 0),
      [...path, 'formula'],
      `The formula of ${tag} gives a torque below 0; say that the load is active, or correct it.`,
    ),
    ...unless(
      sampled.departure <= 1e-3,
      [...path, 'formula'],
      `The formula of ${tag} turns too sharply to be computed with as ${sampled.at.length} points; type points instead.`,
    ),
  ]
}

const curveIssues = (record: LoadCurveRecord, path: Path, tag: string): FieldIssue[] => {
  const speed = 'ratedSpeed' in record ? record.ratedSpeed : null
  const breakaway = 'breakaway' in record ? record.breakaway : null
  const shared = [
    ...above(speed, [...path, 'ratedSpeed'], `The speed of a curve of ${tag}`),
    ...above(breakaway?.until ?? null, [...path, 'breakaway', 'until'], `The end of the breakaway line of ${tag}`),
  ]
  if (shared.length > 0) return shared
  switch (record.kind) {
    case 'power':
      return unless(
        record.exponent.si >= 0,
        [...path, 'exponent'],
        `The exponent of a curve of ${tag} cannot be below 0.`,
      )
    case 'points':
      return pointIssues(record, path, tag)
    case 'pump-closed':
      return []
    case 'pump-open':
      return pumpIssues(record, path, tag)
    case 'constant-power':
      return [
        ...above(record.power, [...path, 'power'], `The power of a curve of ${tag}`),
        ...above(record.from, [...path, 'from'], `The lowest speed of constant power of ${tag}`),
      ]
    case 'formula':
      return formulaIssues(record, path, tag)
  }
}

/** Load curves, gears and shafts that read well and cannot be. */
export const checkDrivenLoads = ({ plant }: StudyDocument): FieldIssue[] =>
  plant.drivenLoads.flatMap(({ curves, gear, inertiaConstants, tag, shaft, motor }, i) => {
    const path = ['plant', 'drivenLoads', i] as const
    const poles = plant.motors.find(({ id }) => id === motor)?.poles
    const mates = plant.drivenLoads.filter((one) => shaft !== '' && one.shaft === shaft)
    return [
      ...curves.flatMap((record, k) => curveIssues(record, [...path, 'curves', k], tag)),
      ...above(gear?.speedRatio ?? null, [...path, 'gear', 'speedRatio'], `The gear of ${tag}`),
      ...unless(
        gear === null || gear.efficiency === null || (gear.efficiency.si > 0 && gear.efficiency.si <= 1),
        [...path, 'gear', 'efficiency'],
        `The efficiency of the gear of ${tag} must lie above 0 and at most at 1 (100 %).`,
      ),
      ...inertiaConstants.flatMap(({ constant, power }, k) => [
        ...above(constant, [...path, 'inertiaConstants', k, 'constant'], `The inertia constant of a part of ${tag}`),
        ...above(power, [...path, 'inertiaConstants', k, 'power'], `The power of an inertia constant of ${tag}`),
      ]),
      ...unless(
        mates.every((one) => plant.motors.find(({ id }) => id === one.motor)?.poles === poles),
        [...path, 'shaft'],
        `Motors on shaft ${shaft} need the same number of poles: they turn at one speed.`,
      ),
    ]
  })
