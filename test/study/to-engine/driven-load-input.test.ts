import { describe, expect, test } from 'vitest'
import { loadSegments, loadTorqueAt } from '@/lib/engine/driven/load-segments'
import { runCase } from '@/lib/engine/run-case'
import { drivenLoadRecord, loadCurve } from '@/lib/study/document/driven-load-record'
import { readStudy } from '@/lib/study/read/read-study'
import { loadCurveInput } from '@/lib/study/to-engine/load-curve-input'
import { inertiaAtShaft } from '@/lib/study/to-engine/motor-input'
import { studyRunInput } from '@/lib/study/to-engine/study-run-input'
import { fromRpm } from '@/lib/units/speed'
import { example } from '../support/examples'

const gearOf = (speedRatio: string, efficiency: string | null) =>
  drivenLoadRecord.shape.gear.parse({ speedRatio, efficiency })
const torqueOf = (curve: Record<string, unknown>, rpm: number, gear = gearOf('1', null)) =>
  loadTorqueAt(loadSegments(loadCurveInput(loadCurve.parse({ id: 'c', name: 'c', ...curve }), gear)), fromRpm(rpm))

/** The one-motor example with its load record changed. */
const withLoad = (changes: Record<string, unknown>) => {
  const document = example('one-motor')
  const load = document.plant.drivenLoads[0]!
  document.plant.drivenLoads[0] = drivenLoadRecord.parse({ ...load, ...changes })
  return document
}
const withCurve = (curve: Record<string, unknown>) => {
  const document = example('one-motor')
  const { id } = document.plant.drivenLoads[0]!.curves[0]!
  return withLoad({ curves: [{ id, name: 'c', ...curve }, ...document.plant.drivenLoads[0]!.curves.slice(1)] })
}
const messages = (document: ReturnType<typeof example>) => {
  const read = readStudy(JSON.stringify(document))
  return read.ok ? [] : read.error.issues.map(({ message }) => message)
}

const pump = { friction: '20 N·m', shut: '500 N·m', ratedSpeed: '1480 r/min' }
const openPump = {
  kind: 'pump-open',
  ...pump,
  staticHead: '36 m',
  shutHead: '64 m',
  points: [
    { speed: '1300 r/min', torque: '520 N·m' },
    { speed: '1480 r/min', torque: '900 N·m' },
  ],
}

