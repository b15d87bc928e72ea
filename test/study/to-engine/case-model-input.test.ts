import { describe, expect, test } from 'vitest'
import { caseRecord } from '@/lib/study/document/case-records'
import { drivenLoadRecord } from '@/lib/study/document/driven-load-record'
import { motorRecord } from '@/lib/study/document/machine-records'
import { scheduleRecord } from '@/lib/study/document/schedule-record'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { modelComparison } from '@/lib/study/model-comparison'
import { runDocument } from '@/lib/study/run-document'
import { caseModelInput } from '@/lib/study/to-engine/case-model-input'
import { studyRunInput } from '@/lib/study/to-engine/study-run-input'
import { caseSentence } from '@/lib/study/words/case-sentence'
import { modelSentence } from '@/lib/study/words/model-words'
import { noticeSentence } from '@/lib/study/words/notice-words'
import { example } from '../support/examples'

const withModel = (changes: Record<string, unknown>): StudyDocument => {
  const document = example('one-motor')
  return { ...document, cases: document.cases.map((one) => caseRecord.parse({ ...one, ...changes })) }
}

/** The fan's motor as a generator, driven by its shaft and switched in at synchronous speed. */
const generating = (): StudyDocument => {
  const document = example('one-motor')
  const { plant } = document
  return {
    ...document,
    plant: {
      ...plant,
      motors: plant.motors.map((motor) => motorRecord.parse({ ...motor, role: 'generator' })),
      drivenLoads: plant.drivenLoads.map((load) =>
        drivenLoadRecord.parse({
          ...load,
          curves: load.curves.map(({ id, name }) => ({
            id,
            name,
            kind: 'points',
            active: true,
            points: [
              { speed: '0 r/min', torque: '-800 N·m' },
              { speed: '2000 r/min', torque: '-800 N·m' },
            ],
          })),
        }),
      ),
    },
    schedules: document.schedules.map((schedule) =>
      scheduleRecord.parse({
        ...schedule,
        starts: schedule.starts.map((start) => ({ ...start, initialSpeed: '1500 r/min' })),
      }),
    ),
  }
}

describe('the model of a case of a study file', () => {
  test('is left out where it is the quasi-static one, as in files from before', () => {
    expect(studyRunInput(example('one-motor')).cases[0]!.model).toBeUndefined()
    expect(example('one-motor').cases[0]!.model).toBe('quasi-static')
  })

  test('goes to the engine with its switching angle in radians, or with none for the worst', () => {
    const angled = withModel({ model: 'fifth-order', switchingAngle: '90' }).cases[0]!
    expect(caseModelInput(angled).model).toEqual({
      kind: 'fifth-order',
      switchingAngle: expect.closeTo(Math.PI / 2, 12),
    })
    expect(caseModelInput({ ...angled, switchingAngle: null }).model).toEqual({
      kind: 'fifth-order',
      switchingAngle: null,
    })
    expect(caseModelInput({ ...angled, model: 'third-order' }).model).toEqual({ kind: 'third-order' })
  })

  test('is said in the sentence of the case, and with its results', () => {
    const document = withModel({ model: 'fifth-order' })
    expect(caseSentence(document.cases[0]!, document)).toMatch(/; fifth order model/)
    const result = runDocument(document).cases[0]!
    expect(modelSentence(result)).toMatch(/fifth-order model, at the worst switching angle/)
    expect(modelSentence({ ...result, model: 'third-order' })).toMatch(/third-order/)
    expect(modelSentence({ ...result, model: 'quasi-static' })).toMatch(/quasi-static/)
  })

  test('stands beside the quasi-static figures with what they differ by', () => {
    const document = withModel({ model: 'fifth-order' })
    const rows = modelComparison(document, runDocument(document).cases[0]!)
    const runUp = rows.find(({ name }) => name.endsWith('run-up to the criterion'))!
    expect(runUp.own! / runUp.steady!).toBeGreaterThan(1)
    expect(runUp.own! / runUp.steady!).toBeLessThan(1.1)
    expect(rows.filter(({ steady }) => steady === null).length).toBe(6)
    expect(modelComparison(document, runDocument(example('one-motor')).cases[0]!)).toEqual([])
  })

  test('that does not fit is said with its reason', () => {
    const document = withModel({ model: 'fifth-order' })
    expect(noticeSentence({ kind: 'transient-model-unfit', cause: 'several-starts' }, document)).toMatch(
      /does not fit this case \(more than one motor starts\)/,
    )
  })
})

describe('an induction generator of a study file', () => {
  test('switched in at synchronous speed is of fifth order unasked, and ends feeding the network', () => {
    const document = generating()
    const result = runDocument(document).cases[0]!
    expect(result.model).toBe('fifth-order')
    expect(result.notices.map((notice) => noticeSentence(notice, document)).join(' ')).toMatch(
      /MF1 is switched on while it turns near synchronous speed/,
    )
    expect(result.series.motors['fan-motor']!.activePower.at(-1)!).toBeLessThan(-1e5)
  })

  test('is switched in, not started, in the words of its case', () => {
    const document = generating()
    expect(caseSentence(document.cases[0]!, document)).toMatch(
      /^MF1 switched in direct-on-line, turning at 1500 r\/min/,
    )
  })
})
