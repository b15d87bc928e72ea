import { describe, expect, it } from 'vitest'
import type { InductionCircuit } from '@/lib/engine/case-input'
import { estimateCircuit } from '@/lib/engine/estimate/estimate-circuit'
import { inPerUnit, type Nameplate, plateBase } from '@/lib/engine/estimate/nameplate'
import { plateFigures, relativeMismatch, stated } from '@/lib/engine/estimate/plate-mismatch'
import { circuitsOnPlate } from '@/lib/engine/estimate/same-plate'
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

describe.each(Object.entries(plates))('circuits on the plate of %s', (_, plate) => {
  const base = plateBase(plate)
  const perUnit = inPerUnit(plate, base)
  const found = circuitsOnPlate(plate)

  it('are several, and each has every quantity of the plate to a ten-thousandth', () => {
    expect(found.length).toBeGreaterThanOrEqual(4)
    for (const circuit of found) {
      const { figures } = plateFigures(inUnits(circuit, base.impedance), perUnit.slip)
      for (const off of relativeMismatch(figures, stated(perUnit))) expect(Math.abs(off)).toBeLessThan(1e-4)
    }
  })

  it('differ in what the plate leaves open: copper against core losses by a factor, breakdown slip by a tenth', () => {
    const best = estimateCircuit(plate)
    if (best.kind !== 'estimated') throw new Error('refused')
    const stators = [best.circuit, ...found].map((circuit) => circuit.stator.re)
    expect(Math.max(...stators) / Math.min(...stators)).toBeGreaterThan(1.5)
    const inner = [best.circuit, ...found].map((circuit) => circuit.cages[1]!.resistance / circuit.cages[0]!.resistance)
    expect(Math.max(...inner) / Math.min(...inner)).toBeGreaterThan(1.02)
  })

  it('are the same ones each time', () => expect(circuitsOnPlate(plate)).toEqual(found))
})

it('a plate that no motor can have leaves none', () =>
  expect(
    circuitsOnPlate(dataSheet(250, 400, 50, 4, 1486, 0.995, 0.87, 6.8, { lockedRotor: 1.9, breakdown: 2.7 })),
  ).toEqual([]))