describe('load curves of a study file', () => {
  test('a pump with its valve shut rises from friction to its shut torque with the square of speed', () => {
    expect(torqueOf({ kind: 'pump-closed', ...pump }, 740)).toBeCloseTo(20 + 480 / 4, 9)
  })

  test('a pump against a static head opens its check valve where the shut head reaches it: 1480·√(36/64) = 1110 r/min', () => {
    expect(torqueOf(openPump, 1109)).toBeCloseTo(20 + 480 * (1109 / 1480) ** 2, 9)
    expect(torqueOf(openPump, 1205)).toBeCloseTo((20 + 480 * 0.5625 + 520) / 2, 6)
  })

  test('constant power is torque over speed above its lowest speed', () => {
    const curve = { kind: 'constant-power', power: '100 kW', from: '600 r/min', standstill: '1000 N·m' }
    expect(torqueOf(curve, 1200)).toBeCloseTo(100e3 / fromRpm(1200), 9)
    expect(torqueOf(curve, 0)).toBeCloseTo(1000, 9)
  })

  test('a formula is computed with as points within a ten-thousandth of its largest torque', () => {
    const curve = { kind: 'formula', formula: '50 + 850*x^2', ratedSpeed: '1480 r/min', upTo: '1500 r/min' }
    for (const rpm of [0, 333, 777, 1111, 1480]) {
      expect(Math.abs(torqueOf(curve, rpm) - 50 - 850 * (rpm / 1480) ** 2)).toBeLessThan(0.093)
    }
  })

  test('a gear divides speeds and multiplies torques by the ratio, and takes its losses', () => {
    const curve = { kind: 'pump-closed', ...pump }
    const gear = gearOf('0.5', '96 %')
    expect(torqueOf(curve, 1480, gear)).toBeCloseTo(((20 + 480 / 4) * 0.5) / 0.96, 9)
    expect(torqueOf(openPump, 2400, gear)).toBeCloseTo((torqueOf(openPump, 1200) * 0.5) / 0.96, 9)
    const points = {
      kind: 'points',
      active: true,
      points: [
        { speed: '-100 r/min', torque: '-80 N·m' },
        { speed: '100 r/min', torque: '-80 N·m' },
      ],
    }
    expect(torqueOf(points, 0, gear)).toBeCloseTo(-80 * 0.5 * 0.96, 9)
  })

  test('inertia is referred by the square of the speed ratio, and an inertia constant by the rated speed', () => {
    const document = withLoad({
      inertias: [
        { part: 'drum', inertia: '100 kg·m²', speedRatio: '0.1' },
        { part: 'flywheel', inertia: 'GD² 80 kg·m²', speedRatio: '1' },
        { part: 'fan', inertia: 'Wk² 100 lb·ft²', speedRatio: '1' },
      ],
      inertiaConstants: [{ part: 'coupling', constant: '0.5 s', power: '100 kVA' }],
    })
    const motor = document.plant.motors[0]!
    const constant = (2 * 0.5 * 100e3) / motor.ratedSpeed.si ** 2
    expect(inertiaAtShaft(motor, document.plant.drivenLoads[0]!)).toBeCloseTo(
      motor.inertia.si + 1 + 20 + 100 * 0.0421401 + constant,
      4,
    )
  })

  test('each form is computed to its end', () => {
    for (const curve of [
      { kind: 'pump-closed', ...pump },
      openPump,
      { kind: 'formula', formula: '50 + 400*x^2', ratedSpeed: '1480 r/min', upTo: '1500 r/min' },
      { kind: 'constant-power', power: '40 kW', from: '900 r/min', standstill: '60 N·m' },
    ]) {
      const document = withCurve(curve)
      expect(messages(document)).toEqual([])
      expect(runCase(studyRunInput(document).cases[0]!).outcome).toEqual({ kind: 'complete' })
    }
  })

  test('what reads well and cannot be is named at its field', () => {
    const formula = { kind: 'formula', ratedSpeed: '1480 r/min', upTo: '1500 r/min' }
    expect(messages(withCurve({ ...formula, formula: '50 + speed' }))[0]).toMatch(
      /cannot be read. “speed” is not known/,
    )
    expect(messages(withCurve({ ...formula, formula: '1/x' }))[0]).toMatch(/has no value at some speed/)
    expect(messages(withCurve({ ...formula, formula: 'x - 0.5' }))[0]).toMatch(/gives a torque below 0/)
    expect(messages(withCurve({ ...openPump, staticHead: '70 m' }))[0]).toMatch(/otherwise the pump never delivers/)
    expect(messages(withCurve({ ...openPump, points: [{ speed: '1000 r/min', torque: '500 N·m' }] }))[0]).toMatch(
      /rise from above the speed at which the check valve opens/,
    )
    expect(messages(withLoad({ gear: { speedRatio: '0', efficiency: null } }))[0]).toMatch(/gear of .* must be above 0/)
  })

  test('an older record reads as before, and a shaft without a name is one of its own', () => {
    const load = example('one-motor').plant.drivenLoads[0]!
    expect(load).toMatchObject({ gear: null, shaft: '', inertiaConstants: [] })
    expect(studyRunInput(example('one-motor')).cases[0]!.motors[0]!.shaft).toBeUndefined()
    expect(studyRunInput(withLoad({ shaft: 'S1' })).cases[0]!.motors[0]!.shaft).toBe('S1')
  })
})
