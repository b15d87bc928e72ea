import type { Complex, Ohm, PerUnit, Second, Volt } from '../units/si'
import type { GeneratorInput } from './generator-input'

/** A start that waits for another: switched on once that motor has started, at least so long after its switching-on. */
export interface StartAfter {
  motorId: string
  interval: Second
}

/** An attempt that is ended on purpose or given up: switched off so long after switching on, then at rest before the next. */
export interface Attempt {
  runFor: Second
  /** From switching off to the next switching-on; the motor coasts. */
  rest: Second
}

/** What the supply does to the plant for a time: a dip of its EMF, or none at all while it is transferred. */
export interface Disturbance {
  at: Second
  duration: Second
  /** EMF during it in parts of that before; 0: the plant is without supply. */
  remaining: PerUnit
  /** Supply at the same bus that the plant comes back on; left out where it comes back on its own. `remaining` is then 0. */
  to?: SecondSupply
  /** Time in which the residual voltage of the plant's motors decays; left out where nobody states it. */
  decayTime?: Second
}

/** A supply that waits unloaded, at its open-circuit voltage. */
export interface SecondSupply {
  impedance: Complex<Ohm>
  emf: Volt
  /** Angle by which its voltage leads that of the first supply's EMF, rad. */
  angle: number
  /** A generator in place of the network's equivalent. */
  generator?: GeneratorInput
}

/** Contactor of a running motor: it drops out after its delay below a voltage and may come back. */
export interface Contactor {
  /** Voltage of the motor's bus (line to line) below which it drops out, and after how long. */
  dropOut: Volt
  delay: Second
  /** Voltage above which it closes again, and after how long; null: it stays open. */
  reclose: { above: Volt; delay: Second } | null
}
