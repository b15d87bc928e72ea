import type { DeepBarLaw } from './deep-bar'
import type { MachineTable } from './machine-table'

/**
 * Machines by their rotor fluxes, stator transients neglected: each cage keeps its flux linkage ψ_k (in V, synchronous
 * frame, in the scale of line voltages), and the stator sees a voltage behind a transient impedance.
 *
 * ψ_m = (i_s + Σψ_k/X_k)·X_p, 1/X_p = 1/X_m + Σ1/X_k + j/R_c; u = Z'·i_s + E', Z' = r_s + j(X_s + X_p), E' = jX_p·Σψ_k/X_k;
 * dψ_k/dt = −ω_b(R_k·i_k + jsψ_k), i_k = (ψ_k − ψ_m)/X_k. At rest of the fluxes this is the steady circuit, core loss
 * included. Source: textbooks on the analysis of electric machinery (reduced-order models of the induction machine).
 */
export interface RotorFluxes {
  /** Z', ohm, and E', V: re, im of each machine; written by `look`. */
  readonly impedance: Float64Array
  readonly voltage: Float64Array
  /** Airgap power and loss in all cages, W; written by `carry`. */
  readonly airgap: Float64Array
  readonly rotorLoss: Float64Array
  /** What machine i with the fluxes from place `at` of the state on shows its stator at slip s. */
  look(i: number, slip: number, state: Float64Array, at: number): void
  /** Takes in the stator current (√3·I, re and im; 0 while open) that goes with the fluxes last looked at. */
  carry(i: number, re: number, im: number, state: Float64Array, at: number): void
  /** dψ/dt of the machine last looked at and carried, into the same places. */
  rates(i: number, slip: number, state: Float64Array, at: number, rate: Float64Array): void
  /** Fluxes of the steady circuit with the given voltage (line, V) at the winding. */
  settle(i: number, slip: number, re: number, im: number, state: Float64Array, at: number): void
}

const stride = 8

/** Rotor circuits of a machine: 1 or 2. */
export const cagesOf = ({ circuit }: MachineTable, i: number): number => (circuit[stride * i + 6]! > 0 ? 2 : 1)

/** @param base angular frequency of the supply, rad/s */
export function createRotorFluxes(table: MachineTable, base: number): RotorFluxes {
  const { circuit, count } = table
  const impedance = new Float64Array(2 * count)
  const voltage = new Float64Array(2 * count)
  const airgap = new Float64Array(count)
  const rotorLoss = new Float64Array(count)
  /** X_p: re, im; Σψ_k/X_k: re, im. */
  const inner = new Float64Array(4 * count)
  /** R and X of two cages, and their currents, a machine. */
  const cages = new Float64Array(4 * count)
  const current = new Float64Array(4 * count)

  /** R and X of the cages at a slip, an absent one with no conductance. */
  function cagesAt(i: number, slip: number): void {
    const at = stride * i
    const law: DeepBarLaw | null = table.deepBars[i] ?? null
    cages[4 * i] = circuit[at + 4]! + (law === null ? 0 : law.addedResistance(slip))
    cages[4 * i + 1] = law === null ? circuit[at + 5]! : law.reactance(slip)
    cages[4 * i + 2] = circuit[at + 6]!
    cages[4 * i + 3] = circuit[at + 7]!
  }

  return {
    impedance,
    voltage,
    airgap,
    rotorLoss,
    look(i, slip, state, at) {
      cagesAt(i, slip)
      const row = stride * i
      const place = 4 * i
      const second = cages[place + 2]! > 0
      const b1 = 1 / cages[place + 1]!
      const b2 = second ? 1 / cages[place + 3]! : 0
      const b = circuit[row + 2]! + b1 + b2
      const core = circuit[row + 3]!
      const size = b * b + core * core
      const pRe = b / size
      const pIm = -core / size
      const fRe = state[at]! * b1 + (second ? state[at + 2]! * b2 : 0)
      const fIm = state[at + 1]! * b1 + (second ? state[at + 3]! * b2 : 0)
      inner[place] = pRe
      inner[place + 1] = pIm
      inner[place + 2] = fRe
      inner[place + 3] = fIm
      // jX_p
      impedance[2 * i] = circuit[row]! - pIm
      impedance[2 * i + 1] = circuit[row + 1]! + pRe
      voltage[2 * i] = -(pIm * fRe + pRe * fIm)
      voltage[2 * i + 1] = pRe * fRe - pIm * fIm
    },
    carry(i, re, im, state, at) {
      const place = 4 * i
      const pRe = inner[place]!
      const pIm = inner[place + 1]!
      const sRe = inner[place + 2]! + re
      const sIm = inner[place + 3]! + im
      const mRe = pRe * sRe - pIm * sIm
      const mIm = pRe * sIm + pIm * sRe
      // Re(jψ_m·i*) less what the core takes
      airgap[i] = mRe * im - mIm * re - circuit[stride * i + 3]! * (mRe * mRe + mIm * mIm)
      let loss = 0
      for (let k = 0; k < 4; k += 2) {
        const r = cages[place + k]!
        if (r === 0) break
        const x = cages[place + k + 1]!
        const iRe = (state[at + k]! - mRe) / x
        const iIm = (state[at + k + 1]! - mIm) / x
        current[place + k] = iRe
        current[place + k + 1] = iIm
        loss += r * (iRe * iRe + iIm * iIm)
      }
      rotorLoss[i] = loss
    },
    rates(i, slip, state, at, rate) {
      const place = 4 * i
      for (let k = 0; k < 4; k += 2) {
        const r = cages[place + k]!
        if (r === 0) break
        rate[at + k] = -base * (r * current[place + k]! - slip * state[at + k + 1]!)
        rate[at + k + 1] = -base * (r * current[place + k + 1]! + slip * state[at + k]!)
      }
    },
    settle(i, slip, re, im, state, at) {
      cagesAt(i, slip)
      const row = stride * i
      // Y_e = Σ s/(R + jsX) + 1/(jX_m) + 1/R_c; e = u/(1 + Z_s·Y_e)
      let yRe = circuit[row + 3]!
      let yIm = -circuit[row + 2]!
      for (let k = 0; k < 2; k++) {
        const [r, x] = [cages[4 * i + 2 * k]!, slip * cages[4 * i + 2 * k + 1]!]
        if (r === 0) break
        const part = slip / (r * r + x * x)
        yRe += part * r
        yIm -= part * x
      }
      const [rs, xs] = [circuit[row]!, circuit[row + 1]!]
      const dRe = 1 + rs * yRe - xs * yIm
      const dIm = rs * yIm + xs * yRe
      const size = dRe * dRe + dIm * dIm
      // ψ_m = e/j
      const mRe = (im * dRe - re * dIm) / size
      const mIm = -(re * dRe + im * dIm) / size
      for (let k = 0; k < 2; k++) {
        const r = cages[4 * i + 2 * k]!
        if (r === 0) break
        // i_k = −jsψ_m/(R + jsX), ψ_k = ψ_m + X·i_k = ψ_m·R/(R + jsX)
        const x = slip * cages[4 * i + 2 * k + 1]!
        const square = r * r + x * x
        state[at + 2 * k] = (r * (r * mRe + x * mIm)) / square
        state[at + 2 * k + 1] = (r * (r * mIm - x * mRe)) / square
      }
    },
  }
}
