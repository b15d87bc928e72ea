import { solveComplex } from '../numeric/complex-lu'
import type { AdmittanceMatrix } from './admittance'

/**
 * A network reduced to the nodes that matter, driven by the known voltage of one node.
 *
 * Kept node voltages V obey A·V = s·V_driven − I, with I the currents drawn at the kept nodes.
 */
export interface ReducedNetwork {
  /** Number of kept nodes. */
  order: number
  /** A, in the layout of numeric/complex-lu. */
  admittance: Float64Array
  /** s: re, im of each kept node. */
  source: Float64Array
  /** Every node's voltage from the kept ones and, last in each row, the driven one: (order + 1) complex numbers a node. */
  recovery: Float64Array
  /** Place of each node among the kept ones, −1 for the others. */
  rowOf: Int32Array
}

/**
 * Eliminates every node that is neither kept nor driven and draws no current of its own (Kron's reduction).
 *
 * @param driven node of known voltage; null leaves a network without source (its driving-point admittances)
 * @returns null where the eliminated part is singular (an exact resonance or a floating node)
 */
export function reduceNetwork(
  matrix: AdmittanceMatrix,
  keep: readonly number[],
  driven: number | null,
): ReducedNetwork | null {
  const n = matrix.order
  const rowOf = new Int32Array(n).fill(-1)
  keep.forEach((node, row) => {
    rowOf[node] = row
  })
  const gone: number[] = []
  for (let node = 0; node < n; node++) if (rowOf[node] === -1 && node !== driven) gone.push(node)
  const ends = driven === null ? [...keep] : [...keep, driven]
  const columns = ends.length

  const inner = block(matrix, gone, gone)
  const shares = block(matrix, gone, ends)
  for (let i = 0; i < shares.length; i++) shares[i] = -shares[i]!
  if (!solveComplex(inner, shares, gone.length, columns)) return null

  const order = keep.length
  const admittance = new Float64Array(2 * order * order)
  const source = new Float64Array(2 * order)
  for (let i = 0; i < order; i++) {
    for (let j = 0; j < columns; j++) {
      const direct = 2 * (keep[i]! * n + ends[j]!)
      let [re, im] = [matrix.data[direct]!, matrix.data[direct + 1]!]
      for (let g = 0; g < gone.length; g++) {
        const there = 2 * (keep[i]! * n + gone[g]!)
        const share = 2 * (g * columns + j)
        re += matrix.data[there]! * shares[share]! - matrix.data[there + 1]! * shares[share + 1]!
        im += matrix.data[there]! * shares[share + 1]! + matrix.data[there + 1]! * shares[share]!
      }
      if (j < order) {
        admittance[2 * (i * order + j)] = re
        admittance[2 * (i * order + j) + 1] = im
      } else {
        source[2 * i] = -re
        source[2 * i + 1] = -im
      }
    }
  }

  const recovery = new Float64Array(2 * n * columns)
  ends.forEach((node, j) => {
    recovery[2 * (node * columns + j)] = 1
  })
  gone.forEach((node, g) => {
    recovery.set(shares.subarray(2 * g * columns, 2 * (g + 1) * columns), 2 * node * columns)
  })
  return { order, admittance, source, recovery, rowOf }
}

function block(matrix: AdmittanceMatrix, rows: readonly number[], columns: readonly number[]): Float64Array {
  const part = new Float64Array(2 * rows.length * columns.length)
  rows.forEach((row, i) => {
    columns.forEach((column, j) => {
      const from = 2 * (row * matrix.order + column)
      const to = 2 * (i * columns.length + j)
      part[to] = matrix.data[from]!
      part[to + 1] = matrix.data[from + 1]!
    })
  })
  return part
}
