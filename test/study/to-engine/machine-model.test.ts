import { expect, test } from 'vitest'
import { circuitOf, isTabulated } from '@/lib/engine/case-input'
import { runStudy } from '@/lib/engine/run-study'
import { type StudyDocumentInput, studyDocument } from '@/lib/study/document/study-document'
import { readStudyValue } from '@/lib/study/read/read-study'
import { studyRunInput } from '@/lib/study/to-engine/study-run-input'
import { example } from '../support/examples'

type MotorInput = StudyDocumentInput['plant']['motors'] extends readonly (infer M)[] | undefined ? M : never

/** The one-motor study with parts of its motor put otherwise, read as a file would be. */
const withMotor = (changes: Partial<NonNullable<MotorInput>>) => {
  const document = example('one-motor')
  const [motor] = document.plant.motors
  const read = readStudyValue({ ...document, plant: { ...document.plant, motors: [{ ...motor, ...changes }] } })
  if (!read.ok) throw read.error
  return read.value
}

const modelOf = (changes: Partial<NonNullable<MotorInput>>) =>
  studyRunInput(withMotor(changes)).cases[0]!.motors[0]!.circuit

const scale = { unit: 'ohm' as const }
const values = { scale, stator: { r: 0.002, x: 0.02 }, magnetising: 0.9, core: null, provenance: null }

test('a deep-bar cage keeps its values at standstill beside those at synchronous speed', () => {
  const circuit = circuitOf(
    modelOf({ circuit: { kind: 'deep-bar', ...values, cage: { r: 0.004, x: 0.03 }, locked: { r: 0.012, x: 0.02 } } }),
  )
  expect(circuit.cages).toEqual([{ resistance: 0.004, reactance: 0.03 }])
  expect(circuit.deepBar).toEqual({ law: 'linear', resistance: 0.012, reactance: 0.02 })
})

test('a bar has its depth and the part of the reactance in its slot', () => {
  const circuit = circuitOf(
    modelOf({ circuit: { kind: 'slot-bar', ...values, cage: { r: 0.004, x: 0.03 }, depth: 3, slotShare: 0.6 } }),
  )
  expect(circuit.deepBar).toEqual({ law: 'bar', depth: 3, slotShare: 0.6 })
})

const points = [
  { speed: '0 r/min', torque: '2500 N·m', current: '2900 A', powerFactor: '0.25' },
  { speed: '1200 r/min', torque: '3400 N·m', current: '2300 A', powerFactor: '0.45' },
  { speed: '1486 r/min', torque: '1607 N·m', current: '420 A', powerFactor: '0.88' },
]

test('curves that end at rated speed are closed without torque and with the reactive part of the last current', () => {
  const table = modelOf({ circuit: { kind: 'table', points } })
  if (!isTabulated(table)) throw new Error('no table')
  expect(table.speeds.at(-1)).toBeCloseTo(50 * Math.PI, 9)
  expect(table.torques.at(-1)).toBe(0)
  expect(table.currents.at(-1)).toBeCloseTo(420 * Math.sqrt(1 - 0.88 ** 2), 9)
  expect(table.powerFactors.at(-1)).toBe(0)
})

test('a start by curves alone is computed like any other', () => {
  const result = runStudy(studyRunInput(withMotor({ circuit: { kind: 'table', points } })))
  const { start } = result.cases[0]!.motors[0]!
  expect(result.cases[0]!.outcome).toEqual({ kind: 'complete' })
  expect(start!.outcome.kind).toBe('started')
  const { motorCurrent, motorVoltage } = start!.standstill
  expect(motorCurrent / motorVoltage).toBeCloseTo(2900 / 400, 6)
})

test('curves that do not begin at standstill are refused at their field', () => {
  const late = points.map((point, k) => (k === 0 ? { ...point, speed: '100 r/min' } : point))
  expect(() => withMotor({ circuit: { kind: 'table', points: late } })).toThrow()
})

test('typed torque replaces that of the circuit, and a declared pull-up is then assessed', () => {
  const torquePoints = points.map(({ speed, torque }) => ({ speed, torque }))
  const model = circuitOf(modelOf({ torquePoints }))
  expect(model.torqueCurve!.torques).toEqual([2500, 3400, 1607, 0])
  const document = example('one-motor')
  const rule = document.limits.find(({ quantity }) => quantity === 'accelerating-torque')
  const base = {
    ...withMotor({ pullUpTorque: '1.4' }),
    limits: [
      {
        ...(rule ?? document.limits[0]!),
        place: { kind: 'starting-motors' as const },
        quantity: 'accelerating-torque' as const,
        reference: 'rated' as const,
        limit: { kind: 'ratio' as const, value: '10 %' },
      },
    ],
  }
  const verdict = (changes: Partial<NonNullable<MotorInput>>) => {
    const plant = { ...base.plant, motors: withMotor({ pullUpTorque: '1.4', ...changes }).plant.motors }
    return runStudy(studyRunInput(studyDocument.parse({ ...base, plant }))).verdicts[0]!
  }
  expect(verdict({})).toMatchObject({ word: 'not-assessed', reason: 'no-pull-up-data' })
  expect(verdict({ torquePoints }).word).not.toBe('not-assessed')
})

test('saturation sets in above rated slip and acts in full from breakdown on', () => {
  const { saturation } = circuitOf(modelOf({ saturation: { current: 1.1, torque: 2.2 } }))
  const rated = 1 - 1486 / 1500
  expect(saturation).toMatchObject({ current: 1.1, torque: 2.2 })
  expect(saturation!.noneBelow).toBeCloseTo(rated, 9)
  expect(saturation!.fullFrom).toBeGreaterThan(2 * rated - 1e-12)
})
