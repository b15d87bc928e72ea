import type { CaseRecord } from '@/lib/study/document/case-records'
import type { MotorRecord } from '@/lib/study/document/machine-records'
import type { StudyDocument } from '@/lib/study/document/study-document'

export interface ChosenStart {
  record: CaseRecord
  motor: MotorRecord
}

/**
 * The start that is checked by hand: the first direct one of a case without departures, else the first start of such a
 * case; null where no case starts a motor.
 */
export const chosenStart = (document: StudyDocument): ChosenStart | null => {
  const starts = document.cases
    .filter(({ changes }) => changes.length === 0)
    .flatMap((record) => {
      const schedule = document.schedules.find(({ id }) => id === record.schedule)
      return (schedule?.starts ?? []).flatMap((start) => {
        const motor = document.plant.motors.find(({ id }) => id === start.motor)
        const starter = document.plant.starters.find(({ id }) => id === start.starter)
        return motor && starter ? [{ record, motor, direct: starter.kind === 'direct' }] : []
      })
    })
  return starts.find(({ direct }) => direct) ?? starts[0] ?? null
}
