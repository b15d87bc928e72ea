import { describe, expect, it } from 'vitest'
import {
  addBranch,
  addElement,
  addShunts,
  branchMatrix,
  emptyMatrix,
  withSourceNode,
} from '@/lib/engine/network/admittance'
import { findTopology } from '@/lib/engine/network/topology'
import { ohm, siemens, volt } from '@/lib/units/si'

const buses = ['A', 'B'].map((id) => ({ id, nominal: volt(6600) }))
const transformer = { id: 'T', fromBusId: 'A', toBusId: 'B', ratio: 5, impedance: { re: ohm(0), im: ohm(2) } }
const line = {
  id: 'L',
  fromBusId: 'A',
  toBusId: 'B',
  impedance: { re: ohm(3), im: ohm(4) },
  susceptance: siemens(0.02),
}

function topologyOf(lines: readonly (typeof line)[], transformers: readonly (typeof transformer)[]) {
  const found = findTopology(buses, lines, transformers, 'A')
  if (!found.ok) throw new Error('no topology')
  return found.value
}

describe('the admittance matrix', () => {
  it('of a line has its admittance on the diagonal and its opposite beside', () => {
    const { data } = branchMatrix(topologyOf([line], []), [line], [])
    // 1/(3 + 4j) = 0.12 − 0.16j
    const expected = [0.12, -0.16, -0.12, 0.16, -0.12, 0.16, 0.12, -0.16]
    expected.forEach((value, index) => {
      expect(data[index]).toBeCloseTo(value, 12)
    })
  })

  it('of a transformer has y/a² on the from side, y on the to side and −y/a between', () => {
    const { data } = branchMatrix(topologyOf([], [transformer]), [], [transformer])
    const expected = [0, -0.5 / 25, 0, 0.5 / 5, 0, 0.5 / 5, 0, -0.5]
    expected.forEach((value, index) => {
      expect(data[index]).toBeCloseTo(value, 12)
    })
  })

  it('lets a transformer without load hold its turns ratio: 33 kV on the from side give 6.6 kV', () => {
    const { data } = branchMatrix(topologyOf([], [transformer]), [], [transformer])
    // Current into B for V_A = 33000, V_B = 6600: y·V_B − (y/a)·V_A.
    expect(data[4]! * 33000 + data[6]! * 6600).toBeCloseTo(0, 9)
    expect(data[5]! * 33000 + data[7]! * 6600).toBeCloseTo(0, 9)
  })

  it('has half of a line’s charging at either end and capacitors at their buses', () => {
    const topology = topologyOf([line], [])
    const matrix = emptyMatrix(2)
    addShunts(matrix, topology, [line], [{ id: 'K', busId: 'B', susceptance: siemens(0.3) }])
    expect([...matrix.data]).toEqual([0, 0.01, 0, 0, 0, 0, 0, 0.01 + 0.3])
  })

  it('puts the EMF behind the source impedance as one more node', () => {
    const matrix = emptyMatrix(1)
    addElement(matrix, 0, 0, { re: 7, im: -1 })
    const larger = withSourceNode(matrix, 0, { re: 0, im: 0.5 })
    expect(larger.order).toBe(2)
    const expected = [7, -3, 0, 2, 0, 2, 0, -2]
    expected.forEach((value, index) => {
      expect(larger.data[index]).toBeCloseTo(value, 12)
    })
  })

  it('adds up parallel branches', () => {
    const matrix = emptyMatrix(2)
    addBranch(matrix, 0, 1, { re: 1, im: 0 })
    addBranch(matrix, 0, 1, { re: 2, im: -1 })
    expect([...matrix.data]).toEqual([3, -1, -3, 1, -3, 1, 3, -1])
  })
})
