import type {
  Ampere,
  AmpereSquaredSecond,
  Complex,
  Hertz,
  Joule,
  NewtonMetre,
  Ohm,
  PerUnit,
  RadianPerSecond,
  Second,
  Volt,
  VoltAmpere,
  Watt,
} from '../units/si'
import type { CaseModel } from './case-input'
import type { EnvelopePoint } from './criteria/envelope'
import type { DirectStartPeaks } from './direct-start-peaks'
import type { UnfitCause } from './dynamic/chosen-model'
import type { TransientSeries, TransientStartResult } from './dynamic/transient-result'
import type { FlickerResult } from './flicker/start-flicker'
import type { ProtectionResult } from './protection/follow-protection'
import type { HeatBalance } from './protection/heat-balance'
import type { DutyResult } from './starters/duty'
import type { Position } from './starters/position'

/** How one start ended; every outcome is a result. */
export type StartOutcome =
  /** Speed criterion reached and starting device in its running position; from this motor's own switching-on. */
  | { kind: 'started'; at: Second }
  /** Settled on the tap or in star: the change-over condition was never met. */
  | { kind: 'not-transferred'; speed: RadianPerSecond }
  /** In the running position and settled below the speed criterion. */
  | { kind: 'below-criterion'; speed: RadianPerSecond }
  /** Came to a halt, or hangs at a speed below breakdown, with this torque missing to go on. */
  | { kind: 'stalled'; speed: RadianPerSecond; missing: NewtonMetre }
  | { kind: 'never-turned'; missing: NewtonMetre }
  /** Still on its way at the time limit, or when the network collapsed. */
  | { kind: 'timed-out'; speed: RadianPerSecond }
  /** Switched off before it had started, as its schedule asks; from this motor's own switching-on. */
  | { kind: 'abandoned'; at: Second; speed: RadianPerSecond }
  /** Switched off: by lack of voltage (the drive's level, or its contactor's) or by its relay; from this motor's own switching-on. */
  | { kind: 'tripped'; cause: 'undervoltage' | 'contactor' | 'protection'; at: Second; speed: RadianPerSecond }

/** How a machine that was running before the start came through it. */
export type RunningOutcome =
  | { kind: 'rode-through' }
  | { kind: 'pulled-out'; at: Second }
  | { kind: 'no-equilibrium' }
  /** Its contactor dropped out and stayed open. */
  | { kind: 'dropped-out'; at: Second }
  /** Its contactor dropped out and came back, and the motor is above breakdown speed again. */
  | { kind: 're-accelerated'; droppedAt: Second; reclosedAt: Second }

export type CaseOutcome =
  | { kind: 'complete' }
  /** The network has no solution from this instant on. */
  | { kind: 'collapsed'; at: Second; busId: string }
  /** The network has no solution before the start. */
  | { kind: 'no-load-flow'; busId: string | null }
  /** The case cannot be set up, for example buses without a supply. */
  | {
      kind: 'refused'
      cause: 'island' | 'no-supply' | 'zero-impedance-loop' | 'unlike-groups' | 'bad-value'
      buses: readonly string[]
      detail: string
    }

export interface VoltageAt {
  voltage: Volt
  at: Second
}

/** Voltages of one bus, line to line; changes are formed from these with a named reference. */
export interface PlaceResult {
  busId: string
  nominal: Volt
  before: Volt
  /** Just after the first switching-on, running motors still at their slip before it. */
  first: Volt
  deepest: VoltageAt
  highest: VoltageAt
  /** Every start over and speeds settled; null when that state was not reached. */
  settledAfterStart: Volt | null
  /** As above with the process loads on; null when not reached. */
  settledAfterProcess: Volt | null
}

/** Electrical state of a motor at one instant; line means what the supply sees, motor what the winding gets. */
export interface MotorState {
  speed: RadianPerSecond
  lineCurrent: Ampere
  motorCurrent: Ampere
  motorVoltage: Volt
  torque: NewtonMetre
  /** Power at the line side of the starting device. */
  power: Complex<VoltAmpere>
  powerFactor: number
}

export interface HeatUsed {
  /** ∫I²dt of the winding's current (three times the terminal figure while in star) over I_LR²·t_permissible; null when not declared. */
  byCurrent: PerUnit | null
  /** Rotor slip energy over T_LR·ω_s·t_permissible; null when not declared. */
  byRotor: PerUnit | null
  /** The larger of the two; null unless both are known. */
  figure: PerUnit | null
  /** The same with what attempts before left in the rotor; left out where there were none. */
  withEarlier?: PerUnit
  state: 'hot' | 'cold' | null
}

