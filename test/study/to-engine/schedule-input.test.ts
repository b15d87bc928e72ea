import { describe, expect, test } from 'vitest'
import { runCase } from '@/lib/engine/run-case'
import { scheduleRecord } from '@/lib/study/document/schedule-record'
import { readStudy } from '@/lib/study/read/read-study'
import { studyRunInput } from '@/lib/study/to-engine/study-run-input'
import { caseSentence } from '@/lib/study/words/case-sentence'
import { example } from '../support/examples'

const example1 = () => {
  const document = example('velmoor')
  const record = document.cases[0]!
  const schedule = document.schedules.find(({ id }) => id === record.schedule)!
  return { document, record, schedule }
}

/** The demo's first case with its schedule changed as a file would have it. */
const withSchedule = (changes: (starts: readonly unknown[]) => Record<string, unknown>) => {
  const { document, record, schedule } = example1()
  const changed = scheduleRecord.parse({ ...schedule, ...changes(schedule.starts) })
  document.schedules = document.schedules.map((one) => (one.id === schedule.id ? changed : one))
  return { document, record: document.cases.find(({ id }) => id === record.id)! }
}
const inputOf = ({ document, record }: ReturnType<typeof withSchedule>) =>
  studyRunInput(document).cases.find(({ id }) => id === record.id)!
const messages = ({ document }: ReturnType<typeof withSchedule>) => {
  const read = readStudy(JSON.stringify(document))
  return read.ok ? [] : read.error.issues.map(({ message }) => message)
}
const firstStart = (starts: readonly unknown[], changes: Record<string, unknown>) =>
  starts.map((start, i) => (i === 0 ? { ...(start as object), ...changes } : start))

describe('a schedule of a study file', () => {
  test('attempts and a speed before the start go to the engine in SI', () => {
    const changed = withSchedule((starts) => ({
      starts: firstStart(starts, {
        initialSpeed: '-100 r/min',
        attempts: [{ runFor: '2 s', rest: '5 min' }],
      }),
    }))
    const starting = inputOf(changed).motors.find(({ duty }) => duty.kind === 'starting')!
    expect(starting.duty).toMatchObject({
      initialSpeed: expect.closeTo((-100 * Math.PI) / 30, 9),
      attempts: [{ runFor: 2, rest: 300 }],
    })
    expect(caseSentence(changed.record, changed.document)).toMatch(/, with 1 earlier attempt on the/)
  })

  test('a dip and contactors of running motors: shares of rated voltage become volts', () => {
    const { document, record } = example1()
    const running = document.plant.plantConditions.find(({ id }) => id === record.plantCondition)!.running
    const motor = running[0]?.motor ?? document.plant.motors[0]!.id
    const changed = withSchedule(() => ({
      disturbance: { at: '1 s', duration: '300 ms', remaining: '60 %' },
      contactors: [{ motor, dropOut: '65 %', delay: '50 ms', reclose: { above: '85 %', delay: '1 s' } }],
    }))
    const input = inputOf(changed)
    expect(input.disturbance).toEqual({ at: 1, duration: 0.3, remaining: 0.6 })
    const one = input.motors.find(({ id }) => id === motor)!
    if (running.length > 0)
      expect(one.duty).toMatchObject({
        contactor: {
          dropOut: 0.65 * one.ratedVoltage,
          delay: 0.05,
          reclose: { above: 0.85 * one.ratedVoltage, delay: 1 },
        },
      })
    expect(caseSentence(changed.record, changed.document)).toMatch(/supply at 60 % for 300 ms, beginning at 1 s/)
    expect(runCase(input).outcome).toEqual({ kind: 'complete' })
  })

  test('re-acceleration without a start is a schedule of its own', () => {
    const changed = withSchedule(() => ({
      starts: [],
      disturbance: { at: '0.5 s', duration: '200 ms', remaining: '0 %' },
    }))
    expect(messages(changed)).toEqual([])
    const result = runCase(inputOf(changed))
    expect(result.outcome).toEqual({ kind: 'complete' })
    expect(result.notices).toContainEqual({ kind: 'residual-voltage-not-modelled' })
    expect(caseSentence(changed.record, changed.document)).toMatch(/^supply away for 200 ms, beginning at 0.5 s on the/)
  })

  test('what cannot be is named at its field', () => {
    const own = example1().schedule.starts[0]!.motor
    expect(
      messages(
        withSchedule((starts) => ({ starts: firstStart(starts, { after: { motor: own, interval: '5 s' } }) })),
      )[0],
    ).toMatch(/waits for itself; break the ring/)
    expect(
      messages(
        withSchedule((starts) => ({ starts: firstStart(starts, { after: { motor: 'nobody', interval: '5 s' } }) })),
      )[0],
    ).toMatch(/waits for a motor that is not started in it/)
    expect(messages(withSchedule(() => ({ starts: [] })))[0]).toMatch(/neither starts a motor nor has a dip/)
    expect(
      messages(withSchedule(() => ({ disturbance: { at: '0 s', duration: '0 s', remaining: '50 %' } })))[0],
    ).toMatch(/The dip of schedule .* must be above 0/)
    expect(
      messages(
        withSchedule(() => ({
          contactors: [{ motor: own, dropOut: '65 %', delay: '0 s', reclose: { above: '50 %', delay: '0 s' } }],
        })),
      )[0],
    ).toMatch(/closes again at its drop-out voltage or above/)
  })

  test('an older schedule reads as before', () => {
    const { schedule } = example1()
    expect(schedule).toMatchObject({ disturbance: null, contactors: [] })
    expect(schedule.starts[0]).toMatchObject({ after: null, initialSpeed: null, attempts: [] })
  })
})
