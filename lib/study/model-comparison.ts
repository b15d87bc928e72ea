import type { CaseResult } from '../engine/case-result'
import type { StudyDocument } from './document/study-document'
import { busTag, motorTag } from './words/tags'

/** One figure of a case by its own model and by the quasi-static one, SI; null where a model has none. */
export interface ModelRow {
  name: string
  quantity: 'time' | 'voltage' | 'current' | 'torque' | 'part'
  own: number | null
  steady: number | null
}

type Compared = Pick<CaseResult, 'model' | 'motors' | 'places' | 'transient' | 'peaks' | 'variants'>

/** Figures that the models give differently: run-up, dips and currents; empty for a quasi-static case. */
export const modelComparison = (document: StudyDocument, result: Compared): readonly ModelRow[] => {
  const steady = result.variants?.find(({ kind }) => kind === 'quasi-static')?.result
  if (!steady || result.model === 'quasi-static') return []
  const starts = result.motors.flatMap(({ motorId, start }): ModelRow[] => {
    const other = steady.motors.find((each) => each.motorId === motorId)?.start
    if (!start || !other) return []
    const tag = motorTag(document, motorId)
    return [
      {
        name: `${tag}: run-up to the criterion`,
        quantity: 'time',
        own: start.timeToCriterion,
        steady: other.timeToCriterion,
      },
      {
        name: `${tag}: largest RMS current`,
        quantity: 'current',
        own: start.peakMotorCurrent.current,
        steady: other.peakMotorCurrent.current,
      },
      {
        name: `${tag}: lowest terminal voltage`,
        quantity: 'voltage',
        own: start.lowestMotorVoltage.voltage,
        steady: other.lowestMotorVoltage.voltage,
      },
      {
        name: `${tag}: least accelerating torque, of rated`,
        quantity: 'part',
        own: start.leastAccelerating.ofRated,
        steady: other.leastAccelerating.ofRated,
      },
    ]
  })
  const places = result.places.map((place): ModelRow => {
    const other = steady.places.find(({ busId }) => busId === place.busId)
    const name = `${busTag(document, place.busId)}: deepest voltage`
    return { name, quantity: 'voltage', own: place.deepest.voltage, steady: other?.deepest.voltage ?? null }
  })
  return [...starts, ...places, ...beyondSteady(document, result)]
}

/** What only the fifth-order model has. */
const beyondSteady = (document: StudyDocument, { transient, peaks }: Compared): readonly ModelRow[] => {
  if (!transient) return []
  const tag = motorTag(document, transient.motorId)
  const only = (name: string, quantity: ModelRow['quantity'], own: number | null): ModelRow => ({
    name: `${tag}: ${name}`,
    quantity,
    own,
    steady: null,
  })
  const peak = peaks?.find(({ motorId }) => motorId === transient.motorId)
  return [
    only('RMS voltage over the first period', 'voltage', transient.firstPeriod),
    only('largest instantaneous current', 'current', peak?.peakCurrent.current ?? null),
    only('greatest instantaneous torque', 'torque', peak?.peakTorque.torque ?? null),
    only('least instantaneous torque', 'torque', peak?.lowestTorque.torque ?? null),
    only('direct component of the current over the first period', 'current', transient.direct.current),
    only('time constant of the direct component, rotor turning', 'time', transient.direct.timeConstant),
  ]
}
