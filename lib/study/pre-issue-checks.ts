import { loadSegments, loadTorqueAt } from '../engine/driven/load-segments'
import { plateContradictions } from '../engine/estimate/plate-problems'
import type { FieldIssue } from '../errors'
import { assumptions } from './assumptions'
import type { StudyDocument } from './document/study-document'
import { fieldPlace } from './field-place'
import { loadCurveInput } from './to-engine/load-curve-input'
import { nameplateOf } from './to-engine/nameplate-of-motor'
import { isShortCircuitLevel } from './words/level-text'
import { contradictionSentence } from './words/plate-words'

/** A question that reviewers always ask, with what there is to say to it; passed when there is nothing. */
export interface PreIssueCheck {
  id: string
  sentence: string
  passed: boolean
  issues: FieldIssue[]
}

type Finder = (document: StudyDocument) => FieldIssue[]

const issue = (path: readonly (string | number)[], message: string): FieldIssue => ({ path, message })

const designOf = ({ cases }: StudyDocument) => cases.filter(({ role }) => role === 'design')

const withoutSource: Finder = (document) =>
  assumptions(document)
    .filter(({ kind }) => kind === 'unsourced')
    .map(({ path }) => {
      const { record, field } = fieldPlace(document, path)
      return issue(path, `${record}, ${field}: state the source.`)
    })

const undatedLevel: Finder = ({ plant }) =>
  plant.supplies.flatMap(({ tag, date }, i) =>
    date === null ? [issue(['plant', 'supplies', i, 'date'], `Supply condition ${tag} has no date.`)] : [],
  )

/** Impedance of a level in parts of others at one bus: the larger, the weaker; null where it is not a power. */
const powerOf = ({ level }: StudyDocument['plant']['supplies'][number]): number | null =>
  level.form === 'power' ? level.power.si : null

const weakestMissing: Finder = (document) => {
  const powers = document.plant.supplies.map(powerOf)
  const known = powers.filter((power) => power !== null)
  if (known.length < 2) return []
  const weakest = document.plant.supplies[powers.indexOf(Math.min(...known))]
  return weakest && !designOf(document).some(({ supply }) => supply === weakest.id)
    ? [issue(['cases'], `No design case uses the weakest supply condition, ${weakest.tag}.`)]
    : []
}

const factorUnknown: Finder = ({ plant }) =>
  plant.supplies.flatMap(({ tag, voltageFactor, level }, i) =>
    voltageFactor.kind === 'unknown' && isShortCircuitLevel({ level })
      ? [
          issue(
            ['plant', 'supplies', i, 'voltageFactor'],
            `Supply condition ${tag}: ask which voltage factor its level contains.`,
          ),
        ]
      : [],
  )

const powerFactorMissing: Finder = ({ plant }) =>
  plant.motors.flatMap(({ tag, circuit, lockedRotorPowerFactor }, i) =>
    circuit.kind === 'estimated' && lockedRotorPowerFactor === null
      ? [
          issue(
            ['plant', 'motors', i, 'lockedRotorPowerFactor'],
            `Motor ${tag}: its locked-rotor power factor is fitted, not declared.`,
          ),
        ]
      : [],
  )

const plateContradicts: Finder = ({ plant, frequency }) =>
  plant.motors.flatMap((motor, i) => {
    const plate = nameplateOf(motor, frequency.si)
    return plate === null
      ? []
      : plateContradictions(plate).map((kind) => issue(['plant', 'motors', i], contradictionSentence[kind](motor.tag)))
  })

const noBreakaway: Finder = ({ plant }) =>
  plant.drivenLoads.flatMap(({ tag, curves }, i) =>
    curves.flatMap((curve, j) => {
      return loadTorqueAt(loadSegments(loadCurveInput(curve)), 0) > 0
        ? []
        : [
            issue(
              ['plant', 'drivenLoads', i, 'curves', j],
              `Driven load ${tag}, “${curve.name}”: no torque at standstill.`,
            ),
          ]
    }),
  )

const noPullUp: Finder = ({ plant }) =>
  plant.motors.flatMap(({ tag, pullUpTorque }, i) =>
    pullUpTorque === null
      ? [issue(['plant', 'motors', i, 'pullUpTorque'], `Motor ${tag}: the torque data has no pull-up point.`)]
      : [],
  )

const nothingRuns: Finder = (document) =>
  designOf(document).some(
    ({ plantCondition }) =>
      (document.plant.plantConditions.find(({ id }) => id === plantCondition)?.running.length ?? 0) > 0,
  )
    ? []
    : [issue(['cases'], 'No design case has another motor running: compute the last start too.')]

