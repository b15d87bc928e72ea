import type { InductionCircuit } from '../case-input'
import type { Derivative } from '../numeric/dormand-prince'

/** A machine behind a supply impedance, ready for the equations in flux linkages a second. */
export interface TransientMachine {
  /** Angular frequency of the supply, rad/s. */
  base: number
  poles: number
  /** Stator with the supply in front of it, ohm. */
  resistance: number
  leakage: number
  /** Rotor circuits: resistance and leakage reactance of each, ohm. */
  rotor: readonly { resistance: number; reactance: number }[]
  /** 1/(1/X_m + 1/X_ls + Σ1/X_lr), ohm. */
  mutual: number
  /** Peak of the phase voltage (V) in q and d, constant in the synchronous frame. */
  voltage: { q: number; d: number }
  /** Brings what depends on the speed (rad/s) up to date: skin effect, and a network that changes along the run-up. */
  follow?: (speed: number) => void
}

/**
 * Lays out a machine behind the impedance of its supply. Core loss is left out, as in the fifth-order model.
 *
 * @param emf line voltage of the supply, V RMS
 * @param switching angle of phase a's voltage at the instant of switching on, rad
 */
export function transientMachine(
  circuit: InductionCircuit,
  supply: { impedance: { re: number; im: number }; emf: number; frequency: number },
  poles: number,
  switching: number,
): TransientMachine {
  const rotor = circuit.cages.map(({ resistance, reactance }) => ({ resistance, reactance }))
  const leakage = circuit.stator.im + supply.impedance.im
  const peak = Math.sqrt(2 / 3) * supply.emf
  return {
    base: 2 * Math.PI * supply.frequency,
    poles,
    resistance: circuit.stator.re + supply.impedance.re,
    leakage,
    rotor,
    mutual: 1 / (1 / circuit.magnetising + 1 / leakage + rotor.reduce((sum, { reactance }) => sum + 1 / reactance, 0)),
    voltage: { q: peak * Math.cos(switching), d: -peak * Math.sin(switching) },
  }
}

/** Decay of a flux beyond which a time step would have to be shorter than the pictures of these models are worth, 1/s. */
const fastestDecay = 3e4

/**
 * Whether the equations can be followed in time: a winding without leakage reactance, or with hardly any beside its
 * resistance, has fluxes that decay within microseconds.
 *
 * @param impedances stator with the supply in front of it, and each rotor circuit, ohm
 */
export const canBeFollowed = (
  impedances: readonly { resistance: number; reactance: number }[],
  frequency: number,
): boolean =>
  impedances.every(({ resistance, reactance }) => 2 * Math.PI * frequency * resistance < fastestDecay * reactance)

/** What a state says: stator currents in q and d (A peak), and torque (N·m). */
export interface TransientReading {
  q: number
  d: number
  torque: number
}

/** Currents and torque of a state; the state is ψ_qs, ψ_ds, then ψ_qr, ψ_dr of each rotor circuit, then the speed in rad/s. */
export function readState(machine: TransientMachine, state: Float64Array, into: TransientReading): void {
  const { leakage, mutual, rotor, base, poles } = machine
  let [q, d] = [state[0]! / leakage, state[1]! / leakage]
  for (let k = 0; k < rotor.length; k++) {
    q += state[2 + 2 * k]! / rotor[k]!.reactance
    d += state[3 + 2 * k]! / rotor[k]!.reactance
  }
  into.q = (state[0]! - mutual * q) / leakage
  into.d = (state[1]! - mutual * d) / leakage
  into.torque = (0.75 * poles * (state[1]! * into.q - state[0]! * into.d)) / base
}

/**
 * Fifth-order equations in the synchronous frame, flux linkages in V; with a second cage two more states.
 *
 * ψ_qs' = ω_b(v_qs − ψ_ds − r_s·i_qs), ψ_ds' = ω_b(v_ds + ψ_qs − r_s·i_ds), ψ_qr' = ω_b(−s·ψ_dr − r_r·i_qr),
 * ψ_dr' = ω_b(s·ψ_qr − r_r·i_dr), J·ω' = T − T_L. Source: textbooks on the analysis of electric machinery.
 *
 * @param loadTorque N·m at a speed in rad/s
 * @param inertia kg·m²
 */
export function transientDerivative(
  machine: TransientMachine,
  loadTorque: (speed: number) => number,
  inertia: number,
): Derivative {
  const { base, poles, rotor, voltage } = machine
  const speedAt = 2 + 2 * rotor.length
  const reading: TransientReading = { q: 0, d: 0, torque: 0 }
  return (_t, state, rate) => {
    machine.follow?.(state[speedAt]!)
    const { resistance, mutual, leakage } = machine
    readState(machine, state, reading)
    let [sumQ, sumD] = [state[0]! / leakage, state[1]! / leakage]
    for (let k = 0; k < rotor.length; k++) {
      sumQ += state[2 + 2 * k]! / rotor[k]!.reactance
      sumD += state[3 + 2 * k]! / rotor[k]!.reactance
    }
    const [mq, md] = [mutual * sumQ, mutual * sumD]
    const speed = state[speedAt]!
    const slip = 1 - (speed * poles) / (2 * base)
    rate[0] = base * (voltage.q - state[1]! - resistance * reading.q)
    rate[1] = base * (voltage.d + state[0]! - resistance * reading.d)
    for (let k = 0; k < rotor.length; k++) {
      const { resistance: r, reactance: x } = rotor[k]!
      const [q, d] = [state[2 + 2 * k]!, state[3 + 2 * k]!]
      rate[2 + 2 * k] = base * (-slip * d - (r * (q - mq)) / x)
      rate[3 + 2 * k] = base * (slip * q - (r * (d - md)) / x)
    }
    rate[speedAt] = (reading.torque - loadTorque(speed)) / inertia
    return true
  }
}
