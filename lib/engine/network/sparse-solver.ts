import type { AdmittanceMatrix } from './admittance'
import { eliminationOrder } from './elimination-order'
import { loadTerms } from './load-terms'
import type { NetworkSolver } from './solver'
import type { NonlinearLoads } from './static-load'
import { createVoltageSearch } from './voltage-search'

/** A network that keeps every node but the driven one, as the solver of small ones keeps few. */
export interface SparseNetwork {
  /** Place of each node among the solver's voltages, −1 for the driven one. */
  rowOf: Int32Array
  solver: NetworkSolver
}

/**
 * Solves the current balance of a large network without reducing it: real 2 × 2 blocks, one a branch end, eliminated in
 * the order of least degree without pivoting. The work grows with the number of branches, not with a power of the
 * number of nodes. The method and its outcomes are those of `createSolver`, with which it agrees to round-off.
 *
 * Without pivoting a diagonal block that vanishes on the way counts as singular; that takes an exact resonance.
 *
 * @param driven node of known voltage
 * @param nominalOf nominal voltage of each node, V
 */
export function createSparseSolver(
  matrix: AdmittanceMatrix,
  loads: NonlinearLoads,
  driven: number,
  nominalOf: (node: number) => number,
): SparseNetwork {
  const { order, joined } = eliminationOrder(matrix, (node) => node !== driven)
  const n = order.length
  const rowOf = new Int32Array(matrix.order).fill(-1)
  order.forEach((node, place) => {
    rowOf[node] = place
  })
  const pattern = blockPattern(joined, rowOf)
  const { first, column, targets } = pattern
  const blocks = column.length
  const fixed = new Float64Array(2 * n)
  const upperFixed = new Float64Array(2 * blocks)
  const lowerFixed = new Float64Array(2 * blocks)
  const source = new Float64Array(2 * n)
  layOut()

  const drivenVoltage = new Float64Array(2)
  const shunt = new Float64Array(2 * n)
  const injection = new Float64Array(2 * n)
  const voltage = new Float64Array(2 * n)
  const nominal = Float64Array.from(order, nominalOf)
  const diagonal = new Float64Array(4 * n)
  const upper = new Float64Array(4 * blocks)
  const lower = new Float64Array(4 * blocks)
  const residual = new Float64Array(2 * n)
  const step = new Float64Array(2 * n)
  const terms = new Float64Array(6)
  const placeOfLoad = Int32Array.from(loads.node, (node) => rowOf[node]!)
  const counters = { solutions: 0, iterations: 0, continuations: 0 }
  let warm = false

  function layOut(): void {
    const { data, order: size } = matrix
    order.forEach((node, k) => {
      const own = 2 * (node * size + node)
      fixed[2 * k] = data[own]!
      fixed[2 * k + 1] = data[own + 1]!
      const fed = 2 * (node * size + driven)
      source[2 * k] = -data[fed]!
      source[2 * k + 1] = -data[fed + 1]!
      for (let b = first[k]!; b < first[k + 1]!; b++) {
        const other = order[column[b]!]!
        const [there, back] = [2 * (node * size + other), 2 * (other * size + node)]
        upperFixed[2 * b] = data[there]!
        upperFixed[2 * b + 1] = data[there + 1]!
        lowerFixed[2 * b] = data[back]!
        lowerFixed[2 * b + 1] = data[back + 1]!
      }
    })
  }

  function balance(share: number, derive: boolean): number {
    const [eRe, eIm] = [drivenVoltage[0]!, drivenVoltage[1]!]
    for (let k = 0; k < n; k++) {
      const yRe = fixed[2 * k]! + shunt[2 * k]!
      const yIm = fixed[2 * k + 1]! + shunt[2 * k + 1]!
      const vRe = voltage[2 * k]!
      const vIm = voltage[2 * k + 1]!
      const sRe = source[2 * k]!
      const sIm = source[2 * k + 1]!
      residual[2 * k] = yRe * vRe - yIm * vIm - (sRe * eRe - sIm * eIm) - injection[2 * k]!
      residual[2 * k + 1] = yRe * vIm + yIm * vRe - (sRe * eIm + sIm * eRe) - injection[2 * k + 1]!
      if (!derive) continue
      diagonal[4 * k] = yRe
      diagonal[4 * k + 1] = -yIm
      diagonal[4 * k + 2] = yIm
      diagonal[4 * k + 3] = yRe
    }
    for (let k = 0; k < n; k++) {
      for (let b = first[k]!; b < first[k + 1]!; b++) {
        const j = column[b]!
        addProduct(k, upperFixed[2 * b]!, upperFixed[2 * b + 1]!, j)
        addProduct(j, lowerFixed[2 * b]!, lowerFixed[2 * b + 1]!, k)
        if (!derive) continue
        spread(upper, b, upperFixed[2 * b]!, upperFixed[2 * b + 1]!)
        spread(lower, b, lowerFixed[2 * b]!, lowerFixed[2 * b + 1]!)
      }
    }
    for (let l = 0; l < loads.count; l++) {
      const i = placeOfLoad[l]!
      if (i < 0) continue
      loadTerms(loads, l, voltage[2 * i]!, voltage[2 * i + 1]!, share, terms)
      residual[2 * i] = residual[2 * i]! + terms[0]!
      residual[2 * i + 1] = residual[2 * i + 1]! + terms[1]!
      if (!derive) continue
      for (let part = 0; part < 4; part++) diagonal[4 * i + part] = diagonal[4 * i + part]! + terms[2 + part]!
    }
    let size = 0
    for (let k = 0; k < n; k++) {
      const own = Math.abs(fixed[2 * k]! + shunt[2 * k]!) + Math.abs(fixed[2 * k + 1]! + shunt[2 * k + 1]!)
      const here = (Math.abs(residual[2 * k]!) + Math.abs(residual[2 * k + 1]!)) / (own * nominal[k]!)
      if (!(here <= size)) size = here
    }
    return size
  }

  /** residual of row i += y·V_j */
  function addProduct(i: number, yRe: number, yIm: number, j: number): void {
    const vRe = voltage[2 * j]!
    const vIm = voltage[2 * j + 1]!
    residual[2 * i] = residual[2 * i]! + yRe * vRe - yIm * vIm
    residual[2 * i + 1] = residual[2 * i + 1]! + yRe * vIm + yIm * vRe
  }

  /** step ← −J⁻¹·residual, by block elimination in place. */
  function solveStep(): boolean {
    for (let i = 0; i < 2 * n; i++) step[i] = -residual[i]!
    let target = 0
    for (let k = 0; k < n; k++) {
      const d = 4 * k
      const determinant = diagonal[d]! * diagonal[d + 3]! - diagonal[d + 1]! * diagonal[d + 2]!
      const size =
        Math.abs(diagonal[d]!) + Math.abs(diagonal[d + 1]!) + Math.abs(diagonal[d + 2]!) + Math.abs(diagonal[d + 3]!)
      if (!(Math.abs(determinant) > 1e-24 * size * size)) return false
      // the inverse stands in the place of the block from here on
      const a = diagonal[d + 3]! / determinant
      const b = -diagonal[d + 1]! / determinant
      const c = -diagonal[d + 2]! / determinant
      const e = diagonal[d]! / determinant
      diagonal[d] = a
      diagonal[d + 1] = b
      diagonal[d + 2] = c
      diagonal[d + 3] = e
      const [from, to] = [first[k]!, first[k + 1]!]
      for (let p = from; p < to; p++) {
        const at = 4 * p
        // the factor L = lower·D⁻¹ of the row below
        const f0 = lower[at]! * a + lower[at + 1]! * c
        const f1 = lower[at]! * b + lower[at + 1]! * e
        const f2 = lower[at + 2]! * a + lower[at + 3]! * c
        const f3 = lower[at + 2]! * b + lower[at + 3]! * e
        const i = 2 * column[p]!
        step[i] = step[i]! - f0 * step[2 * k]! - f1 * step[2 * k + 1]!
        step[i + 1] = step[i + 1]! - f2 * step[2 * k]! - f3 * step[2 * k + 1]!
        for (let q = from; q < to; q++) {
          const u = 4 * q
          const where = targets[target++]!
          const place = 4 * (where >> 2)
          const into = (where & 3) === 0 ? diagonal : (where & 3) === 1 ? upper : lower
          into[place] = into[place]! - f0 * upper[u]! - f1 * upper[u + 2]!
          into[place + 1] = into[place + 1]! - f0 * upper[u + 1]! - f1 * upper[u + 3]!
          into[place + 2] = into[place + 2]! - f2 * upper[u]! - f3 * upper[u + 2]!
          into[place + 3] = into[place + 3]! - f2 * upper[u + 1]! - f3 * upper[u + 3]!
        }
      }
    }
    for (let k = n - 1; k >= 0; k--) {
      let x = step[2 * k]!
      let y = step[2 * k + 1]!
      for (let p = first[k]!; p < first[k + 1]!; p++) {
        const j = 2 * column[p]!
        x -= upper[4 * p]! * step[j]! + upper[4 * p + 1]! * step[j + 1]!
        y -= upper[4 * p + 2]! * step[j]! + upper[4 * p + 3]! * step[j + 1]!
      }
      step[2 * k] = diagonal[4 * k]! * x + diagonal[4 * k + 1]! * y
      step[2 * k + 1] = diagonal[4 * k + 2]! * x + diagonal[4 * k + 3]! * y
    }
    return true
  }

  const search = createVoltageSearch(
    {
      voltage,
      nominal,
      step,
      placeOfLoad,
      balance,
      addAdmittance(i, re, im) {
        residual[2 * i] = residual[2 * i]! + re * voltage[2 * i]! - im * voltage[2 * i + 1]!
        residual[2 * i + 1] = residual[2 * i + 1]! + re * voltage[2 * i + 1]! + im * voltage[2 * i]!
        diagonal[4 * i] = diagonal[4 * i]! + re
        diagonal[4 * i + 1] = diagonal[4 * i + 1]! - im
        diagonal[4 * i + 2] = diagonal[4 * i + 2]! + im
        diagonal[4 * i + 3] = diagonal[4 * i + 3]! + re
      },
      solve: solveStep,
    },
    loads,
    counters,
  )

  const solver: NetworkSolver = {
    driven: drivenVoltage,
    shunt,
    injection,
    voltage,
    counters,
    get weakest() {
      return search.weakest
    },
    resume() {
      warm = true
    },
    solve() {
      counters.solutions++
      warm = search.find(warm) && Number.isFinite(voltage[0] ?? 0)
      return warm
    },
    mismatch() {
      balance(1, false)
      let worst = 0
      let largest = 0
      for (let k = 0; k < n; k++) {
        worst = Math.max(worst, Math.abs(residual[2 * k]!), Math.abs(residual[2 * k + 1]!))
        const own = Math.hypot(fixed[2 * k]! + shunt[2 * k]!, fixed[2 * k + 1]! + shunt[2 * k + 1]!)
        largest = Math.max(largest, own * Math.hypot(voltage[2 * k]!, voltage[2 * k + 1]!))
      }
      return largest > 0 ? worst / largest : 0
    },
    recover(into) {
      for (let node = 0; 2 * node < into.length; node++) {
        const at = 2 * rowOf[node]!
        into[2 * node] = at < 0 ? drivenVoltage[0]! : voltage[at]!
        into[2 * node + 1] = at < 0 ? drivenVoltage[1]! : voltage[at + 1]!
      }
    },
  }
  return { rowOf, solver }
}

