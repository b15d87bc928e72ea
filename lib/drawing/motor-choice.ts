import type { MotorResult } from '@/lib/engine/case-result'
import { type CaseFigure, startedMotors } from './case-figure'
import { mostSeries } from './series-style'

export interface MotorChoice {
  /** Motors to draw; those that are started when absent. */
  motorIds?: readonly string[]
}

/** The motors to draw, six at most; those that start when none are named. */
export const chosenMotors = ({ result }: CaseFigure, { motorIds }: MotorChoice): readonly MotorResult[] => {
  const chosen = motorIds ? result.motors.filter((motor) => motorIds.includes(motor.motorId)) : startedMotors(result)
  return chosen.slice(0, mostSeries)
}
