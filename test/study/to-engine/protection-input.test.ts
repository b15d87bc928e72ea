import { describe, expect, it, test } from 'vitest'
import { motorProtection } from '@/lib/study/document/motor-protection'
import type { StudyDocument, StudyDocumentInput } from '@/lib/study/document/study-document'
import { studyDocument } from '@/lib/study/document/study-document'
import { checkProtection } from '@/lib/study/references/check-protection'
import { runDocument } from '@/lib/study/run-document'
import { studyRunInput } from '@/lib/study/to-engine/study-run-input'
import { example } from '../support/examples'

type MotorInput = NonNullable<NonNullable<StudyDocumentInput['plant']['motors']>[number]>

/** The example with further data of its first motor. */
const withMotor = (changes: Partial<MotorInput>, settings = {}): StudyDocument => {
  const document = example('one-motor')
  const [first, ...rest] = document.plant.motors
  return studyDocument.parse({
    ...document,
    settings: { ...document.settings, ...settings },
    plant: { ...document.plant, motors: [{ ...first!, ...changes }, ...rest] },
  })
}

const startedMotor = (document: StudyDocument) =>
  studyRunInput(document).cases[0]!.motors.find(({ duty }) => duty.kind === 'starting')!

const image = { kind: 'thermal-image', base: '100 A', factor: '1.05', heating: '10 min', cooling: '30 min' } as const

describe('the relay of a feeder', () => {
  it('comes to the engine in primary amperes', () => {
    const protection = {
      measures: 'motor' as const,
      currentTransformer: { primary: '300 A', secondary: '1 A' },
      settingsIn: 'secondary' as const,
      elements: [
        { kind: 'inverse' as const, curve: 'very-inverse' as const, pickUp: '0.5 A', multiplier: '0.2' },
        { kind: 'definite' as const, pickUp: '3 A', delay: '0.1 s' },
        { kind: 'overload-class' as const, setting: '0.4 A', class: '20' as const },
      ],
    }
    const { protection: input } = startedMotor(withMotor({ protection }))
    expect(input).toMatchObject({ measures: 'motor' })
    expect(input!.elements).toEqual([
      { kind: 'inverse', curve: 'very-inverse', pickUp: 150, multiplier: 0.2, reset: null },
      { kind: 'definite', pickUp: 900, delay: 0.1 },
      { kind: 'overload-class', setting: 120, class: '20' },
    ])
  })

  it('with a thermal image begins from the rated current when the study judges from hot, from nothing when from cold', () => {
    const from = (thermalState: 'hot' | 'cold') =>
      startedMotor(withMotor({ protection: { elements: [image] }, ratedCurrent: '90 A' }, { thermalState })).protection!
        .elements[0]
    expect(from('hot')).toMatchObject({ lasting: 105, heating: 600, cooling: 1800, before: 90, inhibit: null })
    expect(from('cold')).toMatchObject({ before: 0 })
  })

  it('is left out where the record has none, and thermal data with it', () => {
    const bare = startedMotor(withMotor({ permissibleCold: null, permissibleHot: null, thermalLimits: [] }))
    expect(bare.protection).toBeUndefined()
    expect(bare.declared.thermal).toBeUndefined()
  })
})

test('thermal data of the maker come to the engine with their state', () => {
  const { declared } = startedMotor(
    withMotor({
      permissibleCold: '20 s',
      permissibleHot: '12 s',
      thermalLimits: [{ state: 'hot', current: '200 A', time: '60 s' }],
      coolingStopped: '90 min',
    }),
  )
  expect(declared.thermal).toEqual({
    cold: 20,
    hot: 12,
    limits: [{ state: 'hot', current: 200, time: 60 }],
    coolingRunning: null,
    coolingStopped: 5400,
  })
})

test('a relay that trips the start is in the outcome of the case', () => {
  const quick = { kind: 'definite', name: 'locked rotor', pickUp: '1 A', delay: '0.2 s' } as const
  const result = runDocument(withMotor({ protection: { elements: [quick] } })).cases[0]!
  const { start } = result.motors.find((motor) => motor.start !== null)!
  expect(start!.outcome).toMatchObject({ kind: 'tripped', cause: 'protection', at: 0.2 })
})

test('settings that no relay can have are refused with a sentence each', () => {
  const document = withMotor({
    coolingStopped: '0 s',
    protection: {
      settingsIn: 'secondary',
      elements: [
        { ...image, factor: '0.9', inhibit: '120 %' },
        { kind: 'inverse', curve: 'normal-inverse', pickUp: '0 A', multiplier: '1' },
      ],
    },
  })
  const sentences = checkProtection(document).map(({ message }) => message)
  expect(sentences).toHaveLength(5)
  expect(sentences.join(' ')).toMatch(
    /cooling time constant.*current transformer.*factor k.*releases no start.*pick-up/,
  )
  expect(checkProtection(example('one-motor'))).toEqual([])
  expect(motorProtection.safeParse({ elements: [] }).success).toBe(false)
})
