import { expect, test } from 'vitest'
import { dampedLeastSquares } from '@/lib/engine/estimate/damped-least-squares'

const wide = (n: number) => ({ low: new Float64Array(n).fill(-1e3), high: new Float64Array(n).fill(1e3) })

test('a curved valley is followed to its bottom', () => {
  // Rosenbrock's function as a sum of squares; its least value 0 lies at (1, 1).
  const residuals = (x: Float64Array) => [10 * (x[1]! - x[0]! ** 2), 1 - x[0]!]
  const { x, cost } = dampedLeastSquares({ ...wide(2), residuals }, Float64Array.from([-1.2, 1]))
  expect(x[0]).toBeCloseTo(1, 6)
  expect(x[1]).toBeCloseTo(1, 6)
  expect(cost).toBeLessThan(1e-12)
})

test('a bound that keeps the best point out is touched, and the others settle for it', () => {
  const residuals = (x: Float64Array) => [x[0]! - 3, x[0]! + x[1]! - 4]
  const problem = { low: Float64Array.from([-5, -5]), high: Float64Array.from([2, 5]), residuals }
  const { x, cost } = dampedLeastSquares(problem, Float64Array.from([0, 0]))
  expect(x[0]).toBe(2)
  expect(x[1]).toBeCloseTo(2, 8)
  expect(cost).toBeCloseTo(1, 8)
})

test('more unknowns than residuals still end at a solution', () => {
  const residuals = (x: Float64Array) => [Math.exp(x[0]!) + Math.exp(x[1]!) + Math.exp(x[2]!) - 6]
  const { cost } = dampedLeastSquares({ ...wide(3), residuals }, new Float64Array(3))
  expect(cost).toBeLessThan(1e-16)
})

test('residuals that are not numbers leave the start as it was', () => {
  const start = Float64Array.from([1, 2])
  const { x } = dampedLeastSquares({ ...wide(2), residuals: () => [Number.NaN] }, start)
  expect([...x]).toEqual([1, 2])
})