export interface StartResult {
  outcome: StartOutcome
  switchedOnAt: Second
  /** From this motor's own switching-on; null when not reached. */
  timeTo95: Second | null
  timeToCriterion: Second | null
  /** By models with transients its voltage is that of the first half period or instant, all else the steady locked rotor. */
  standstill: MotorState
  peakLineCurrent: { current: Ampere; at: Second }
  peakMotorCurrent: { current: Ampere; at: Second }
  /** Least motor torque minus load torque from standstill to 95 % of rated speed; a gap without voltage does not count. */
  leastAccelerating: { torque: NewtonMetre; ofRated: PerUnit; speed: RadianPerSecond }
  lowestMotorVoltage: VoltageAt
  /** ∫I²dt of the motor current from switching-on to the speed criterion (to the end where not reached). */
  i2t: AmpereSquaredSecond
  /** ∫ slip × airgap power dt over the same time. */
  slipEnergy: Joule
  kineticEnergy: Joule
  heatUsed: HeatUsed
  /** Whether the starting device bears this start; left out for devices that carry nothing on the way. */
  device?: DutyResult
  /** How the relay of the feeder takes this start; left out where none is stated. */
  protection?: ProtectionResult
  /** What the start leaves in the rotor, and how often it may be repeated; left out where the maker's data do not reach. */
  heatBalance?: HeatBalance
  settledSpeed: RadianPerSecond | null
}

export interface RunningResult {
  outcome: RunningOutcome
  before: MotorState
  lowestVoltage: VoltageAt
  lowestSpeed: { speed: RadianPerSecond; at: Second }
  peakCurrent: { current: Ampere; at: Second }
  settledSpeed: RadianPerSecond | null
}

export interface MotorResult {
  motorId: string
  /** Exactly one of the two is present. */
  start: StartResult | null
  /** Attempts before the start that counts, the first one first; left out where there were none. */
  earlierAttempts?: readonly StartResult[]
  running: RunningResult | null
  speedAtEnd: RadianPerSecond
}

/** Where a starting device or its capacitors went: `running` is the last position, `off` a trip. */
export type ChangeOverTarget = Position | 'capacitor-in' | 'capacitor-out'

/** State just after a starting device moved on. */
export interface ChangeOverResult {
  motorId: string
  at: Second
  to: ChangeOverTarget
  speed: RadianPerSecond
  state: MotorState
  /** Voltage of every bus at this instant, in the order of `places`. */
  busVoltages: readonly Volt[]
  /** Above breakdown slip on the running connection: transferred too early. */
  tooEarly: boolean
}

/** What the engine noticed that a reader must know; words are made elsewhere. */
export type Notice =
  | { kind: 'reduced-voltage-torque'; motorId: string; voltage: PerUnit }
  | { kind: 'change-over-too-early'; motorId: string }
  /** A start waited for another that never came. */
  | { kind: 'not-switched-on'; motorId: string; waitsFor: string }
  /** A stage of the relay without delay lies below what the first cycles bring with their direct-current part (peak over √2). */
  | { kind: 'stage-below-offset'; motorId: string; pickUp: Ampere; offset: Ampere }
  | { kind: 'residual-voltage-not-modelled' }
  | { kind: 'starter-duty-exceeded'; motorId: string; time: Second }
  | { kind: 'open-transition-without-transient'; motorId: string }
  | { kind: 'levels-motors-taken-out'; level: VoltAmpere }
  /** The fifth-order model was asked for, or must judge, and the case does not fit it: the numbers are quasi-static. */
  | { kind: 'transient-model-unfit'; cause: UnfitCause }
  /** Switched on near synchronous speed, so that the fifth-order model was taken unasked. */
  | { kind: 'cuts-in'; motorId: string }
  | { kind: 'load-below-floor'; loadId: string; at: Second }
  /** Power asked of the prime mover, in parts of the largest that it gives. */
  | { kind: 'prime-mover-overloaded'; share: PerUnit; at: Second }
  | { kind: 'excitation-at-ceiling'; time: Second }
  /** The plant comes on another supply before the residual voltage has decayed. */
  | { kind: 'transfer-within-residual'; deadTime: Second; decayTime: Second }

