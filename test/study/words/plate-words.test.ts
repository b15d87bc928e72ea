import { expect, test } from 'vitest'
import type { MotorRecord } from '@/lib/study/document/machine-records'
import { plateSentences } from '@/lib/study/words/plate-words'
import { example } from '../support/examples'

const pump = (): MotorRecord => structuredClone(example('velmoor').plant.motors[0]!)

test('a plate whose values agree needs no word', () => expect(plateSentences(pump(), 50)).toEqual([]))

test('a code letter that the locked-rotor current does not have is named with the motor', () => {
  const motor: MotorRecord = { ...pump(), codeLetter: 'A' }
  const said = plateSentences(motor, 50)
  expect(said).toHaveLength(1)
  expect(said[0]).toContain(motor.tag)
  expect(said[0]).toContain('code letter')
})

test('an estimated circuit that misses its plate is named, a typed one is not', () => {
  const base = pump()
  const odd: MotorRecord = { ...base, breakdownTorque: { ...base.breakdownTorque!, si: 1.2 } }
  expect(plateSentences(odd, 50)).toEqual([])
  expect(plateSentences({ ...odd, circuit: { kind: 'estimated' } }, 50).join(' ')).toContain('no circuit has all')
})

test('a plate with a gap is left alone', () =>
  expect(plateSentences({ ...pump(), efficiency: null, codeLetter: 'A' }, 50)).toEqual([]))
