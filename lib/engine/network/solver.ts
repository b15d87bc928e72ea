import { solveReal } from '../numeric/real-lu'
import { loadTerms } from './load-terms'
import type { ReducedNetwork } from './reduce'
import type { NonlinearLoads } from './static-load'
import { createVoltageSearch } from './voltage-search'

/** Currents and voltages of a reduced network for given admittances at its nodes; nothing is allocated while solving. */
export interface NetworkSolver {
  /** EMF or held voltage: re, im. Set by the caller. */
  readonly driven: Float64Array
  /** Admittance connected at each kept node besides the network: re, im. Set by the caller. */
  readonly shunt: Float64Array
  /** Current fed into each kept node (√3·I) besides: re, im. Set by the caller; zero where it says nothing. */
  readonly injection: Float64Array
  /** Voltage of each kept node: re, im. The last solution, from which the next search starts. */
  readonly voltage: Float64Array
  readonly counters: { solutions: number; iterations: number; continuations: number }
  /** False where the network has no solution; `weakest` then names the row of the lowest voltage reached. */
  solve(): boolean
  /** Takes the present `voltage` for the last solution, so that the next search starts from it. */
  resume(): void
  readonly weakest: number
  /** Largest current-balance mismatch of the last solution, in parts of the largest current at a node. */
  mismatch(): number
  /** Voltages of all nodes from the kept ones. */
  recover(into: Float64Array): void
}

/**
 * Solves f(V) = A·V − s·E − J + y·V + Σ conj(S(V)/V) = 0, J the injected currents.
 *
 * Nodes without nonlinear loads come first and are eliminated directly (a motor on its own cable costs one row
 * operation); the search of voltage-search runs on the nodes with nonlinear loads only.
 *
 * @param linear number of leading kept nodes without nonlinear loads
 * @param nominal nominal voltage of each kept node, V
 */
