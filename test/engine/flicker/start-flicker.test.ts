import { describe, expect, it } from 'vitest'
import { startFlicker } from '@/lib/engine/flicker/start-flicker'

const course = (time: readonly number[], change: readonly number[]) => ({
  busId: 'PCC',
  nominal: 100,
  before: 100,
  deepest: 100 * (1 - Math.max(...change)),
  settled: 100 * (1 - change.at(-1)!),
  time,
  voltage: change.map((part) => 100 * (1 - part)),
})

// Values of an independent flickermeter for single changes (230 V, 50 Hz); no published source.
describe('flicker of one start in ten minutes', () => {
  const shapes: Record<string, { time: readonly number[]; change: readonly number[]; meter: number; shape: number }> = {
    'a step of 3 % that stays': { time: [0, 0, 10], change: [0, 0.03, 0.03], meter: 0.423, shape: 0.527 },
    'a dip of 3 % for 2 s': { time: [0, 0, 2, 2, 10], change: [0, 0.03, 0.03, 0, 0], meter: 0.659, shape: 0.527 },
    'a dip of 6 % for 5 s': { time: [0, 0, 5, 5, 10], change: [0, 0.06, 0.06, 0, 0], meter: 1.294, shape: 1.0544 },
    'a dip of 3 % that recovers evenly in 5 s': {
      time: [0, 0, 5, 10],
      change: [0, 0.03, 0, 0],
      meter: 0.402,
      shape: 0.527,
    },
  }
  it.each(Object.entries(shapes))('%s', (_, { time, change, meter, shape }) => {
    const { shortTerm, lamp, startsIn } = startFlicker(course(time, change), 1, 50)
    expect(lamp).toBe('230 V')
    expect(startsIn).toEqual({ tenMinutes: 1, twoHours: 2 })
    expect(Math.abs(shortTerm.meter / meter - 1)).toBeLessThan(0.01)
    expect(shortTerm.shapeFactor).toBeCloseTo(shape, 3)
  })

  it('is judged with the lamp of the system’s frequency', () => {
    const step = course([0, 0, 10], [0, 0.03, 0.03])
    const [slow, fast] = [startFlicker(step, 1, 50), startFlicker(step, 1, 60)]
    expect(fast.lamp).toBe('120 V')
    expect(fast.shortTerm.meter).toBeLessThan(slow.shortTerm.meter)
  })
})

describe('flicker of repeated starts', () => {
  const dip = course([0, 0, 2, 2, 10], [0, 0.03, 0.03, 0, 0])

  it('puts as many into the ten minutes as the hour asks for', () => {
    const [one, several] = [startFlicker(dip, 6, 50), startFlicker(dip, 24, 50)]
    expect(one.startsIn).toEqual({ tenMinutes: 1, twoHours: 12 })
    expect(several.startsIn).toEqual({ tenMinutes: 4, twoHours: 48 })
    expect(several.shortTerm.meter / one.shortTerm.meter).toBeGreaterThan(1.2)
    expect(several.shortTerm.shapeFactor / one.shortTerm.shapeFactor).toBeCloseTo(4 ** (1 / 3.2), 9)
  })

  it('counts periods without a start in the long term', () => {
    const { shortTerm, longTerm } = startFlicker(dip, 1, 50)
    expect(longTerm.meter / shortTerm.meter).toBeCloseTo((2 / 12) ** (1 / 3), 9)
  })
})

describe('rapid change', () => {
  it('is the largest and the settled change of nominal, and the time above 3.3 % of it', () => {
    const result = startFlicker(course([0, 0, 4, 10], [0, 0.066, 0, 0.01]), 1, 50)
    expect(result.largestChange).toBeCloseTo(0.066, 12)
    expect(result.settledChange).toBeCloseTo(0.01, 12)
    expect(result.timeAbove).toBeCloseTo(2, 9)
  })
})
