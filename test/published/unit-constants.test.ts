import { describe, expect, test } from 'vitest'
import { parseQuantity } from '@/lib/quantity/parse-quantity'
import type { QuantityName } from '@/lib/quantity/quantity-name'
import { within } from './support/within'

const read = (text: string, quantity: QuantityName): number => {
  const outcome = parseQuantity(text, quantity)
  if (!outcome.ok) throw new Error(outcome.message)
  return outcome.si
}

describe('engineeringtoolbox.com, electrical motors d_651: torque from power and speed', () => {
  test('lb·ft = 5252·hp/(r/min)', () => {
    const torque = read('1 hp', 'active-power') / read('1 r/min', 'speed') / read('1 lb·ft', 'torque')
    within(torque, 5252, 1e-4)
  })

  test('N·m = 9550·kW/(r/min), exactly 9549.3', () => {
    const torque = read('1 kW', 'active-power') / read('1 r/min', 'speed')
    within(torque, 9550, 1e-4)
    expect(torque).toBeCloseTo(9549.3, 1)
  })
})

describe('conversion constants (common practice, no source)', () => {
  test('1 hp = 745.7 W, 1 lb·ft = 1.35582 N·m, 1 lb·ft² = 0.0421401 kg·m², GD² = 4 J', () => {
    expect(read('1 hp', 'active-power')).toBeCloseTo(745.7, 2)
    expect(read('1 lb·ft', 'torque')).toBeCloseTo(1.35582, 5)
    expect(read('1 lb·ft²', 'inertia')).toBeCloseTo(0.0421401, 7)
    expect(read('GD² 4 kgf·m²', 'inertia')).toBeCloseTo(1, 12)
  })
})