export function createSolver(
  network: ReducedNetwork,
  loads: NonlinearLoads,
  linear: number,
  nominal: Float64Array,
): NetworkSolver {
  const n = network.order
  const q = n - linear
  const driven = new Float64Array(2)
  const shunt = new Float64Array(2 * n)
  const injection = new Float64Array(2 * n)
  const voltage = new Float64Array(2 * n)
  /** Working copy of A + y, upper part eliminated down to row `linear`. */
  const work = new Float64Array(2 * n * n)
  const right = new Float64Array(2 * n)
  const jacobian = new Float64Array(4 * q * q)
  const residual = new Float64Array(2 * q)
  const step = new Float64Array(2 * q)
  const terms = new Float64Array(6)
  const drawn = new Float64Array(2 * n)
  const rowOfLoad = Int32Array.from(loads.node, (node) => network.rowOf[node]!)
  const counters = { solutions: 0, iterations: 0, continuations: 0 }
  let warm = false

  /** A + y with the linear nodes eliminated from the rows below them. */
  function eliminate(): void {
    work.set(network.admittance)
    for (let i = 0; i < n; i++) {
      const at = 2 * (i * n + i)
      work[at] = work[at]! + shunt[2 * i]!
      work[at + 1] = work[at + 1]! + shunt[2 * i + 1]!
      const re = network.source[2 * i]!
      const im = network.source[2 * i + 1]!
      right[2 * i] = re * driven[0]! - im * driven[1]! + injection[2 * i]!
      right[2 * i + 1] = re * driven[1]! + im * driven[0]! + injection[2 * i + 1]!
    }
    for (let k = 0; k < linear; k++) {
      const pivot = 2 * (k * n + k)
      const square = work[pivot]! * work[pivot]! + work[pivot + 1]! * work[pivot + 1]!
      const inverseRe = work[pivot]! / square
      const inverseIm = -work[pivot + 1]! / square
      for (let i = k + 1; i < n; i++) {
        const below = 2 * (i * n + k)
        const re = work[below]! * inverseRe - work[below + 1]! * inverseIm
        const im = work[below]! * inverseIm + work[below + 1]! * inverseRe
        if (re === 0 && im === 0) continue
        for (let j = k + 1; j < n; j++) {
          const to = 2 * (i * n + j)
          const from = 2 * (k * n + j)
          work[to] = work[to]! - re * work[from]! + im * work[from + 1]!
          work[to + 1] = work[to + 1]! - re * work[from + 1]! - im * work[from]!
        }
        right[2 * i] = right[2 * i]! - re * right[2 * k]! + im * right[2 * k + 1]!
        right[2 * i + 1] = right[2 * i + 1]! - re * right[2 * k + 1]! - im * right[2 * k]!
      }
    }
  }

  function substituteBack(): void {
    for (let k = linear - 1; k >= 0; k--) {
      let re = right[2 * k]!
      let im = right[2 * k + 1]!
      for (let j = k + 1; j < n; j++) {
        const at = 2 * (k * n + j)
        re -= work[at]! * voltage[2 * j]! - work[at + 1]! * voltage[2 * j + 1]!
        im -= work[at]! * voltage[2 * j + 1]! + work[at + 1]! * voltage[2 * j]!
      }
      const at = 2 * (k * n + k)
      const square = work[at]! * work[at]! + work[at + 1]! * work[at + 1]!
      voltage[2 * k] = (re * work[at]! + im * work[at + 1]!) / square
      voltage[2 * k + 1] = (im * work[at]! - re * work[at + 1]!) / square
    }
  }

  /** Mismatch at the nonlinear nodes for the present voltages; with `derive` the Jacobian too. Returns its size in parts of A_ii·U_n. */
  function balance(share: number, derive: boolean): number {
    for (let i = 0; i < q; i++) {
      const row = linear + i
      let re = -right[2 * row]!
      let im = -right[2 * row + 1]!
      for (let j = 0; j < q; j++) {
        const at = 2 * (row * n + linear + j)
        const yRe = work[at]!
        const yIm = work[at + 1]!
        const vRe = voltage[2 * (linear + j)]!
        const vIm = voltage[2 * (linear + j) + 1]!
        re += yRe * vRe - yIm * vIm
        im += yRe * vIm + yIm * vRe
        if (derive) {
          jacobian[4 * i * q + 2 * j] = yRe
          jacobian[4 * i * q + 2 * j + 1] = -yIm
          jacobian[(2 * i + 1) * 2 * q + 2 * j] = yIm
          jacobian[(2 * i + 1) * 2 * q + 2 * j + 1] = yRe
        }
      }
      residual[2 * i] = re
      residual[2 * i + 1] = im
    }
    for (let l = 0; l < loads.count; l++) {
      const row = rowOfLoad[l]!
      if (row < linear) continue
      const i = row - linear
      const vRe = voltage[2 * row]!
      const vIm = voltage[2 * row + 1]!
      loadTerms(loads, l, vRe, vIm, share, terms)
      residual[2 * i] = residual[2 * i]! + terms[0]!
      residual[2 * i + 1] = residual[2 * i + 1]! + terms[1]!
      if (!derive) continue
      const top = 4 * i * q + 2 * i
      const bottom = (2 * i + 1) * 2 * q + 2 * i
      jacobian[top] = jacobian[top]! + terms[2]!
      jacobian[top + 1] = jacobian[top + 1]! + terms[3]!
      jacobian[bottom] = jacobian[bottom]! + terms[4]!
      jacobian[bottom + 1] = jacobian[bottom + 1]! + terms[5]!
    }
    let size = 0
    for (let i = 0; i < q; i++) {
      const at = 2 * ((linear + i) * n + linear + i)
      const weight = (Math.abs(work[at]!) + Math.abs(work[at + 1]!)) * nominal[linear + i]!
      const here = (Math.abs(residual[2 * i]!) + Math.abs(residual[2 * i + 1]!)) / weight
      if (!(here <= size)) size = here
    }
    return size
  }

  const search = createVoltageSearch(
    {
      voltage: voltage.subarray(2 * linear),
      nominal: nominal.subarray(linear),
      step,
      placeOfLoad: rowOfLoad.map((row) => row - linear),
      balance,
      addAdmittance(i, re, im) {
        const [vRe, vIm] = [voltage[2 * (linear + i)]!, voltage[2 * (linear + i) + 1]!]
        residual[2 * i] = residual[2 * i]! + re * vRe - im * vIm
        residual[2 * i + 1] = residual[2 * i + 1]! + re * vIm + im * vRe
        const top = 4 * i * q + 2 * i
        const bottom = (2 * i + 1) * 2 * q + 2 * i
        jacobian[top] = jacobian[top]! + re
        jacobian[top + 1] = jacobian[top + 1]! - im
        jacobian[bottom] = jacobian[bottom]! + im
        jacobian[bottom + 1] = jacobian[bottom + 1]! + re
      },
      solve() {
        for (let i = 0; i < 2 * q; i++) step[i] = -residual[i]!
        return solveReal(jacobian, step, 2 * q)
      },
    },
    loads,
    counters,
  )

  return {
    driven,
    shunt,
    injection,
    voltage,
    counters,
    get weakest() {
      return linear + search.weakest
    },
    resume() {
      warm = true
    },
    solve() {
      counters.solutions++
      eliminate()
      if (!search.find(warm)) {
        warm = false
        return false
      }
      substituteBack()
      warm = Number.isFinite(voltage[0] ?? 0)
      return warm
    },
    mismatch() {
      let largest = 0
      let worst = 0
      drawn.fill(0)
      for (let l = 0; l < loads.count; l++) {
        const row = rowOfLoad[l]!
        if (row < 0) continue
        const [vRe, vIm] = [voltage[2 * row]!, voltage[2 * row + 1]!]
        const w = Math.max(vRe * vRe + vIm * vIm, loads.floor[l]!)
        const g = loads.current[l]! / Math.sqrt(w) + loads.share[l]! / w
        const [sRe, sIm] = [loads.power[2 * l]!, loads.power[2 * l + 1]!]
        drawn[2 * row] = drawn[2 * row]! + g * (sRe * vRe - sIm * vIm)
        drawn[2 * row + 1] = drawn[2 * row + 1]! + g * (sRe * vIm + sIm * vRe)
      }
      for (let i = 0; i < n; i++) {
        let re = drawn[2 * i]! + shunt[2 * i]! * voltage[2 * i]! - shunt[2 * i + 1]! * voltage[2 * i + 1]!
        let im = drawn[2 * i + 1]! + shunt[2 * i]! * voltage[2 * i + 1]! + shunt[2 * i + 1]! * voltage[2 * i]!
        const [sRe, sIm] = [network.source[2 * i]!, network.source[2 * i + 1]!]
        re -= sRe * driven[0]! - sIm * driven[1]! + injection[2 * i]!
        im -= sRe * driven[1]! + sIm * driven[0]! + injection[2 * i + 1]!
        for (let j = 0; j < n; j++) {
          const at = 2 * (i * n + j)
          const [yRe, yIm] = [network.admittance[at]!, network.admittance[at + 1]!]
          const termRe = yRe * voltage[2 * j]! - yIm * voltage[2 * j + 1]!
          const termIm = yRe * voltage[2 * j + 1]! + yIm * voltage[2 * j]!
          re += termRe
          im += termIm
          largest = Math.max(largest, Math.abs(termRe), Math.abs(termIm))
        }
        worst = Math.max(worst, Math.abs(re), Math.abs(im))
      }
      return largest > 0 ? worst / largest : 0
    },
    recover(into) {
      const columns = n + 1
      for (let node = 0; 2 * node < into.length; node++) {
        let re = 0
        let im = 0
        for (let j = 0; j < columns; j++) {
          const at = 2 * (node * columns + j)
          const rRe = network.recovery[at]!
          const rIm = network.recovery[at + 1]!
          if (rRe === 0 && rIm === 0) continue
          const vRe = j < n ? voltage[2 * j]! : driven[0]!
          const vIm = j < n ? voltage[2 * j + 1]! : driven[1]!
          re += rRe * vRe - rIm * vIm
          im += rRe * vIm + rIm * vRe
        }
        into[2 * node] = re
        into[2 * node + 1] = im
      }
    },
  }
}
