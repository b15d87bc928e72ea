import { describe, expect, test } from 'vitest'
import { runCase } from '@/lib/engine/run-case'
import { type StarterRecord, starterRecord } from '@/lib/study/document/starter-record'
import { readStudy } from '@/lib/study/read/read-study'
import { studyRunInput } from '@/lib/study/to-engine/study-run-input'
import { starterPhrase } from '@/lib/study/words/starter-phrase'
import { example } from '../support/examples'

/** The one-motor example started by another method, as it would stand in a file. */
const withStarter = (settings: Record<string, unknown>) => {
  const document = example('one-motor')
  const { starter } = document.schedules[0]!.starts[0]!
  const record = starterRecord.parse({ id: starter, tag: 'X', ...settings })
  document.plant.starters = document.plant.starters.map((one) => (one.id === starter ? record : one))
  return { document, record }
}

const duty = (settings: Record<string, unknown>) => {
  const { document } = withStarter(settings)
  const input = studyRunInput(document).cases[0]!
  const motor = input.motors.find(({ duty: one }) => one.kind === 'starting')!
  if (motor.duty.kind !== 'starting') throw new Error('nothing starts')
  return { input, motor, duty: motor.duty }
}

const atSpeed = { kind: 'speed', at: '1350 r/min' }

const methods: Record<string, { settings: Record<string, unknown>; phrase: string }> = {
  reactor: {
    settings: { kind: 'reactor', reactance: '0.05 Ω', changeOver: atSpeed },
    phrase: 'behind a reactor of 0.05 Ω (bypass at 1350 r/min)',
  },
  resistor: {
    settings: { kind: 'resistor', resistance: '0.05 Ω', changeOver: { kind: 'current', at: '600 A' } },
    phrase: 'behind a resistor of 0.05 Ω (bypass when the current has fallen to 600 A)',
  },
  'soft-starter': {
    settings: {
      kind: 'soft-starter',
      ramp: { kind: 'voltage', from: '40 %', to: '100 %' },
      rampTime: '8 s',
      currentLimit: '1500 A',
    },
    phrase: 'by soft starter (voltage from 40 % to 100 % in 8 s, at most 1500 A)',
  },
  'part-winding': {
    settings: {
      kind: 'part-winding',
      currentShare: '65 %',
      torqueShare: '45 %',
      windingShare: '50 %',
      changeOver: { kind: 'time', at: '2 s' },
    },
    phrase: 'on part of the winding (the rest after 2 s)',
  },
  'captive-transformer': {
    settings: {
      kind: 'captive-transformer',
      primary: '400 V',
      secondary: '400 V',
      rating: '1 MVA',
      impedance: '5 %',
      xOverR: '8',
    },
    phrase: 'together with its transformer of 1 MVA',
  },
  drive: {
    settings: {
      kind: 'drive',
      speed: '1450 r/min',
      rampTime: '15 s',
      motorCurrent: '400 A',
      magnetising: '35 %',
      efficiency: '91 %',
      displacementFactor: '0.96',
      totalFactor: '0.93',
      currentLimit: '600 A',
      undervoltage: '300 V',
    },
    phrase: 'by variable-speed drive (to 1450 r/min in 15 s)',
  },
}

describe('a starting method of a study file', () => {
  for (const [kind, { settings, phrase }] of Object.entries(methods)) {
    test(`“${kind}” is read, said in words and computed`, () => {
      const { record } = withStarter(settings)
      expect(starterPhrase(record)).toBe(phrase)
      const { input, duty: start } = duty(settings)
      expect(start.starter.kind).toBe(kind)
      const result = runCase(input)
      expect(result.outcome).toEqual({ kind: 'complete' })
      expect(result.motors.find(({ start: one }) => one !== null)).toBeDefined()
    })
  }

  test('a torque ramp, limits and losses convert with the plate of the motor', () => {
    const soft = duty({
      kind: 'soft-starter',
      ramp: { kind: 'torque', from: '20 %', to: '150 %' },
      rampTime: '8 s',
      kick: { voltage: '70 %', time: '0.2 s' },
    })
    if (soft.duty.starter.kind !== 'soft-starter') throw new Error('another method')
    expect(soft.duty.starter.ramp.from).toBeCloseTo(0.2 * soft.motor.ratedTorque, 9)
    expect(soft.duty.starter.kick).toEqual({ voltage: 0.7, time: 0.2 })
    const driven = duty(methods.drive!.settings)
    if (driven.duty.starter.kind !== 'drive') throw new Error('another method')
    expect(driven.duty.starter.losses).toBeCloseTo(driven.motor.ratedPower * (1 / 0.91 - 1), 6)
    expect(driven.duty.starter.ratedSlip).toBeGreaterThan(0)
  })

  test('a captive transformer’s impedance stands on its primary side', () => {
    const { starter } = duty(methods['captive-transformer']!.settings).duty
    if (starter.kind !== 'captive-transformer') throw new Error('another method')
    expect(Math.hypot(starter.impedance.re, starter.impedance.im)).toBeCloseTo((0.05 * 400 ** 2) / 1e6, 12)
    expect(starter.ratio).toBe(1)
  })

  test('capacitors convert by their own rated voltage and are said in the phrase', () => {
    const settings = {
      kind: 'direct',
      capacitors: [{ power: '200 kvar', ratedVoltage: '440 V', off: atSpeed }],
    }
    const { duty: start } = duty(settings)
    expect(start.capacitors![0]!.susceptance).toBeCloseTo(200e3 / 440 ** 2, 12)
    expect(start.capacitors![0]!.on).toBeNull()
    expect(starterPhrase(withStarter(settings).record)).toBe('direct-on-line with capacitors')
  })

  test('duty figures go with the starts that the study plans', () => {
    const { document } = withStarter({ ...methods.reactor!.settings, dutyLimits: { secondsPerStart: '20 s' } })
    const start = studyRunInput(document).cases[0]!.motors.find(({ duty: one }) => one.kind === 'starting')!.duty
    expect(start).toMatchObject({
      starterDuty: {
        secondsPerStart: 20,
        startsPerHour: null,
        plannedPerHour: document.settings.startsPerHour.si,
      },
    })
  })

  test('an older record without the newer fields reads as before', () => {
    const record = starterRecord.parse({
      id: 'at',
      tag: 'AT',
      kind: 'autotransformer',
      tap: '65 %',
      changeOver: atSpeed,
      gap: '0 s',
    }) as Extract<StarterRecord, { kind: 'autotransformer' }>
    expect(record).toMatchObject({ middle: null, capacitors: [], dutyLimits: null, duty: '' })
  })

  test('settings that read well and cannot be are named at their field', () => {
    const messages = (settings: Record<string, unknown>) => {
      const read = readStudy(JSON.stringify(withStarter(settings).document))
      return read.ok ? [] : read.error.issues.map(({ message }) => message)
    }
    expect(messages({ ...methods.reactor!.settings, reactance: '0 Ω' })).toEqual([
      'The reactance of starting method X must be above 0.',
    ])
    expect(messages({ ...methods.drive!.settings, totalFactor: '0.98' })).toEqual([
      'The total power factor of starting method X cannot exceed its displacement factor.',
    ])
    expect(
      messages({ kind: 'soft-starter', ramp: { kind: 'voltage', from: '60 %', to: '40 %' }, rampTime: '5 s' }),
    ).toEqual(['The ramp of starting method X must rise.'])
    expect(messages(methods.drive!.settings)).toEqual([])
  })
})
