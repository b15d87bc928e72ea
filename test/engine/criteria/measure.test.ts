import { describe, expect, it } from 'vitest'
import type { MotorInput } from '@/lib/engine/case-input'
import { firstSwitching } from '@/lib/engine/criteria/measure'
import { perUnit, second } from '@/lib/units/si'
import { noLoad, simpleMotor, simplePlant, started } from '../../support/simple-plant'

describe('the first switching of a case', () => {
  const at = (instant: number): MotorInput['duty'] => started({ kind: 'direct' }, noLoad, instant)
  const waiting: MotorInput['duty'] = { ...at(0), after: { motorId: 'A', interval: second(5) } } as MotorInput['duty']

  it('is the earliest instant of a start that waits for none', () => {
    expect(firstSwitching(simplePlant([simpleMotor('A', at(3)), simpleMotor('B', at(2))]))).toBe(2)
    expect(firstSwitching(simplePlant([simpleMotor('A', at(3)), simpleMotor('B', waiting)]))).toBe(3)
  })

  it('is the beginning of a disturbance where that comes first, and zero where nothing happens', () => {
    const disturbance = { at: second(1), duration: second(0.2), remaining: perUnit(0.5) }
    expect(firstSwitching(simplePlant([simpleMotor('A', at(3))], 0.01, { disturbance }))).toBe(1)
    expect(firstSwitching(simplePlant([], 0.01, { disturbance }))).toBe(1)
    expect(firstSwitching(simplePlant([]))).toBe(0)
  })
})
