import type { Ampere, PerUnit, Second } from '../units/si'
import type { InverseCurve } from './protection/inverse-curve'
import type { OverloadClass } from './protection/overload-class'

/** One element of a motor relay; currents are primary. */
export type RelayElement =
  | {
      kind: 'inverse'
      curve: InverseCurve
      pickUp: Ampere
      /** Time multiplier (IEC) or time dial (IEEE). */
      multiplier: number
      /** Time of the full reset without current; null: that of IEEE C37.112, at once for curves of IEC 60255-151. */
      reset: Second | null
    }
  /** Locked rotor, instantaneous: operates when the current has been above for the delay, falls back at once. */
  | { kind: 'definite'; pickUp: Ampere; delay: Second }
  | { kind: 'overload-class'; setting: Ampere; class: OverloadClass }
  | {
      kind: 'thermal-image'
      heating: Second
      cooling: Second
      /** Greatest lasting current k·I_b. */
      lasting: Ampere
      /** Lasting current before the first start; 0 cold. */
      before: Ampere
      /** Heat above which it releases no start, in parts of that which operates; null where it does not inhibit. */
      inhibit: PerUnit | null
    }

/** Protection of a motor feeder. */
export interface ProtectionInput {
  /** Side of the starting device whose current it measures. */
  measures: 'line' | 'motor'
  elements: readonly RelayElement[]
}

/** What the maker of a motor states about heat, as far as known; currents at the motor. */
export interface ThermalData {
  /** Permissible locked-rotor time at the declared locked-rotor current. */
  cold: Second | null
  hot: Second | null
  /** Points of the thermal limit curves, in any order. */
  limits: readonly { state: 'hot' | 'cold'; current: Ampere; time: Second }[]
  /** Time constants of cooling while running and at standstill. */
  coolingRunning: Second | null
  coolingStopped: Second | null
}
