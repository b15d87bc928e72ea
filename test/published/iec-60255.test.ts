import { describe, expect, it } from 'vitest'
import { elementCourse } from '@/lib/engine/protection/element-course'
import { type InverseCurve, inverseTime } from '@/lib/engine/protection/inverse-curve'
import { thermalTime } from '@/lib/engine/protection/thermal-image'
import { ampere, second } from '@/lib/units/si'

// IEC 60255-151 and IEEE C37.112: constants as several makers' relay manuals print them; times computed from them.
describe('IEC 60255-151 and IEEE C37.112: times of inverse elements at a multiplier of 1', () => {
  const points: Partial<Record<InverseCurve, readonly (readonly [number, number])[]>> = {
    'normal-inverse': [
      [1.5, 17.1942],
      [2, 10.029],
      [5, 4.2797],
      [10, 2.9706],
    ],
    'very-inverse': [
      [1.5, 27],
      [2, 13.5],
      [5, 3.375],
      [10, 1.5],
    ],
    'extremely-inverse': [
      [1.5, 64],
      [2, 26.667],
      [5, 3.3333],
      [10, 0.80808],
    ],
    'long-time-inverse': [
      [1.5, 240],
      [2, 120],
      [5, 30],
      [10, 13.333],
    ],
    'moderately-inverse-us': [
      [1.5, 6.439],
      [2, 3.8032],
      [5, 1.6883],
      [10, 1.2068],
    ],
    'very-inverse-us': [
      [1.5, 16.179],
      [2, 7.0277],
      [5, 1.3081],
      [10, 0.68908],
    ],
    'extremely-inverse-us': [
      [1.5, 22.6817],
      [2, 9.5217],
      [5, 1.2967],
      [10, 0.40655],
    ],
  }
  for (const [curve, times] of Object.entries(points) as [InverseCurve, readonly (readonly [number, number])[]][])
    it.each(times)(`${curve} at %d times the setting`, (multiple, time) =>
      expect(inverseTime(curve, multiple)! / time).toBeCloseTo(1, 4),
    )
})

// IEC 60255-149, form from memory of the standard; times computed from it.
describe('IEC 60255-149: thermal image with τ = 600 s and k = 1.05', () => {
  const image = { heating: second(600), cooling: second(600), lasting: 1.05 }
  it.each([
    [1.5, 404.007, 51.3347],
    [2, 193.468, 20.8584],
    [4, 42.8372, 4.11407],
    [6, 18.6622, 1.75972],
  ])('at %d times the base current', (current, cold, hot) => {
    expect(thermalTime(image, current)! / cold).toBeCloseTo(1, 5)
    expect(thermalTime(image, current, (1 / 1.05) ** 2)! / hot).toBeCloseTo(1, 5)
  })
})

// IEEE C37.112: reset times t_r·TD/(1 − M²); constants 4.85, 21.6 and 29.1 from memory of the standard.
describe('IEEE C37.112: an element without current falls back in its published time', () => {
  it.each([
    ['moderately-inverse-us', 4.85],
    ['very-inverse-us', 21.6],
    ['extremely-inverse-us', 29.1],
  ] as const)('%s in %d s at a dial of 1', (curve, reset) => {
    const course = elementCourse({ kind: 'inverse', curve, pickUp: ampere(1), multiplier: 1, reset: null }, 'fast')
    course.advance(0.9 * inverseTime(curve, 5)!, 5, 5)
    course.advance(reset / 2, 0, 0)
    expect(course.travelled()).toBeCloseTo(0.4, 9)
    // At 0.8 of the setting it is slower by 1 − 0.8².
    course.advance(reset / 2, 0.8, 0.8)
    expect(course.travelled()).toBeCloseTo(0.4 - 0.18, 9)
  })
})
