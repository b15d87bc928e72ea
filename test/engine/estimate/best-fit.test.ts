import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { bestFit } from '@/lib/engine/estimate/best-fit'
import {
  highest,
  lowest,
  plainGuess,
  toCircuit,
  unknownNames,
  writeCircuit,
} from '@/lib/engine/estimate/circuit-unknowns'
import { estimateCircuit } from '@/lib/engine/estimate/estimate-circuit'
import { fitFrom } from '@/lib/engine/estimate/fit-circuit'
import { inPerUnit, plateBase } from '@/lib/engine/estimate/nameplate'
import { plateFigures } from '@/lib/engine/estimate/plate-mismatch'
import { machineTable } from '@/lib/engine/machines/machine-table'
import { hertz, radianPerSecond, volt } from '@/lib/units/si'
import { dataSheet, doubleCage, fullLoadSlip, plateOf } from './circuit-plate'

/** Data sheets as catalogues give them; the figures are invented and of the usual size. */
const small = {
  'an 11 kW 4-pole motor': dataSheet(11, 400, 50, 4, 1460, 0.914, 0.84, 7.5, { lockedRotor: 2.4, breakdown: 3 }),
  'a 30 hp 4-pole motor': dataSheet(22.4, 460, 60, 4, 1770, 0.936, 0.84, 6.27, { lockedRotor: 1.5, breakdown: 2 }),
}

describe.each(Object.entries(small))('the plate of %s, which no constant circuit has', (_, sheet) => {
  const plate = inPerUnit(sheet, plateBase(sheet))
  const found = bestFit(plate)

  test('has no nearer circuit in the plausible box, looked for from 24 places spread over it', () => {
    const guess = plainGuess(plate)
    // The fraction parts of multiples of square roots cover the box evenly.
    const steps = [2, 3, 5, 7, 11, 13, 17, 19].map(Math.sqrt)
    for (let k = 1; k <= 24; k++) {
      const start = lowest.map((low, i) => low + (highest[i]! - low) * ((k * steps[i]!) % 1))
      expect(fitFrom(plate, start, [1e-3, 1e-5, 1e-7], guess).cost).toBeGreaterThan(found.cost * 0.995)
    }
  })

  test('asks for less leakage at standstill than at breakdown, as saturation gives it', () => {
    const { figures } = plateFigures(toCircuit(found.unknowns, 1), plate.slip)
    expect(figures['locked-rotor-current']).toBeLessThan(plate.lockedRotorCurrent)
    expect(figures['breakdown-torque']).toBeGreaterThan(plate.breakdownTorque!)
  })

  test('is met at once when the locked-rotor current is not asked for more than leakage allows', () => {
    const eased = { ...plate, lockedRotorCurrent: 0.8 * plate.lockedRotorCurrent }
    expect(bestFit(eased).largest).toBeLessThan(1e-4)
  })
})

test('the row written for the search is that of the circuit', () => {
  const unknowns = Float64Array.from(unknownNames, (_, i) => lowest[i]! + 0.3 * (highest[i]! - lowest[i]!))
  const { circuit } = machineTable([toCircuit(unknowns, 1)])
  const row = new Float64Array(circuit.length)
  writeCircuit(row, unknowns)
  row.forEach((value, i) => {
    expect(Math.abs(value / circuit[i]! - 1)).toBeLessThan(1e-14)
  })
})

const between = (low: number, high: number) =>
  fc.double({ min: Math.log(low), max: Math.log(high), noNaN: true }).map(Math.exp)

/** Circuits as they go with the size of a motor: a large one has less resistance; many poles magnetise with more current. */
const sized = fc
  .tuple(
    between(11e3, 15e6),
    fc.integer({ min: 1, max: 10 }),
    fc.constantFrom(50, 60),
    between(0.7, 1.4),
    between(0.7, 1.4),
  )
  .map(([power, pairs, frequency, a, b]) => {
    const size = (power / 1e6) ** -0.25
    const [rs, inner] = [0.01 * size * a, 0.01 * size * b]
    const magnetising = (3.6 * a) / pairs ** 0.35
    const values = [rs, 0.1 * b, magnetising, 45 / size, inner, 0.17 * a, 4.5 * inner, 0.09 * b]
    return { circuit: doubleCage(values), power, poles: 2 * pairs, frequency }
  })

test('plates of motors from 11 kW to 15 MW, 2 to 20 poles, 50 and 60 Hz are met to 1e-4 in every quantity', () => {
  let count = 0
  let milliseconds = 0
  fc.assert(
    fc.property(sized, fc.boolean(), ({ circuit, power, poles, frequency }, powerFactorKnown) => {
      const slip = fullLoadSlip(circuit)
      fc.pre(slip !== null)
      const made = plateOf(circuit, slip!, power, power > 5e5 ? 6600 : 400, poles)
      const plate = {
        ...made,
        ratedVoltage: volt(made.ratedVoltage),
        frequency: hertz(frequency),
        ratedSpeed: radianPerSecond(made.ratedSpeed * (frequency / 50)),
        lockedRotorTorque:
          made.lockedRotorTorque && (((made.lockedRotorTorque * 50) / frequency) as typeof made.lockedRotorTorque),
        breakdownTorque:
          made.breakdownTorque && (((made.breakdownTorque * 50) / frequency) as typeof made.breakdownTorque),
        lockedRotorPowerFactor: powerFactorKnown ? made.lockedRotorPowerFactor : null,
      }
      fc.pre(plate.breakdownTorque! > 1.3 * (plate.ratedPower / plate.ratedSpeed))
      const from = performance.now()
      const outcome = estimateCircuit(plate)
      milliseconds += performance.now() - from
      count++
      expect(outcome.kind === 'estimated' ? outcome.largestResidual : outcome.detail).toBeLessThan(1e-4)
    }),
    { numRuns: 200, seed: 20261201 },
  )
  // On a busy machine; alone it is a few milliseconds each.
  expect(milliseconds / count).toBeLessThan(50)
})
