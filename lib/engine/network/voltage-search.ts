import type { NonlinearLoads } from './static-load'

/** Current balance f(V) = 0 at the nodes that are searched, however its derivatives are stored. */
export interface Balance {
  /** Voltages searched: re, im a node; the last solution, from which the next search starts. */
  readonly voltage: Float64Array
  /** Nominal voltage of each of these nodes, V. */
  readonly nominal: Float64Array
  /** Written by `solve`: the change of each voltage. */
  readonly step: Float64Array
  /** Place of each nonlinear load among these nodes; negative where it stands at a node of known voltage. */
  readonly placeOfLoad: Int32Array
  /** Evaluates f with this share of the nonlinear loads; with `derive` the derivatives too. Returns its size in parts of A_ii·U_n. */
  balance(share: number, derive: boolean): number
  /** Adds an admittance at a node to f and its derivatives. */
  addAdmittance(place: number, re: number, im: number): void
  /** step ← the solution of (∂f/∂V)·step = −f; false where the derivatives are singular. */
  solve(): boolean
}

export interface VoltageSearch {
  /** Looks for a solution, from the last one where there is one; false where there is none. */
  find(warm: boolean): boolean
  /** Place of the lowest voltage that the last search without a solution reached. */
  readonly weakest: number
}

/** A relative voltage change below which Newton's next one would be lost in round-off. */
const settled = 1e-8
const maxIterations = 25
const maxHalvings = 12
/** Smallest step of the share of the nonlinear load in the continuation. */
const smallestShare = 1e-4

/**
 * Newton's method on the current balance, with both ∂f/∂V and ∂f/∂V*; the step is halved while the mismatch does not
 * fall. Where that fails the nonlinear share is raised from none to all by continuation; where that fails too, a
 * solution with all loads below their floors is tried.
 */
export function createVoltageSearch(
  equations: Balance,
  loads: NonlinearLoads,
  counters: { iterations: number; continuations: number },
): VoltageSearch {
  const { voltage, nominal, step, placeOfLoad } = equations
  const q = nominal.length
  const kept = new Float64Array(2 * q)
  let weakest = 0

  function newton(share: number): boolean {
    let size = equations.balance(share, true)
    for (let round = 0; round < maxIterations; round++) {
      counters.iterations++
      if (!equations.solve()) return false
      let change = 0
      for (let i = 0; i < q; i++) {
        const here =
          (Math.abs(step[2 * i]!) + Math.abs(step[2 * i + 1]!)) /
          (Math.abs(voltage[2 * i]!) + Math.abs(voltage[2 * i + 1]!))
        if (!(here <= change)) change = here
      }
      if (Number.isNaN(change)) return false
      for (let i = 0; i < 2 * q; i++) voltage[i] = voltage[i]! + step[i]!
      if (change < settled) return true
      let after = equations.balance(share, true)
      let part = 1
      for (let halving = 0; !(after < size) && after > 1e-10; halving++) {
        if (halving === maxHalvings) return false
        part /= 2
        for (let i = 0; i < 2 * q; i++) voltage[i] = voltage[i]! - part * step[i]!
        after = equations.balance(share, true)
      }
      size = after
    }
    return false
  }

  /** Voltages with every nonlinear load replaced by a constant admittance, or left out. */
  function startFrom(kind: 'nothing' | 'nominal' | 'floor'): boolean {
    for (let i = 0; i < q; i++) {
      voltage[2 * i] = nominal[i]!
      voltage[2 * i + 1] = 0
    }
    equations.balance(0, true)
    for (let l = 0; kind !== 'nothing' && l < loads.count; l++) {
      const i = placeOfLoad[l]!
      if (i < 0) continue
      const w = kind === 'floor' ? loads.floor[l]! : nominal[i]! ** 2
      if (w === 0) return false
      const g = loads.current[l]! / Math.sqrt(w) + loads.share[l]! / w
      equations.addAdmittance(i, g * loads.power[2 * l]!, g * loads.power[2 * l + 1]!)
    }
    if (!equations.solve()) return false
    for (let i = 0; i < 2 * q; i++) voltage[i] = voltage[i]! + step[i]!
    return true
  }

  /** From no nonlinear load to all of it, in steps that shrink where Newton fails. */
  function continuation(): boolean {
    counters.continuations++
    if (!startFrom('nothing')) return false
    let share = 0
    let stride = 0.25
    while (share < 1) {
      kept.set(voltage)
      const next = Math.min(1, share + stride)
      if (newton(next)) {
        share = next
        stride *= 2
        continue
      }
      voltage.set(kept)
      stride /= 4
      if (stride < smallestShare) return false
    }
    return true
  }

  function noteWeakest(): void {
    let least = Number.POSITIVE_INFINITY
    for (let i = 0; i < q; i++) {
      const level = Math.hypot(voltage[2 * i]!, voltage[2 * i + 1]!) / nominal[i]!
      if (level < least) {
        least = level
        weakest = i
      }
    }
  }

  return {
    get weakest() {
      return weakest
    },
    find(warm) {
      if (q === 0) return true
      if (warm) {
        kept.set(voltage)
        if (newton(1)) return true
        voltage.set(kept)
      } else if (startFrom('nominal') && newton(1)) return true
      if (continuation()) return true
      noteWeakest()
      return startFrom('floor') && newton(1)
    },
  }
}
