import { describe, expect, it } from 'vitest'
import { flickermeter, longTermSeverity, shortTermSeverity } from '@/lib/engine/flicker/flickermeter'
import type { Lamp } from '@/lib/engine/flicker/lamps'
import { severityOfChanges, spoiledTime } from '@/lib/engine/flicker/shape-factor'

const carrierOf: Record<Lamp, number> = { '230 V': 50, '120 V': 60 }

/** Largest sensation of a modulated voltage after the filters have settled; d is peak to peak. */
function largestSensation(lamp: Lamp, modulation: (t: number) => number, d: number, rate = 2400): number {
  const meter = flickermeter(lamp, rate)
  let largest = 0
  // Over whole periods the square of the envelope has a mean of nearly 1; what is left dies in the high-pass.
  for (let i = 0; i < 60 * rate; i++) {
    const t = i / rate
    const u = Math.SQRT2 * Math.sin(2 * Math.PI * carrierOf[lamp] * t) * (1 + (d / 2) * modulation(t))
    const sensation = meter(u * u - 1)
    if (t > 40 && sensation > largest) largest = sensation
  }
  return largest
}

const sine = (frequency: number) => (t: number) => Math.sin(2 * Math.PI * frequency * t)
const square = (frequency: number) => (t: number) => (Math.floor(2 * frequency * t) % 2 === 0 ? 1 : -1)

function severity(lamp: Lamp, changesPerMinute: number, d: number, rate = 2400): number {
  const meter = flickermeter(lamp, rate)
  const modulation = square(changesPerMinute / 120)
  const step = rate / 200
  const sensations = new Float64Array(200 * 600)
  const lead = 60 * rate
  for (let i = 0; i < lead + 600 * rate; i++) {
    const t = i / rate
    const u = Math.SQRT2 * Math.sin(2 * Math.PI * carrierOf[lamp] * t) * (1 + (d / 2) * modulation(t))
    const sensation = meter(u * u - 1)
    if (i >= lead && (i - lead) % step === step - 1) sensations[(i - lead + 1) / step - 1] = sensation
  }
  return shortTermSeverity(sensations)
}

// Source: IEC 61000-4-15, tables of sinusoidal and rectangular changes; values from memory of the standard, recomputed
// with an independent meter. Tolerance of the standard: 8 % of P_inst, 5 % of Pst.
describe('a flickermeter of IEC 61000-4-15', () => {
  const sines: Record<Lamp, readonly (readonly [number, number])[]> = {
    '230 V': [
      [0.5, 2.325],
      [1.5, 1.067],
      [3, 0.645],
      [5, 0.396],
      [8.8, 0.25],
      [13, 0.351],
      [20, 0.704],
      [25, 1.037],
    ],
    '120 V': [
      [0.5, 2.454],
      [1.5, 1.126],
      [3, 0.717],
      [5, 0.466],
      [8.8, 0.321],
      [13, 0.469],
      [20, 0.977],
      [25, 1.464],
    ],
  }
  for (const [lamp, rows] of Object.entries(sines) as [Lamp, readonly (readonly [number, number])[]][])
    it.each(rows)(`${lamp} lamp: a sine of %d Hz and %d per cent peak to peak is just seen`, (frequency, percent) => {
      expect(Math.abs(largestSensation(lamp, sine(frequency), percent / 100) - 1)).toBeLessThan(0.03)
    })

  const steps: Record<Lamp, readonly (readonly [number, number])[]> = {
    '230 V': [
      [1, 2.715],
      [7, 1.45],
      [39, 0.894],
      [110, 0.722],
      [1620, 0.407],
    ],
    '120 V': [
      [1, 3.181],
      [7, 1.694],
      [39, 1.045],
      [110, 0.844],
      [1620, 0.547],
    ],
  }
  for (const [lamp, rows] of Object.entries(steps) as [Lamp, readonly (readonly [number, number])[]][])
    it.each(rows)(`${lamp} lamp: %d steps a minute of %d per cent give a severity of 1`, (changes, percent) => {
      expect(Math.abs(severity(lamp, changes, percent / 100) - 1)).toBeLessThan(0.01)
    })

  it('doubles the severity when the changes double', () => {
    expect(severity('230 V', 7, 0.029) / severity('230 V', 7, 0.0145)).toBeCloseTo(2, 1)
  })

  it('takes the cube mean of twelve periods for the long term', () => {
    expect(longTermSeverity(Array.from({ length: 12 }, () => 0.7))).toBeCloseTo(0.7, 12)
    expect(longTermSeverity([1, ...Array.from({ length: 11 }, () => 0)])).toBeCloseTo(12 ** (-1 / 3), 12)
  })
})

describe('the shape-factor method of IEC 61000-3-3', () => {
  it('spoils 2.3 s with a step of one per cent, and 2.3·3^3.2 with one of three', () => {
    expect(spoiledTime(0.01)).toBeCloseTo(2.3, 12)
    expect(spoiledTime(0.03)).toBeCloseTo(77.35, 1)
  })

  it('gives the severities of one to ten steps in ten minutes', () => {
    expect(severityOfChanges(0.03, 1)).toBeCloseTo((77.35 / 600) ** (1 / 3.2), 3)
    expect(severityOfChanges(0.03, 10) / severityOfChanges(0.03, 1)).toBeCloseTo(10 ** (1 / 3.2), 12)
  })
})
