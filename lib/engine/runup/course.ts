import type { Starter } from '../case-input'
import type { ChangeOverResult, MotorState, StartOutcome } from '../case-result'
import type { Position } from '../starters/position'
import type { Watch } from './extremes'

/** How far one start has come. Instants are case time, s; null until reached. */
export interface StartCourse {
  motor: number
  starter: Starter
  /** When it is switched on. */
  at: number
  position: Position
  switchedOn: boolean
  turned: boolean
  openedAt: number | null
  runningAt: number | null
  at95: number | null
  atCriterion: number | null
  /** Integrals when the criterion was reached. */
  i2t: number | null
  slipEnergy: number | null
  /** ∫I²dt of the line current when the motor left star; 0 for other starting devices. */
  i2tInStar: number
  standstill: MotorState | null
  outcome: StartOutcome | null
  /** Speed in rad/s of 95 % of rated, of the criterion and of the change-over (null without one by speed). */
  speed95: number
  speedCriterion: number
  speedChangeOver: number | null
  watches: { line: Watch; motor: Watch; voltage: Watch; accelerating: Watch }
}

/** How a machine that ran before the start fares. */
export interface RunningCourse {
  motor: number
  before: MotorState
  /** Instant of the last fall below breakdown speed; null while above it. */
  pulledOutAt: number | null
  watches: { voltage: Watch; speed: Watch; current: Watch }
}

export interface BusWatches {
  deepest: Watch
  highest: Watch
}

/** Everything noted on the way through a run. */
export interface Courses {
  starts: readonly StartCourse[]
  running: readonly RunningCourse[]
  buses: readonly BusWatches[]
  changeOvers: ChangeOverResult[]
}
