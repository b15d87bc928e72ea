import type { FieldIssue } from '../../errors'
import type { StudyDocument } from '../document/study-document'
import { known, once, unless } from './issue'
import { curveOf, type RecordIndex } from './record-index'
import { scheduleReferences } from './schedule-references'

type Path = FieldIssue['path']

/** A motor with a curve of its driven load. */
const motorAndCurve = (index: RecordIndex, who: string, motor: string, curve: string, path: Path, field: string) => {
  const missing = known(index.motors, motor, [...path, 'motor'], who, 'motor')
  if (missing.length > 0) return missing
  const tag = index.motors.get(motor)?.tag ?? motor
  if (!index.loadOfMotor.has(motor))
    return unless(false, [...path, 'motor'], `Motor ${tag} in ${who} drives nothing; add its driven load.`)
  return unless(
    curveOf(index, motor, curve) !== undefined,
    [...path, field],
    `${who} asks for curve “${curve}” of motor ${tag}, which its driven load does not have; choose one of its curves.`,
  )
}

const plantConditions = ({ plant }: StudyDocument, index: RecordIndex): FieldIssue[] =>
  plant.plantConditions.flatMap((condition, i) => {
    const who = `Plant condition ${condition.tag}`
    const path = ['plant', 'plantConditions', i] as const
    return [
      ...once(condition.running, [...path, 'running'], who),
      ...condition.running.flatMap(({ motor, curve }, k) =>
        motorAndCurve(index, who, motor, curve, [...path, 'running', k], 'curve'),
      ),
      ...condition.capacitors.flatMap((id, k) =>
        known(index.capacitors, id, [...path, 'capacitors', k], who, 'capacitor'),
      ),
      ...condition.loadsOff.flatMap((id, k) => known(index.loads, id, [...path, 'loadsOff', k], who, 'load')),
      ...condition.taps.flatMap(({ transformer }, k) =>
        known(index.transformers, transformer, [...path, 'taps', k, 'transformer'], who, 'transformer'),
      ),
    ]
  })

const loadConditions = ({ plant }: StudyDocument, index: RecordIndex): FieldIssue[] =>
  plant.loadConditions.flatMap((condition, i) => {
    const who = `Load condition ${condition.tag}`
    const path = ['plant', 'loadConditions', i] as const
    return [
      ...once(condition.curves, [...path, 'curves'], who),
      ...condition.curves.flatMap(({ motor, starting, process }, k) => [
        ...motorAndCurve(index, who, motor, starting, [...path, 'curves', k], 'starting'),
        ...(process === null ? [] : motorAndCurve(index, who, motor, process, [...path, 'curves', k], 'process')),
      ]),
    ]
  })

/** References of what runs, what starts and what is driven. */
export const conditionReferences = (document: StudyDocument, index: RecordIndex): FieldIssue[] => [
  ...plantConditions(document, index),
  ...loadConditions(document, index),
  ...scheduleReferences(document, index),
]