const noFirstStart: Finder = (document) => {
  const loads = designOf(document).map(
    ({ plantCondition }) => document.plant.plantConditions.find(({ id }) => id === plantCondition)?.running.length ?? 0,
  )
  return new Set(loads).size > 1
    ? []
    : [issue(['cases'], 'First start and last start are not both among the design cases.')]
}

const limitWithoutClause: Finder = ({ limits }) =>
  limits.flatMap(({ tag, document, clause }, i) =>
    document.trim() === '' || clause.trim() === ''
      ? [issue(['limits', i, 'clause'], `Limit ${tag}: name the document and its clause.`)]
      : [],
  )

const limitUnverified: Finder = ({ limits }) =>
  limits.flatMap(({ tag, verify }, i) =>
    verify ? [issue(['limits', i, 'verify'], `Limit ${tag}: check its value against the edition in force.`)] : [],
  )

const noTolerance: Finder = ({ cases }) =>
  cases.some(({ changes }) => changes.some(({ kind }) => kind === 'motor-admittance'))
    ? []
    : [issue(['cases'], 'No case has the locked-rotor current with its tolerance of +20 %.')]

const noBypass: Finder = (document) => {
  const reduced = document.schedules.filter(({ starts }) =>
    starts.some(({ starter }) => document.plant.starters.find(({ id }) => id === starter)?.kind !== 'direct'),
  )
  const direct = document.cases.some(({ schedule }) =>
    document.schedules
      .find(({ id }) => id === schedule)
      ?.starts.every(({ starter }) => document.plant.starters.find(({ id }) => id === starter)?.kind === 'direct'),
  )
  return reduced.length > 0 && !direct ? [issue(['cases'], 'No case shows the starter failed or bypassed.')] : []
}

const noDuty: Finder = (document) =>
  document.plant.starters.flatMap((starter, i) =>
    'duty' in starter &&
    starter.dutyLimits === null &&
    starter.duty.trim() === '' &&
    document.schedules.some(({ starts }) => starts.some((start) => start.starter === starter.id))
      ? [issue(['plant', 'starters', i, 'duty'], `Starting method ${starter.tag}: its duty is not stated.`)]
      : [],
  )

const noRelay: Finder = (document) => {
  const schedules = new Set(designOf(document).map(({ schedule }) => schedule))
  const started = new Set(
    document.schedules.filter(({ id }) => schedules.has(id)).flatMap(({ starts }) => starts.map(({ motor }) => motor)),
  )
  return document.plant.motors.flatMap(({ id, tag, protection }, i) =>
    started.has(id) && protection === null
      ? [issue(['plant', 'motors', i, 'protection'], `Motor ${tag}: no relay is compared with its start.`)]
      : [],
  )
}

const noProcessState: Finder = (document) =>
  designOf(document).flatMap(({ tag, loadCondition }) => {
    const curves = document.plant.loadConditions.find(({ id }) => id === loadCondition)?.curves ?? []
    return curves.some(({ process }) => process !== null)
      ? []
      : [issue(['cases'], `Case ${tag}: the process state after the start is not given.`)]
  })

const questions: readonly [id: string, sentence: string, find: Finder][] = [
  ['sources', 'Every value has a source', withoutSource],
  ['level-date', 'Every short-circuit level is dated', undatedLevel],
  ['weakest', 'The weakest supply condition is computed', weakestMissing],
  ['voltage-factor', 'The voltage factor in every level is known', factorUnknown],
  ['power-factor', 'The locked-rotor power factor is declared where a circuit is estimated', powerFactorMissing],
  ['plate', 'The values on each nameplate agree', plateContradicts],
  ['standstill', 'Every driven load holds its shaft at standstill', noBreakaway],
  ['pull-up', 'The torque data has a pull-up point', noPullUp],
  ['running', 'Running motors are in the network', nothingRuns],
  ['first-last', 'First start and last start are both computed', noFirstStart],
  ['clauses', 'Every limit names its document and clause', limitWithoutClause],
  ['editions', 'Every limit was checked against the edition in force', limitUnverified],
  ['tolerance', 'The locked-rotor current is also computed with its tolerance', noTolerance],
  ['bypass', 'A start with the starter failed or bypassed is computed', noBypass],
  ['duty', 'The duty of every starting device in use is stated', noDuty],
  ['relay', 'The relay of every started motor is compared with its start', noRelay],
  ['process', 'The process state after the start is given', noProcessState],
]

/** What reviewers always ask, as far as records, cases and limits answer it, asked before a revision goes out. */
export const preIssueChecks = (document: StudyDocument): PreIssueCheck[] =>
  questions.map(([id, sentence, find]) => {
    const issues = find(document)
    return { id, sentence, passed: issues.length === 0, issues }
  })
