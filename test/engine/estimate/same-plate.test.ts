import { describe, expect, it } from 'vitest'
import type { InductionCircuit } from '@/lib/engine/case-input'
import { estimateCircuit } from '@/lib/engine/estimate/estimate-circuit'
import { inPerUnit, type Nameplate, plateBase } from '@/lib/engine/estimate/nameplate'
import { plateFigures, relativeMismatch, stated } from '@/lib/engine/estimate/plate-mismatch'
import { runUpFigures } from '@/lib/engine/estimate/run-up-figures'
import { circuitsOnPlate } from '@/lib/engine/estimate/same-plate'
import { machineTable } from '@/lib/engine/machines/machine-table'
import { ohm } from '@/lib/units/si'
import { dataSheet } from './circuit-plate'

const plates: Record<string, Nameplate> = {
  'a 250 kW motor': dataSheet(250, 400, 50, 4, 1486, 0.955, 0.87, 6.8, { lockedRotor: 1.9, breakdown: 2.7 }),
  'an 1100 kW motor': dataSheet(1100, 6600, 50, 6, 992, 0.957, 0.85, 5.5, { lockedRotor: 0.855, breakdown: 2.2 }),
  'a 5 MW motor': dataSheet(5000, 11_000, 50, 4, 1490, 0.97, 0.89, 5.0, { lockedRotor: 0.7, breakdown: 2.1 }),
}

const inUnits = (circuit: InductionCircuit, base: number): InductionCircuit => ({
  stator: { re: ohm(circuit.stator.re / base), im: ohm(circuit.stator.im / base) },
  magnetising: ohm(circuit.magnetising / base),
  core: circuit.core === null ? null : ohm(circuit.core / base),
  cages: circuit.cages.map(({ resistance, reactance }) => ({
    resistance: ohm(resistance / base),
    reactance: ohm(reactance / base),
  })),
})

const bestOf = (plate: Nameplate) => {
  const best = estimateCircuit(plate)
  if (best.kind !== 'estimated') throw new Error('refused')
  return best
}

/** Time without load of the slowest circuit over that of the fastest, the best one among them. */
const spreadOf = (plate: Nameplate): number => {
  const all = [bestOf(plate).circuit, ...circuitsOnPlate(plate)]
  const times = all.map((circuit) => runUpFigures(machineTable([circuit]))[0])
  return Math.exp(Math.max(...times) - Math.min(...times))
}

const mismatches = (circuit: InductionCircuit, plate: Nameplate): readonly number[] => {
  const base = plateBase(plate)
  const perUnit = inPerUnit(plate, base)
  const { figures } = plateFigures(inUnits(circuit, base.impedance), perUnit.slip)
  return relativeMismatch(figures, stated(perUnit)).map(Math.abs)
}

describe.each(Object.entries(plates))('circuits on the plate of %s', (_, plate) => {
  const found = circuitsOnPlate(plate)

  it('are a handful, and each has every quantity of the plate to a ten-thousandth', () => {
    expect(found.length).toBeGreaterThanOrEqual(2)
    expect(found.length).toBeLessThanOrEqual(6)
    for (const circuit of found) expect(Math.max(...mismatches(circuit, plate))).toBeLessThan(1e-4)
  })

  it('lie several percent to a third apart in the time that an inertia takes', () => {
    expect(spreadOf(plate)).toBeGreaterThan(1.06)
    expect(spreadOf(plate)).toBeLessThan(1.35)
  })

  it('lie closer together once the locked-rotor power factor is known', () => {
    const locked = plateFigures(bestOf(plate).circuit, inPerUnit(plate, plateBase(plate)).slip).figures
    const known = { ...plate, lockedRotorPowerFactor: locked['locked-rotor-power-factor'] }
    expect(spreadOf(known)).toBeLessThan(spreadOf(plate))
  })

  it('are the same ones each time', () => expect(circuitsOnPlate(plate)).toEqual(found))
})

it('a plate without torques leaves far more open than one with them', () => {
  const plate = plates['an 1100 kW motor']!
  expect(spreadOf({ ...plate, lockedRotorTorque: null, breakdownTorque: null })).toBeGreaterThan(2)
})

it('a plate that no constant circuit meets has circuits as near as the best one', () => {
  const plate = dataSheet(11, 400, 50, 4, 1460, 0.914, 0.84, 7.5, { lockedRotor: 2.4, breakdown: 3 })
  const { largestResidual } = bestOf(plate)
  expect(largestResidual).toBeGreaterThan(1e-3)
  const found = circuitsOnPlate(plate)
  expect(found.length).toBeGreaterThanOrEqual(1)
  for (const circuit of found)
    expect(Math.max(...mismatches(circuit, plate))).toBeLessThanOrEqual(1.05 * largestResidual * (1 + 1e-9))
})

it('a plate that no motor can have leaves none', () =>
  expect(
    circuitsOnPlate(dataSheet(250, 400, 50, 4, 1486, 0.995, 0.87, 6.8, { lockedRotor: 1.9, breakdown: 2.7 })),
  ).toEqual([]))
