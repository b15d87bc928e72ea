import { describe, expect, it } from 'vitest'
import { inverseTime, operatesAt } from '@/lib/engine/protection/inverse-curve'
import { permissibleTimeAt } from '@/lib/engine/protection/permissible-time'
import { followHeat, heatAfter, restBefore, steadyHeat, thermalTime } from '@/lib/engine/protection/thermal-image'
import { second } from '@/lib/units/si'

const image = { heating: second(600), cooling: second(1800), lasting: 100 }
const veryInverse = (multiple: number) => inverseTime('very-inverse', multiple, 0.5)

describe('an inverse element', () => {
  it('does not operate at its setting or below', () => {
    expect(inverseTime('very-inverse', 1)).toBeNull()
    expect(inverseTime('very-inverse', 0.4)).toBeNull()
  })

  it('operates on a steady current at the time of its curve', () =>
    expect(operatesAt(veryInverse, [0, 1, 3, 20], [4, 4, 4, 4])).toBeCloseTo(2.25, 12))

  it('operates earlier when the current grows, and not at all when it falls below the setting in time', () => {
    expect(operatesAt(veryInverse, [0, 1, 1, 20], [4, 4, 8, 8])).toBeLessThan(2.25)
    expect(operatesAt(veryInverse, [0, 2, 2, 20], [4, 4, 0.9, 0.9])).toBeNull()
  })

  it('adds up what each part of the record brings', () => {
    // 1 s at 4 times brings 1/2.25, the rest comes at 8 times: t(8) = 0.5·13.5/7.
    const rest = (1 - 1 / 2.25) * (6.75 / 7)
    expect(operatesAt(veryInverse, [0, 1, 1, 20], [4, 4, 8, 8])).toBeCloseTo(1 + rest, 9)
  })
})

describe('a thermal image', () => {
  it('comes to the square of the current, and does not operate at what it may carry', () => {
    expect(heatAfter(image, 0, 90, 1e6)).toBeCloseTo(steadyHeat(image, 90), 12)
    expect(thermalTime(image, 100)).toBeNull()
    expect(thermalTime(image, 50, 1)).toBe(0)
  })

  it('reaches its limit at the time of its formula, however the record is cut', () => {
    const time = thermalTime(image, 600)!
    expect(heatAfter(image, 0, 600, time)).toBeCloseTo(1, 12)
    const times = Array.from({ length: 200 }, (_, i) => i * 0.3)
    expect(
      followHeat(
        image,
        0,
        times,
        times.map(() => 600),
      ).operatedAt,
    ).toBeCloseTo(time, 9)
  })

  it('cools at standstill with its own time constant', () =>
    expect(heatAfter(image, 0.8, 0, 1800)).toBeCloseTo(0.8 / Math.E, 12))

  it('asks for a rest until the next start fits, and says when none ever does', () => {
    const rest = restBefore(image, 0.9, 0.4)!
    expect(heatAfter(image, 0.9, 0, rest)).toBeCloseTo(0.6, 12)
    expect(restBefore(image, 0.5, 0.4)).toBe(0)
    expect(restBefore(image, 0.5, 1.1)).toBeNull()
  })
})

describe('a permissible locked-rotor time', () => {
  it('goes with the inverse square of the current, so of the voltage', () => {
    const declared = { current: 600, time: 12 }
    expect(permissibleTimeAt(600, declared)).toBe(12)
    expect(permissibleTimeAt(0.8 * 600, declared)).toBeCloseTo(12 / 0.64, 12)
  })
})
