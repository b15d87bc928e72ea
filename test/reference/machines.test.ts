import { readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, it } from 'vitest'
import { atSlip, torqueAt } from '@/lib/engine/machines/at-slip'
import { breakdownSlip } from '@/lib/engine/machines/breakdown-slip'
import { hertz } from '@/lib/units/si'
import { synchronousSpeed } from '@/lib/units/speed'
import { type ReferenceCase, toMachine } from './to-case'

const read = (id: string): ReferenceCase =>
  JSON.parse(readFileSync(path.join(import.meta.dirname, 'cases', `${id}.json`), 'utf8'))

/** Terminal voltage of each case in parts of rated, as its note has it. */
const voltages = { R07: 1, R08: 0.85 }

describe.each(Object.entries(voltages))('the machine of %s by itself', (id, part) => {
  const { input, expected } = read(id)
  const [motor] = input.motors
  const synchronous = synchronousSpeed(hertz(input.frequency_hz), motor!.poles)
  const voltage = part * motor!.rated_kv * 1e3
  const model = toMachine(motor!, input.frequency_hz)

  it.each(expected)('has $quantity within its tolerance', ({ quantity, value, tol_rel, tol_abs }) => {
    const [name, at] = quantity.split('.slip_') as [string, string | undefined]
    const breakdown = breakdownSlip(model, synchronous)
    const state = atSlip(model, at === undefined ? breakdown : Number(at), synchronous)
    const { re, im } = state.admittance
    const size = Math.hypot(re, im)
    const figures: Record<string, number> = {
      torque_nm: torqueAt(state, voltage, synchronous),
      current_a: (size * voltage) / Math.sqrt(3),
      power_factor: re / size,
      kva: (size * voltage ** 2) / 1e3,
      breakdown_slip: breakdown,
      breakdown_torque_nm: torqueAt(state, voltage, synchronous),
    }
    expect(Math.abs(figures[name]! - Number(value))).toBeLessThanOrEqual(
      Math.max(tol_abs, tol_rel * Math.abs(Number(value))),
    )
  })
})
