import { type CaseFigure, motorOf } from './case-figure'
import type { EventSpec } from './plot/line-plot-spec'

/** Change-overs of the starting devices and the instants at which motors reach the speed criterion. */
export const caseEvents = ({ document, result }: CaseFigure): readonly EventSpec[] => {
  const several = result.motors.filter((motor) => motor.start !== null).length > 1
  const prefix = (motorId: string) => (several ? `${motorOf(document, motorId).tag} ` : '')
  return result.changeOvers
    .filter((one) => one.to === 'running')
    .map((one) => ({ name: `${prefix(one.motorId)}change-over ${one.at.toFixed(2)}\u2009s`, at: one.at }))
}
