import type { FieldIssue } from '../../errors'
import type { CaseChange, CaseRecord } from '../document/case-records'
import type { StudyDocument } from '../document/study-document'
import { isShortCircuitLevel } from '../words/level-text'
import { known, unless } from './issue'
import type { RecordIndex } from './record-index'

const changeIssues = (
  change: CaseChange,
  record: CaseRecord,
  connected: ReadonlySet<string>,
  index: RecordIndex,
  path: FieldIssue['path'],
): FieldIssue[] => {
  const who = `A change of case ${record.tag}`
  switch (change.kind) {
    case 'voltage-before':
      return []
    case 'voltage-factor': {
      const supply = index.supplies.get(record.supply)
      return unless(
        supply === undefined || isShortCircuitLevel(supply),
        path,
        `The supply of case ${record.tag} is no short-circuit level and contains no voltage factor; remove this change.`,
      )
    }
    case 'transformer-impedance':
      return known(index.transformers, change.transformer, [...path, 'transformer'], who, 'transformer')
    default: {
      const missing = known(index.motors, change.motor, [...path, 'motor'], who, 'motor')
      if (missing.length > 0) return missing
      const tag = index.motors.get(change.motor)?.tag
      return unless(
        connected.has(change.motor),
        [...path, 'motor'],
        `${who} is about motor ${tag}, which neither runs nor starts in it; remove the change or choose another motor.`,
      )
    }
  }
}

const startsAndRuns = (record: CaseRecord, index: RecordIndex, path: FieldIssue['path']): FieldIssue[] => {
  const running = new Set(index.plantConditions.get(record.plantCondition)?.running.map(({ motor }) => motor))
  const starting = index.schedules.get(record.schedule)?.starts ?? []
  const curves = new Set(index.loadConditions.get(record.loadCondition)?.curves.map(({ motor }) => motor))
  return starting.flatMap(({ motor }) => {
    const tag = index.motors.get(motor)?.tag ?? motor
    return [
      ...unless(
        !running.has(motor),
        [...path, 'schedule'],
        `Motor ${tag} both runs before the start and is started in case ${record.tag}; choose another plant condition or schedule.`,
      ),
      ...unless(
        curves.has(motor) || !index.loadConditions.has(record.loadCondition),
        [...path, 'loadCondition'],
        `The load condition of case ${record.tag} does not say which curve motor ${tag} starts against; add it there.`,
      ),
    ]
  })
}

/** A transfer goes to a supply at the same bus. */
const transferAtOneBus = (record: CaseRecord, index: RecordIndex, path: FieldIssue['path']): FieldIssue[] => {
  const to = index.schedules.get(record.schedule)?.disturbance?.to
  const [first, second] = [index.supplies.get(record.supply), to && index.supplies.get(to.supply)]
  return unless(
    !first || !second || first.bus === second.bus,
    path,
    `Case ${record.tag} goes over from supply ${first?.tag} to ${second?.tag}, which stand at different buses; choose one at the same bus.`,
  )
}

/** What a case takes together must exist and fit together. */
export const caseReferences = ({ cases }: StudyDocument, index: RecordIndex): FieldIssue[] =>
  cases.flatMap((record, i) => {
    const path = ['cases', i] as const
    const who = `Case ${record.tag}`
    const connected = new Set([
      ...(index.plantConditions.get(record.plantCondition)?.running ?? []).map(({ motor }) => motor),
      ...(index.schedules.get(record.schedule)?.starts ?? []).map(({ motor }) => motor),
    ])
    return [
      ...known(index.supplies, record.supply, [...path, 'supply'], who, 'supply'),
      ...known(index.plantConditions, record.plantCondition, [...path, 'plantCondition'], who, 'plant condition'),
      ...known(index.schedules, record.schedule, [...path, 'schedule'], who, 'schedule'),
      ...known(index.loadConditions, record.loadCondition, [...path, 'loadCondition'], who, 'load condition'),
      ...startsAndRuns(record, index, path),
      ...transferAtOneBus(record, index, [...path, 'schedule']),
      ...record.changes.flatMap((change, k) => changeIssues(change, record, connected, index, [...path, 'changes', k])),
      ...unless(
        record.role !== 'sensitivity' || record.reason.trim() !== '',
        [...path, 'reason'],
        `Say in words what the sensitivity ${record.tag} is for.`,
      ),
      ...unless(
        record.role !== 'design' || record.changes.length === 0,
        [...path, 'role'],
        `Case ${record.tag} departs from the records, so it cannot be a design case; make it a sensitivity.`,
      ),
    ]
  })
