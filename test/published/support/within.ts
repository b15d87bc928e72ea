import { expect } from 'vitest'

/** Holds a figure against a published one within so many parts (0.001: a tenth of a percent). */
export const within = (value: number, published: number, part: number): void => {
  expect(value).toBeGreaterThanOrEqual(published - Math.abs(published) * part)
  expect(value).toBeLessThanOrEqual(published + Math.abs(published) * part)
}