export interface MotorSeries {
  speed: readonly number[]
  torque: readonly number[]
  loadTorque: readonly number[]
  lineCurrent: readonly number[]
  motorCurrent: readonly number[]
  motorVoltage: readonly number[]
  activePower: readonly number[]
  reactivePower: readonly number[]
}

/** How a generator came through the run that it supplied, at its own bus. */
export interface GeneratorResult {
  /**
   * `not-recovered`: excitation at its ceiling at the end; `hunting`: voltage or speed never come to rest, as by a gain too
   * high; `failed`: voltage or frequency broke down.
   */
  outcome: 'recovered' | 'not-recovered' | 'hunting' | 'failed'
  /** Voltage held before the load step, just after it behind the first reactance, and the lowest of the run. */
  held: Volt
  first: Volt | null
  lowest: VoltageAt
  /** Voltage once the regulator has done what it can with every motor held at its speed just after the step; null where there is none. */
  sustained: Volt | null
  settled: Volt | null
  lowestFrequency: FrequencyAt
  highestFrequency: FrequencyAt
  settledFrequency: Hertz | null
  /** Across the air gap. */
  largestPower: { power: Watt; at: Second }
  /** Time that the excitation was at its ceiling. */
  atCeiling: Second
}

export interface FrequencyAt {
  frequency: Hertz
  at: Second
}

/** Sampled run, SI; every array is as long as `time`. Two samples at one instant are the values before and after a switching. */
export interface CaseSeries {
  time: readonly number[]
  busVoltage: Readonly<Record<string, readonly number[]>>
  motors: Readonly<Record<string, MotorSeries>>
  /** Envelopes and first periods of a start by the fifth-order model; absent in other cases. */
  transient?: TransientSeries
  /** Of the generator that supplies the plant; absent where none does. */
  generator?: GeneratorSeries
}

/** Frequency in Hz, excitation as its open-circuit voltage in V, power across the air gap in W. */
export interface GeneratorSeries {
  frequency: readonly number[]
  excitation: readonly number[]
  power: readonly number[]
}

export interface Counters {
  steps: number
  rejected: number
  evaluations: number
  networkIterations: number
  /** Largest current-balance mismatch left, in parts of the largest bus current. */
  largestMismatch: number
  /** Largest estimated local error of an accepted step in parts of the tolerance. */
  largestErrorRatio: number
}

export interface CaseResult {
  caseId: string
  /** Which model gave the numbers; settled states and what precedes the start are always steady circuits. */
  model: CaseModel['kind']
  outcome: CaseOutcome
  supply: {
    busId: string
    impedance: Complex<Ohm>
    emf: Volt
    /** Delivered at the supply's bus before the start. */
    powerBefore: Complex<VoltAmpere>
    /** Delivered there just after the first switching-on; null when nothing is started or that state does not exist. */
    powerFirst: Complex<VoltAmpere> | null
  } | null
  places: readonly PlaceResult[]
  motors: readonly MotorResult[]
  changeOvers: readonly ChangeOverResult[]
  notices: readonly Notice[]
  counters: Counters
  series: CaseSeries
  /** Peaks of direct starts by the transient model; absent where the case has none. */
  peaks?: readonly DirectStartPeaks[]
  /** What the fifth-order model gives beyond the tables of every case; absent in cases by other models. */
  transient?: TransientStartResult
  /** Flicker and rapid change at the places that were asked for; absent where none was or the run has no end. */
  flicker?: readonly FlickerResult[]
  /** The case once more with what the records leave open put otherwise, without curves; absent where nothing is open. */
  variants?: readonly CaseVariant[]
  /** Absent where the network supplies the plant all the time. */
  generator?: GeneratorResult
}

/**
 * `same-plate`: estimated machines replaced by others that meet the same plate; the verdict is that of the worst.
 * `third-order`: a quasi-static case that closes on residual voltages, for the limits that only a transient model judges.
 * `quasi-static`: what the quasi-static model gives, beside a case by another one.
 * `low-voltage-torque`: torque falls with the power 2.25 of a voltage below rated, for starts below 0.85 of it.
 */
export interface CaseVariant {
  kind: 'same-plate' | 'low-voltage-torque' | 'quasi-static' | 'third-order'
  result: Omit<CaseResult, 'series' | 'variants'>
  /** Worst points under the envelopes of the study; left out where none applies. */
  envelopes?: readonly { ruleId: string; points: readonly EnvelopePoint[] }[]
}
