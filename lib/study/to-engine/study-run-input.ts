import type { MachineModel } from '../../engine/case-input'
import type { StudyRunInput } from '../../engine/study-run'
import { DomainError, type FieldIssue } from '../../errors'
import { perUnit } from '../../units/si'
import type { StudyDocument } from '../document/study-document'
import { checkReferences } from '../references/check-references'
import { type RecordIndex, recordIndex } from '../references/record-index'
import { caseInputOf } from './case-input-of'
import { circuitEstimator, circuitInput, plateCircuits } from './circuit-input'
import { machineModel } from './machine-model'
import { ruleInputOf } from './rule-input-of'

/** Motors whose circuit some case needs: connected ones, and all where a level contains the plant's motors. */
const neededMotors = (document: StudyDocument, index: RecordIndex): ReadonlySet<string> => {
  const { cases, plant } = document
  const connected = cases.flatMap((record) => [
    ...(index.plantConditions.get(record.plantCondition)?.running ?? []),
    ...(index.schedules.get(record.schedule)?.starts ?? []),
  ])
  const inLevel = cases.some((record) => index.supplies.get(record.supply)?.plantMotorsIncluded === 'yes')
  return new Set([...connected.map(({ motor }) => motor), ...(inLevel ? plant.motors.map(({ id }) => id) : [])])
}

const circuitsOf = (document: StudyDocument, index: RecordIndex) => {
  const estimate = circuitEstimator(document.frequency.si)
  const needed = neededMotors(document, index)
  const circuits = new Map<string, MachineModel>()
  const issues: FieldIssue[] = []
  document.plant.motors.forEach((motor, i) => {
    if (!needed.has(motor.id)) return
    const outcome = circuitInput(motor, estimate)
    if (outcome.ok) circuits.set(motor.id, machineModel(motor, outcome.circuit, document.frequency.si))
    else
      issues.push({
        path: ['plant', 'motors', i, 'circuit'],
        message: `No circuit fits the nameplate of motor ${motor.tag}. ${outcome.detail}`,
      })
  })
  return { circuits, issues }
}

/** Places that limits on flicker name, with the intended starts an hour; null where none does. */
const flickerOf = ({ limits, plant, settings }: StudyDocument) => {
  const asked = limits.filter(({ quantity }) => quantity === 'flicker-short-term' || quantity === 'flicker-long-term')
  const busIds = asked.flatMap(({ place }) => (place.kind === 'bus' ? [place.bus] : plant.buses.map(({ id }) => id)))
  return busIds.length === 0 ? null : { busIds: [...new Set(busIds)], startsPerHour: settings.startsPerHour.si }
}

const refuse = (issues: readonly FieldIssue[]): DomainError =>
  new DomainError('invalid', `The study cannot be computed: ${issues[0]?.message}`, issues)

/**
 * All cases and limits of a document as the engine computes them, in SI. A document that does not fit together, or a
 * nameplate that no motor can have, is refused with one sentence a field.
 */
export const studyRunInput = (document: StudyDocument): StudyRunInput => {
  const broken = checkReferences(document)
  if (broken.length > 0) throw refuse(broken)
  const index = recordIndex(document)
  const { circuits, issues } = circuitsOf(document, index)
  if (issues.length > 0) throw refuse(issues)
  const { settings, cases, limits, frequency } = document
  const flicker = flickerOf(document)
  const onPlate = plateCircuits(frequency.si)
  const others = (motorId: string): readonly MachineModel[] => {
    const motor = index.motors.get(motorId)
    return motor ? onPlate(motor).map((circuit) => machineModel(motor, circuit, frequency.si)) : []
  }
  return {
    cases: cases.map((record) => ({
      ...caseInputOf(document, record, index, circuits, others),
      ...(flicker && { flicker }),
    })),
    rules: limits.map((limit) => ruleInputOf(limit, cases)),
    starts: { perDay: settings.startsPerDay.si, perHour: settings.startsPerHour.si },
    margins: { ofLimit: perUnit(settings.closeOfLimit.si), voltage: perUnit(settings.closeVoltage.si) },
  }
}
