import type {
  Ampere,
  Complex,
  NewtonMetre,
  Ohm,
  PerUnit,
  RadianPerSecond,
  Second,
  Siemens,
  Volt,
  Watt,
} from '../units/si'

/** When a starting device goes to its next position; time counts from the motor's own switching-on. */
export type ChangeOver =
  | { kind: 'time'; at: Second }
  | { kind: 'speed'; at: RadianPerSecond }
  /** The current taken from the line has fallen to this. A soft starter's is looked at once its ramp is over. */
  | { kind: 'current'; below: Ampere }
  /** The voltage at the motor's terminals (line to line) has risen to this. */
  | { kind: 'voltage'; above: Volt }

/** Impedance in series with the motor, ohm per phase, taken out at the change-over without a gap. */
export interface SeriesStarter {
  kind: 'reactor' | 'resistor'
  impedance: Complex<Ohm>
  changeOver: ChangeOver
}

/**
 * Thyristor soft starter, fundamental only and without losses. The smaller of what the ramp asks for and what the
 * current limit allows holds. A torque ramp gives the torque in N·m that the motor is to develop.
 */
export interface SoftStarter {
  kind: 'soft-starter'
  ramp: { kind: 'voltage'; from: PerUnit; to: PerUnit } | { kind: 'torque'; from: NewtonMetre; to: NewtonMetre }
  /** Length of the ramp, which begins after the kick. */
  rampTime: Second
  /** A short pulse of higher voltage that breaks the load away; without current limit. */
  kick: { voltage: PerUnit; time: Second } | null
  /** Largest current taken from the line, A; null for none. */
  currentLimit: Ampere | null
  /** When it is bypassed; null: it stays in, and is in its running position once it lets the whole voltage through. */
  bypass: ChangeOver | null
}

/** Part of the winding first: shares of the whole winding's current and torque at the same voltage, as the maker states them. */
export interface PartWindingStarter {
  kind: 'part-winding'
  currentShare: PerUnit
  torqueShare: PerUnit
  /** Part of the winding that carries the current first, for its heat (1/2 as a rule). */
  windingShare: PerUnit
  changeOver: ChangeOver
}

/** Resistance added to each rotor phase of a slip-ring motor, referred to the stator, step after step to none. */
export interface RotorResistanceStarter {
  kind: 'rotor-resistance'
  steps: readonly { resistance: Ohm; changeOver: ChangeOver }[]
}

/** Transformer switched together with its motor and staying in: ratio motor side to bus side, impedance on the bus side. */
export interface CaptiveTransformerStarter {
  kind: 'captive-transformer'
  ratio: PerUnit
  impedance: Complex<Ohm>
}

/**
 * Frequency converter with a diode or controlled front end: the supply sees shaft power plus losses at the drive's own
 * power factors. The motor follows a ramp of speed as far as the torque limit allows.
 */
export interface DriveStarter {
  kind: 'drive'
  /** Speed at the end of the ramp, and how long the ramp takes from standstill. */
  speed: RadianPerSecond
  rampTime: Second
  /** Largest shaft torque, N·m, and largest motor current, A (either may be null). */
  torqueLimit: NewtonMetre | null
  currentLimit: Ampere | null
  ratedCurrent: Ampere
  /** No-load current of the motor in parts of its rated current. */
  magnetising: PerUnit
  /** Losses of drive and motor together at rated load, W; they scale with the square of the motor current. */
  losses: Watt
  /** Slip at rated torque, for the heat in the rotor. */
  ratedSlip: PerUnit
  /** Power factor of the fundamental, and of the whole current with its harmonics. */
  displacementFactor: PerUnit
  totalFactor: PerUnit
  /** Line voltage below which the drive switches itself off, V line to line; null where it has none. */
  undervoltage: Volt | null
  /** When the motor goes over to the line; null: it stays on the drive. */
  bypass: ChangeOver | null
}

export type FurtherStarter =
  | SeriesStarter
  | SoftStarter
  | PartWindingStarter
  | RotorResistanceStarter
  | CaptiveTransformerStarter
  | DriveStarter

/** Capacitors that are switched with a start, at the line side of the starting device. */
export interface StartCapacitor {
  /** Per phase, S: reactive power over the square of its own rated voltage. */
  susceptance: Siemens
  /** Null: in with the motor. */
  on: ChangeOver | null
  /** Null: stays in. */
  off: ChangeOver | null
}

/** What a starting device may be asked for. */
export interface StarterDuty {
  /** Longest time of one start outside the running position; null where the maker is silent. */
  secondsPerStart: Second | null
  startsPerHour: number | null
  /** Starts in an hour that the plant plans; null where nothing is planned. */
  plannedPerHour: number | null
}
