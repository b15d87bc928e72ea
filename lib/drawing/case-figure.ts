import type { CaseResult, MotorResult, PlaceResult } from '@/lib/engine/case-result'
import type { Verdict } from '@/lib/engine/criteria/rule'
import type { CaseRecord } from '@/lib/study/document/case-records'
import type { MotorRecord } from '@/lib/study/document/machine-records'
import type { BusRecord } from '@/lib/study/document/network-records'
import type { StudyDocument } from '@/lib/study/document/study-document'

/** What a figure of one case is drawn from. */
export interface CaseFigure {
  document: StudyDocument
  result: CaseResult
  /** Verdicts of the whole study; those of this case give the limit lines. */
  verdicts: readonly Verdict[]
}

/** Size on the sheet in mm. */
export interface FigureSize {
  width?: number
  height?: number
}

const found = <T>(value: T | undefined, what: string, id: string): T => {
  if (value === undefined) throw new Error(`The study has no ${what} with the identity ${id}.`)
  return value
}

export const caseOf = ({ document, result }: CaseFigure): CaseRecord =>
  found(
    document.cases.find((one) => one.id === result.caseId),
    'case',
    result.caseId,
  )

export const busOf = (document: StudyDocument, id: string): BusRecord =>
  found(
    document.plant.buses.find((one) => one.id === id),
    'bus',
    id,
  )

export const motorOf = (document: StudyDocument, id: string): MotorRecord =>
  found(
    document.plant.motors.find((one) => one.id === id),
    'motor',
    id,
  )

export const placeOf = (result: CaseResult, busId: string): PlaceResult | undefined =>
  result.places.find((place) => place.busId === busId)

/** Motors that are started in the case, in the order of switching on. */
export const startedMotors = (result: CaseResult): readonly MotorResult[] =>
  result.motors
    .filter((motor) => motor.start !== null)
    .sort((a, b) => (a.start?.switchedOnAt ?? 0) - (b.start?.switchedOnAt ?? 0))
