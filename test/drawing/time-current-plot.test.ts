import { describe, expect, it } from 'vitest'
import type { TextItem } from '@/lib/drawing/scene'
import { timeCurrentPlot } from '@/lib/drawing/time-current-plot'
import { studyDocument } from '@/lib/study/document/study-document'
import { timeCurrentCurves } from '@/lib/study/protection-curves'
import { runDocument } from '@/lib/study/run-document'
import { example } from '../study/support/examples'

const elements = [
  { kind: 'inverse', curve: 'extremely-inverse', pickUp: '130 A', multiplier: '1.5' },
  { kind: 'definite', name: 'instantaneous', pickUp: '1100 A', delay: '0.05 s' },
  { kind: 'thermal-image', base: '105 A', factor: '1.2', heating: '20 min', cooling: '60 min' },
] as const

/** The demo's second case with a relay at every motor. */
const document = (() => {
  const demo = example('velmoor')
  const motors = demo.plant.motors.map((motor) => ({
    ...motor,
    protection: { measures: 'motor' as const, elements: [...elements] },
  }))
  return studyDocument.parse({ ...demo, cases: demo.cases.slice(1, 2), plant: { ...demo.plant, motors } })
})()
const { cases, verdicts } = runDocument(document)
const result = cases[0]!
const started = result.motors.find(({ start }) => start !== null)!
const motor = document.plant.motors.find(({ id }) => id === started.motorId)!
const range = { from: 50, to: 2000 }

describe('the figure of time against current', () => {
  const scene = timeCurrentPlot({ document, result, verdicts }, { motorId: motor.id })!
  const words = scene.items.filter((item): item is TextItem => item.kind === 'text').map(({ text }) => text)

  it('names the start, each element and the limits of the motor beside their lines', () => {
    for (const name of [
      'IEC extremely inverse',
      'instantaneous',
      'thermal image',
      'motor limit hot',
      'motor limit cold',
    ])
      expect(words).toContain(name)
    expect(words).toContain(`start of ${motor.tag}`)
  })

  it('has decades on both axes and every line in a dash of its own', () => {
    for (const tick of ['0.1', '1', '10', '100']) expect(words).toContain(tick)
    const dashes = scene.items.flatMap((item) =>
      item.kind === 'path' && item.stroke?.startsWith('series-') && item.width > 0.4 ? [item.dash.join(' ')] : [],
    )
    expect(new Set(dashes).size).toBe(6)
  })

  it('says its margins to a reader who cannot see it', () =>
    expect(scene.description).toMatch(/least time to a trip 1[0-9]\.[0-9]+.s.*rotor held/))

  it('is not drawn for a motor without a relay', () => {
    const bare = { ...document, plant: { ...document.plant, motors: [{ ...motor, protection: null }] } }
    expect(timeCurrentPlot({ document: bare, result, verdicts }, { motorId: motor.id })).toBeNull()
  })
})

describe('the curves in it', () => {
  const curves = timeCurrentCurves(motor, 'hot', [0, 0, 0], range)

  it('stand where their formulas have them', () => {
    const [inverse, definite] = curves
    const k = inverse!.current.findIndex((current) => current > 381)
    expect(inverse!.time[k]).toBeCloseTo((1.5 * 80) / ((inverse!.current[k]! / 130) ** 2 - 1), 9)
    expect(definite!.current).toEqual([1100, 1100, 2000])
    expect(definite!.time.at(-1)).toBe(0.05)
  })

  it('fall with rising current', () => {
    for (const { time } of curves) expect(time).toEqual(time.toSorted((a, b) => b - a))
  })

  it('leave out a stage set beyond the range', () =>
    expect(timeCurrentCurves(motor, 'hot', [0, 0, 0], { from: 50, to: 1000 })).toHaveLength(curves.length - 1))
})

// The demo plant states this relay with these times (assumed data): about 15.8 s at 381 A, 6.8 s at 561 A.
it('of the demo’s relay gives the time that its record states, 15.8 s with the rotor held at 381 A', () => {
  const { lockedRotor } = started.start!.protection!
  expect(lockedRotor.current).toBeCloseTo(381, 0)
  expect(started.start!.protection!.elements[0]!.lockedRotor).toBeCloseTo(15.8, 1)
})
