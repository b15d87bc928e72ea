import type { Starter } from '../case-input'
import type { ChangeOverResult, MotorState, StartOutcome } from '../case-result'
import type { Attempt } from '../schedule-input'
import type { StartCapacitor } from '../starter-input'
import type { Position, Step, Until } from '../starters/position'
import type { ContactorCourse } from './contactor'
import type { Watch } from './extremes'
import type { GeneratorCourse } from './generator-course'

/** How far one start has come. Instants are case time, s; null until reached. */
export interface StartCourse {
  motor: number
  starter: Starter
  /** When it is switched on. */
  at: number
  /** Positions of its device, the present one (−1 while off) and when it was taken. */
  steps: readonly Step[]
  step: number
  position: Position
  since: number
  switchedOn: boolean
  turned: boolean
  runningAt: number | null
  /** The start that this one waits for and the least time after its switching-on. */
  former: StartCourse | null
  interval: number
  /** Attempts before the one that counts, and which one this is. */
  attempts: readonly Attempt[]
  attempt: number
  /** Its contactor, where it may end the start. */
  contactor: ContactorCourse | null
  /** When its protection takes the last attempt off the line, from its switching-on; null where it does not. */
  tripAt: number | null
  /** Line voltage in V below which its drive switches itself off; null for other devices. */
  undervoltage: number | null
  /** Capacitors switched with the start: null while they wait, then whether they are in. */
  capacitors: { readonly item: StartCapacitor; state: 'waiting' | 'in' | 'out' }[]
  at95: number | null
  atCriterion: number | null
  /** Integrals when the criterion was reached. */
  i2t: number | null
  slipEnergy: number | null
  /** What ∫I²dt so far heats the winding beyond the same integral in the running position, and the integral so far. */
  extraHeat: number
  i2tSeen: number
  extraAtCriterion: number | null
  standstill: MotorState | null
  outcome: StartOutcome | null
  /** Speed in rad/s of 95 % of rated and of the criterion. */
  speed95: number
  speedCriterion: number
  watches: { line: Watch; motor: Watch; voltage: Watch; accelerating: Watch }
}

/** What the present position of a starting device waits for; null when it is kept, and before switching on. */
export const untilOf = (start: StartCourse): Until | null => start.steps[start.step]?.until ?? null

/** How a machine that ran before the start fares. */
export interface RunningCourse {
  motor: number
  before: MotorState
  /** Instant of the last fall below breakdown speed; null while above it. */
  pulledOutAt: number | null
  contactor: ContactorCourse | null
  watches: { voltage: Watch; speed: Watch; current: Watch }
}

export interface BusWatches {
  deepest: Watch
  highest: Watch
}

/** Everything noted on the way through a run. */
export interface Courses {
  starts: readonly StartCourse[]
  /** Attempts that are over. */
  earlier: StartCourse[]
  running: readonly RunningCourse[]
  buses: readonly BusWatches[]
  changeOvers: ChangeOverResult[]
  /** Null where no generator supplies the plant at any time. */
  generator: GeneratorCourse | null
}
