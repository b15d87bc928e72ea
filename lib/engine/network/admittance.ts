import type { Complex } from '../../units/si'
import type { CapacitorInput, LineInput, ThreeWindingInput, TransformerInput } from '../case-input'
import { multiply, reciprocal, scale } from '../numeric/complex'
import { couplings } from './three-winding'
import { isJoint, type Topology } from './topology'

/**
 * Nodal admittance matrix in siemens per phase (star), line-to-line voltages on line-to-line current √3·I.
 * Order = number of nodes; layout as in numeric/complex-lu.
 */
export interface AdmittanceMatrix {
  order: number
  data: Float64Array
}

export const emptyMatrix = (order: number): AdmittanceMatrix => ({ order, data: new Float64Array(2 * order * order) })

/** Adds to element (i, j). */
export function addElement(matrix: AdmittanceMatrix, i: number, j: number, value: Complex): void {
  const at = 2 * (i * matrix.order + j)
  matrix.data[at] = matrix.data[at]! + value.re
  matrix.data[at + 1] = matrix.data[at + 1]! + value.im
}

/** A series admittance between two nodes. */
export function addBranch(matrix: AdmittanceMatrix, i: number, j: number, y: Complex): void {
  addElement(matrix, i, i, y)
  addElement(matrix, j, j, y)
  addElement(matrix, i, j, scale(y, -1))
  addElement(matrix, j, i, scale(y, -1))
}

/** An ideal ratio at one end of a coupling: the end's voltage over the common one, and the angle it leads that by, rad. */
interface End {
  node: number
  ratio: number
  lead: number
}

/** An admittance between ideal complex ratios a: Y_ii += y/|a_i|², Y_jj += y/|a_j|², Y_ij −= y/(a_i*·a_j). */
function addCoupling(matrix: AdmittanceMatrix, from: End, to: End, y: Complex): void {
  addElement(matrix, from.node, from.node, scale(y, 1 / from.ratio ** 2))
  addElement(matrix, to.node, to.node, scale(y, 1 / to.ratio ** 2))
  const angle = from.lead - to.lead
  const between = scale(y, -1 / (from.ratio * to.ratio))
  addElement(matrix, from.node, to.node, multiply(between, { re: Math.cos(angle), im: Math.sin(angle) }))
  addElement(matrix, to.node, from.node, multiply(between, { re: Math.cos(angle), im: -Math.sin(angle) }))
}

/** Lines and transformers alone: what short-circuit current flows through. */
export function branchMatrix(
  topology: Topology,
  lines: readonly LineInput[],
  transformers: readonly TransformerInput[],
  threeWindings: readonly ThreeWindingInput[] = [],
): AdmittanceMatrix {
  const matrix = emptyMatrix(topology.count)
  for (const line of lines) {
    const from = topology.nodeOf.get(line.fromBusId)!
    const to = topology.nodeOf.get(line.toBusId)!
    if (from === to && isJoint(line, topology.busOfNode[from]!.nominal)) continue
    addBranch(matrix, from, to, reciprocal(line.impedance))
  }
  for (const transformer of transformers) {
    // Impedance on the to side behind an ideal ratio a on the from side: Y_ff = y/|a|², Y_tt = y, Y_ft = −y/a*, Y_tf = −y/a.
    const { fromBusId, toBusId, ratio, lag } = transformer
    const from = { node: topology.nodeOf.get(fromBusId)!, ratio, lead: lag ?? 0 }
    const to = { node: topology.nodeOf.get(toBusId)!, ratio: 1, lead: 0 }
    addCoupling(matrix, from, to, reciprocal(transformer.impedance))
  }
  for (const transformer of threeWindings) {
    const ends = transformer.windings.map(({ busId, ratio, lag }): End => {
      return { node: topology.nodeOf.get(busId)!, ratio, lead: -(lag ?? 0) }
    })
    for (const { from, to, admittance } of couplings(transformer) ?? []) {
      addCoupling(matrix, ends[from]!, ends[to]!, admittance)
    }
  }
  return matrix
}

/** Adds charging of lines and capacitors, which carry no short-circuit current. */
export function addShunts(
  matrix: AdmittanceMatrix,
  topology: Topology,
  lines: readonly LineInput[],
  capacitors: readonly CapacitorInput[],
): void {
  for (const line of lines) {
    const half = { re: 0, im: line.susceptance / 2 }
    for (const busId of [line.fromBusId, line.toBusId]) {
      const node = topology.nodeOf.get(busId)!
      addElement(matrix, node, node, half)
    }
  }
  for (const capacitor of capacitors) {
    const node = topology.nodeOf.get(capacitor.busId)!
    addElement(matrix, node, node, { re: 0, im: capacitor.susceptance })
  }
}

/** The same network with one more node behind a series impedance: the EMF behind the source. */
export function withSourceNode(matrix: AdmittanceMatrix, node: number, impedance: Complex): AdmittanceMatrix {
  const n = matrix.order
  const larger = emptyMatrix(n + 1)
  for (let i = 0; i < n; i++) {
    larger.data.set(matrix.data.subarray(2 * i * n, 2 * (i + 1) * n), 2 * i * (n + 1))
  }
  addBranch(larger, node, n, reciprocal(impedance))
  return larger
}
