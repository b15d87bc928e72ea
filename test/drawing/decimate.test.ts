import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { decimate } from '@/lib/drawing/plot/decimate'

const curves = fc
  .array(
    fc.record({
      step: fc.double({ min: 0, max: 0.5, noNaN: true }),
      y: fc.double({ min: -100, max: 100, noNaN: true }),
    }),
    {
      minLength: 1,
      maxLength: 400,
    },
  )
  .map((samples) => {
    let at = 0
    const x = samples.map(({ step }) => (at += step))
    return { x, y: samples.map(({ y }) => y) }
  })

describe('decimation of a curve', () => {
  test('never loses the deepest nor the highest point', () => {
    fc.assert(
      fc.property(curves, fc.double({ min: 0.01, max: 5, noNaN: true }), (curve, width) => {
        const kept = decimate(curve, width)
        expect(Math.min(...kept.y)).toBe(Math.min(...curve.y))
        expect(Math.max(...kept.y)).toBe(Math.max(...curve.y))
      }),
    )
  })

  test('keeps the first and the last point and the order', () => {
    fc.assert(
      fc.property(curves, (curve) => {
        const kept = decimate(curve, 0.7)
        expect(kept.x[0]).toBe(curve.x[0])
        expect(kept.y[0]).toBe(curve.y[0])
        expect(kept.x.at(-1)).toBe(curve.x.at(-1))
        expect(kept.y.at(-1)).toBe(curve.y.at(-1))
        expect(kept.x.every((value, i) => i === 0 || value >= kept.x[i - 1]!)).toBe(true)
      }),
    )
  })

  test('leaves at most four points in a column', () => {
    const x = Array.from({ length: 10_000 }, (_, i) => i / 1000)
    const kept = decimate({ x, y: x.map((value) => Math.sin(40 * value)) }, 0.25)
    expect(kept.x.length).toBeLessThanOrEqual(4 * Math.ceil(10 / 0.25))
  })

  test('keeps a dip of a single sample', () => {
    const x = Array.from({ length: 5000 }, (_, i) => i)
    const y = x.map((value) => (value === 3217 ? 61.3 : 100))
    expect(decimate({ x, y }, 100).y).toContain(61.3)
  })
})
