import { readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, it } from 'vitest'
import { type BreakevenQuestion, breakevenLevel, levelForOneImpedance } from '@/lib/engine/explore/breakeven-level'
import { atSlip } from '@/lib/engine/machines/at-slip'
import { ohm, volt, voltAmpere } from '@/lib/units/si'
import { type ReferenceCase, toCase } from '../../reference/to-case'
import { constantLoad, simpleMotor, simplePlant, singleCage, started } from '../../support/simple-plant'

/** A plant of 400 V whose motor cannot turn, so that the whole run is its standstill. */
const held = simplePlant([simpleMotor('M', started({ kind: 'direct' }, constantLoad(50_000)))], 0.01)

const question = (change: number, changes: Partial<BreakevenQuestion> = {}): BreakevenQuestion => ({
  busId: 'B',
  change,
  statedAt: volt(400),
  least: voltAmpere(1e5),
  most: voltAmpere(1e9),
  ...changes,
})

describe('the level at which a limit just holds', () => {
  it('is that of the closed form for a motor held at standstill', () => {
    const { re, im } = atSlip(singleCage, 1).admittance
    const square = re * re + im * im
    const motor = { re: ohm(re / square), im: ohm(-im / square) }
    const { impedance } = held.supply
    for (const change of [0.03, 0.1, 0.25]) {
      const found = breakevenLevel(held, question(change))
      if (found.kind !== 'found') throw new Error(found.kind)
      const closed = levelForOneImpedance(motor, Math.atan2(impedance.im, impedance.re), change, volt(400))
      expect(found.level / closed).toBeCloseTo(1, 7)
      expect(found.runs).toBeLessThan(60)
    }
  })

  it('rises as the limit gets stricter', () => {
    const levels = [0.02, 0.05, 0.1, 0.2].map((change) => {
      const found = breakevenLevel(held, question(change))
      return found.kind === 'found' ? found.level : Number.NaN
    })
    expect(levels.toSorted((a, b) => b - a)).toEqual(levels)
  })

  it('is never reached where the limit is broken at the strongest, and always held where it holds at the weakest', () => {
    expect(breakevenLevel(held, question(0.0001, { most: voltAmpere(1e7) })).kind).toBe('never')
    expect(breakevenLevel(held, question(0.99, { least: voltAmpere(1e7) })).kind).toBe('always')
  })
})

describe('reference case R26', () => {
  const file = path.join(import.meta.dirname, '../../reference/cases/R26.json')
  const reference: ReferenceCase = JSON.parse(readFileSync(file, 'utf8'))
  const input = toCase(reference)
  const [motor] = input.motors
  // Its 10 % are those at standstill: a load that holds the rotor keeps it there.
  const standing = { ...input, motors: [{ ...motor!, duty: started({ kind: 'direct' }, constantLoad(1e6)) }] }
  const found = breakevenLevel(standing, {
    busId: 'PCC',
    change: 0.1,
    statedAt: volt(11e3),
    least: voltAmpere(20e6),
    most: voltAmpere(2e9),
  })

  it.each(reference.expected)('gives $quantity within its tolerance', ({ quantity, value, tol_rel }) => {
    if (found.kind !== 'found') throw new Error(found.kind)
    const figure = quantity === 'short_circuit_mva' ? found.level / 1e6 : found.emf / 1e3
    expect(Math.abs(figure / Number(value) - 1)).toBeLessThanOrEqual(tol_rel)
  })
})
