import type { MotorRecord } from '@/lib/study/document/machine-records'
import type { StarterRecord } from '@/lib/study/document/starter-record'
import type { StudyDocument } from '@/lib/study/document/study-document'

const designStarts = (document: StudyDocument) => {
  const schedules = new Set(document.cases.filter(({ role }) => role === 'design').map((one) => one.schedule))
  return document.schedules.filter(({ id }) => schedules.has(id)).flatMap((schedule) => schedule.starts)
}

/** Starting methods that design cases use, in the order of the records. */
export const designStarters = (document: StudyDocument): readonly StarterRecord[] => {
  const used = new Set(designStarts(document).map((start) => start.starter))
  return document.plant.starters.filter(({ id }) => used.has(id))
}

/** Motors that design cases start, in the order of the records. */
export const designMotors = (document: StudyDocument): readonly MotorRecord[] => {
  const started = new Set(designStarts(document).map((start) => start.motor))
  return document.plant.motors.filter(({ id }) => started.has(id))
}

/** Starting methods by which design cases start one motor. */
export const startersOfMotor = (document: StudyDocument, motorId: string): readonly StarterRecord[] => {
  const used = new Set(designStarts(document).flatMap(({ motor, starter }) => (motor === motorId ? [starter] : [])))
  return document.plant.starters.filter(({ id }) => used.has(id))
}
