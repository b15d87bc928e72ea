import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { spreadLabels } from '@/lib/drawing/plot/spread-labels'

describe('labels at the ends of lines', () => {
  test('stand apart, inside the plot and in the order of their lines', () => {
    const heights = fc.array(fc.double({ min: -20, max: 80, noNaN: true }), { minLength: 1, maxLength: 15 })
    fc.assert(
      fc.property(heights, (wanted) => {
        const placed = spreadLabels(wanted, 3, 0, 60)
        const order = wanted.map((_, i) => i).sort((a, b) => wanted[a]! - wanted[b]! || a - b)
        for (const [k, index] of order.entries()) {
          expect(placed[index]!).toBeGreaterThanOrEqual(-1e-9)
          expect(placed[index]!).toBeLessThanOrEqual(60 + 1e-9)
          if (k > 0) expect(placed[index]! - placed[order[k - 1]!]!).toBeGreaterThanOrEqual(3 - 1e-9)
        }
      }),
    )
  })

  test('stay where they want to be while there is room', () => {
    expect(spreadLabels([30, 10, 20], 3, 0, 60)).toEqual([30, 10, 20])
  })

  test('share the way when two want the same place', () => {
    expect(spreadLabels([20, 20], 4, 0, 60)).toEqual([18, 22])
  })

  test('are refused when they cannot fit', () => {
    expect(() => spreadLabels([1, 2, 3], 10, 0, 15)).toThrow(RangeError)
  })
})