/** A complex number as the real 2 × 2 block by which it multiplies. */
function spread(blocks: Float64Array, at: number, re: number, im: number): void {
  blocks[4 * at] = re
  blocks[4 * at + 1] = -im
  blocks[4 * at + 2] = im
  blocks[4 * at + 3] = re
}

/** Where the blocks above the diagonal stand, row after row, and where each product of the elimination goes. */
interface BlockPattern {
  /** First block of each row; one more at the end. */
  first: Int32Array
  /** Column of each block. */
  column: Int32Array
  /** For each pair of blocks of a row, in the order of the elimination: 4·place + kind, 0 diagonal, 1 above, 2 below. */
  targets: Int32Array
}

function blockPattern(joined: readonly Int32Array[], rowOf: Int32Array): BlockPattern {
  const rows = joined.map((nodes) =>
    Array.from(nodes, (node) => rowOf[node]!)
      .filter((row) => row >= 0)
      .sort((a, b) => a - b),
  )
  const first = new Int32Array(rows.length + 1)
  rows.forEach((row, k) => {
    first[k + 1] = first[k]! + row.length
  })
  const column = Int32Array.from(rows.flat())
  const placeOf = rows.map((row, k) => new Map(row.map((j, p) => [j, first[k]! + p])))
  const targets: number[] = []
  for (const row of rows)
    for (const i of row)
      for (const j of row) {
        if (i === j) targets.push(4 * i)
        else if (j > i) targets.push(4 * placeOf[i]!.get(j)! + 1)
        else targets.push(4 * placeOf[j]!.get(i)! + 2)
      }
  return { first, column, targets: Int32Array.from(targets) }
}
