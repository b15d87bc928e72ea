import { describe, expect, it } from 'vitest'
import { elementCourse } from '@/lib/engine/protection/element-course'
import { inverseTime } from '@/lib/engine/protection/inverse-curve'
import { limitPoints, permissibleTime, permissibleTimeAt } from '@/lib/engine/protection/permissible-time'
import { startsAllowed } from '@/lib/engine/protection/starts-allowed'
import { steadyTime } from '@/lib/engine/protection/steady-time'
import { heatAfter, restBefore, steadyHeat, thermalTime } from '@/lib/engine/protection/thermal-image'
import type { RelayElement, ThermalData } from '@/lib/engine/protection-input'
import { ampere, second } from '@/lib/units/si'

const image = { heating: second(600), cooling: second(1800), lasting: ampere(100) }
const inverse = (changes: Partial<Extract<RelayElement, { kind: 'inverse' }>> = {}): RelayElement => ({
  kind: 'inverse',
  curve: 'very-inverse',
  pickUp: ampere(100),
  multiplier: 0.5,
  reset: null,
  ...changes,
})
const definite = (delay: number): RelayElement => ({ kind: 'definite', pickUp: ampere(100), delay: second(delay) })

/** When an element operates on a record of currents, s. */
function operatesAt(element: RelayElement, times: readonly number[], currents: readonly number[]): number | null {
  const course = elementCourse(element, 'fast')
  for (let k = 0; k + 1 < times.length; k++) {
    const into = course.advance(times[k + 1]! - times[k]!, currents[k]!, currents[k + 1]!)
    if (into !== null) return times[k]! + into
  }
  return null
}

describe('an inverse element', () => {
  it('does not operate at its setting or below', () => {
    expect(inverseTime('very-inverse', 1)).toBeNull()
    expect(inverseTime('very-inverse', 0.4)).toBeNull()
  })

  it('operates on a steady current at the time of its curve', () =>
    expect(operatesAt(inverse(), [0, 1, 3, 20], [400, 400, 400, 400])).toBeCloseTo(2.25, 12))

  it('operates earlier when the current grows, and not at all when it falls below the setting in time', () => {
    expect(operatesAt(inverse(), [0, 1, 1, 20], [400, 400, 800, 800])).toBeLessThan(2.25)
    expect(operatesAt(inverse(), [0, 2, 2, 20], [400, 400, 90, 90])).toBeNull()
  })

  it('adds up what each part of the record brings', () => {
    // 1 s at 4 times brings 1/2.25, the rest comes at 8 times: t(8) = 0.5·13.5/7.
    const rest = (1 - 1 / 2.25) * (6.75 / 7)
    expect(operatesAt(inverse(), [0, 1, 1, 20], [400, 400, 800, 800])).toBeCloseTo(1 + rest, 9)
  })

  it('needs as much less as it has travelled', () => {
    const course = elementCourse(inverse(), 'fast')
    course.advance(1, 400, 400)
    expect(course.timeLeft(400)).toBeCloseTo(1.25, 12)
    expect(course.timeLeft(90)).toBeNull()
  })

  it('falls back at once below the setting, or over its reset time', () => {
    // Twice 2 s of the 2.25 s that it needs, with a second without current between them.
    const times = [0, 2, 2, 3, 3, 5]
    const currents = [400, 400, 0, 0, 400, 400]
    expect(operatesAt(inverse(), times, currents)).toBeNull()
    // After 10 s to fall back, a tenth is gone: 2/2.25 − 0.1 stay.
    expect(operatesAt(inverse({ reset: second(10) }), times, currents)).toBeCloseTo(3 + 2.25 * (1.1 - 2 / 2.25), 9)
  })

  it('of IEEE C37.112 falls back by the published constant times its dial', () => {
    // Very inverse, dial 0.5: 21.6·0.5 = 10.8 s without current; half of it leaves half a travel less.
    const element = inverse({ curve: 'very-inverse-us' })
    const course = elementCourse(element, 'fast')
    const time = inverseTime('very-inverse-us', 4, 0.5)!
    course.advance(0.8 * time, 400, 400)
    course.advance(5.4, 0, 0)
    expect(course.travelled()).toBeCloseTo(0.3, 9)
  })
})

describe('an element with a definite time', () => {
  it('operates after its delay, and begins anew once the current has been below', () => {
    expect(operatesAt(definite(2), [0, 5], [150, 150])).toBe(2)
    expect(operatesAt(definite(2), [0, 1.5, 1.5, 2, 2, 5], [150, 150, 50, 50, 150, 150])).toBe(4)
    expect(operatesAt(definite(2), [0, 50], [90, 90])).toBeNull()
    expect(operatesAt(definite(0), [0, 1], [90, 150])).toBeCloseTo(1 / 6, 12)
  })

  it('counts from where a rising current passes its setting', () =>
    // 50 to 150 A in 2 s passes 100 A after 1 s.
    expect(operatesAt(definite(2), [0, 2, 10], [50, 150, 150])).toBeCloseTo(3, 12))
})

