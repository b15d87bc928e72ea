import { expect, test } from 'vitest'
import { engineSize } from '@/lib/start/testing/engine-size.mjs'

test('the whole engine goes to a browser in less than 60 kB, compressed as over HTTPS', async () => {
  const { bytes, brotli } = await engineSize()
  // less than this would mean that the calculation is not in it
  expect(bytes).toBeGreaterThan(60_000)
  expect(brotli).toBeLessThan(60_000)
})
