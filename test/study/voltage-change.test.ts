import { expect, test } from 'vitest'
import type { PlaceResult } from '@/lib/engine/case-result'
import { voltageChange } from '@/lib/study/voltage-change'
import { second, volt } from '@/lib/units/si'

const place: PlaceResult = {
  busId: 'pcc',
  nominal: volt(33_000),
  before: volt(32_400),
  first: volt(31_408),
  deepest: { voltage: volt(31_273), at: second(0.3) },
  highest: { voltage: volt(32_400), at: second(0) },
  settledAfterStart: volt(32_126),
  settledAfterProcess: null,
}

test('one start reads as three figures, each with its own reference', () => {
  expect(voltageChange(place, 'deepest', 'change-of-before')).toBeCloseTo(0.03478, 5)
  expect(voltageChange(place, 'deepest', 'change-of-nominal')).toBeCloseTo(0.03415, 5)
  expect(voltageChange(place, 'deepest', 'remaining-of-nominal')).toBeCloseTo(0.94767, 5)
})

test('each instant has its own voltage', () => {
  expect(voltageChange(place, 'first', 'change-of-before')).toBeCloseTo(992 / 32_400, 12)
  expect(voltageChange(place, 'settled-after-start', 'change-of-before')).toBeCloseTo(274 / 32_400, 12)
})

test('a state that was not reached has no change, rather than none', () => {
  expect(voltageChange(place, 'settled-after-process', 'change-of-before')).toBeNull()
})