describe('a thermal image', () => {
  const element: RelayElement = { kind: 'thermal-image', ...image, before: ampere(0), inhibit: null }

  it('comes to the square of the current, and does not operate at what it may carry', () => {
    expect(heatAfter(image, 0, 90, 1e6)).toBeCloseTo(steadyHeat(image, 90), 12)
    expect(thermalTime(image, 100)).toBeNull()
    expect(thermalTime(image, 50, 1)).toBe(0)
  })

  it('reaches its limit at the time of its formula, however the record is cut', () => {
    const time = thermalTime(image, 600)!
    expect(heatAfter(image, 0, 600, time)).toBeCloseTo(1, 12)
    const times = Array.from({ length: 200 }, (_, i) => i * 0.3)
    const at = operatesAt(
      element,
      times,
      times.map(() => 600),
    )
    expect(at).toBeCloseTo(time, 9)
  })

  it('cools at standstill with its own time constant', () => {
    expect(heatAfter(image, 0.8, 0, 1800)).toBeCloseTo(0.8 / Math.E, 12)
    const course = elementCourse({ ...element, before: ampere(90) }, 'fast')
    course.advance(1800, 0, 0)
    expect(course.travelled()).toBeCloseTo(0.81 / Math.E, 12)
  })

  it('asks for a rest until the next start fits, and says when none ever does', () => {
    const rest = restBefore(image, 0.9, 0.4)!
    expect(heatAfter(image, 0.9, 0, rest)).toBeCloseTo(0.6, 12)
    expect(restBefore(image, 0.5, 0.4)).toBe(0)
    expect(restBefore(image, 0.5, 1.1)).toBeNull()
  })
})

describe('a held rotor', () => {
  it('is taken off by an overload relay at the slow end of its class', () => {
    const element: RelayElement = { kind: 'overload-class', setting: ampere(100), class: '10' }
    expect(steadyTime(element, 720, 0)).toBeCloseTo(10, 12)
    expect(steadyTime(element, 100, 0)).toBeNull()
    // Against a start the fast end counts.
    expect(operatesAt(element, [0, 20], [720, 720])).toBeCloseTo(4, 12)
  })

  it('is taken off sooner by a warm thermal image', () => {
    const element: RelayElement = { kind: 'thermal-image', ...image, before: ampere(0), inhibit: null }
    expect(steadyTime(element, 600, 0.5)!).toBeLessThan(steadyTime(element, 600, 0)!)
  })
})

describe('a permissible time', () => {
  const thermal: ThermalData = {
    cold: second(20),
    hot: second(12),
    limits: [
      { state: 'hot', current: ampere(200), time: second(300) },
      { state: 'hot', current: ampere(400), time: second(40) },
      { state: 'cold', current: ampere(200), time: second(500) },
    ],
    coolingRunning: null,
    coolingStopped: null,
  }

  it('with the rotor held goes with the inverse square of the current, so of the voltage', () => {
    const declared = { current: 600, time: 12 }
    expect(permissibleTimeAt(600, declared)).toBe(12)
    expect(permissibleTimeAt(0.8 * 600, declared)).toBeCloseTo(12 / 0.64, 12)
    const alone = limitPoints({ ...thermal, limits: [] }, 'hot', 600)
    expect(permissibleTime(alone, 480)).toBeCloseTo(12 / 0.64, 12)
  })

  it('runs straight on logarithmic scales between the points of its curve', () => {
    const points = limitPoints(thermal, 'hot', 600)
    expect(points.map(({ current }) => current)).toEqual([200, 400, 600])
    expect(permissibleTime(points, 400)).toBe(40)
    expect(permissibleTime(points, Math.sqrt(200 * 400))).toBeCloseTo(Math.sqrt(300 * 40), 9)
    expect(permissibleTime(points, 1200)).toBeCloseTo(3, 12)
  })

  it('is not known below the lowest point of a curve, nor without any point', () => {
    expect(permissibleTime(limitPoints(thermal, 'hot', 600), 150)).toBeNull()
    expect(permissibleTime([], 600)).toBeNull()
    expect(limitPoints(thermal, 'cold', null)).toHaveLength(1)
  })
})

describe('the number of starts an hour', () => {
  it('is the least that anybody allows, who is named', () => {
    expect(startsAllowed({ maker: 3, device: 4, utility: 2, process: null })).toEqual({
      perHour: 2,
      governing: ['utility'],
      unknown: ['process'],
    })
    expect(startsAllowed({ maker: 2, device: 2, heat: 5 }).governing).toEqual(['maker', 'device'])
  })

  it('is lowered by the heat balance and never raised by it', () => {
    expect(startsAllowed({ maker: 3, heat: 1 })).toMatchObject({ perHour: 1, governing: ['heat'] })
    expect(startsAllowed({ maker: 3, heat: 8 })).toMatchObject({ perHour: 3, governing: ['maker'] })
    expect(startsAllowed({ maker: null, heat: 8 })).toEqual({ perHour: null, governing: [], unknown: ['maker'] })
  })
})
