import { describe, expect, it } from 'vitest'
import type { CaseInput, MotorInput } from '@/lib/engine/case-input'
import { runCase } from '@/lib/engine/run-case'
import {
  hertz,
  kilogramSquareMetre,
  newtonMetre,
  ohm,
  perUnit,
  radianPerSecond,
  second,
  siemens,
  volt,
  voltAmpere,
} from '@/lib/units/si'
import { autotransformer, noLoad, simpleMotor, simplePlant, singleCage, started } from '../../support/simple-plant'

const sound = simplePlant([simpleMotor('M', started())], 0.01, {
  buses: ['B', 'C'].map((id) => ({ id, nominal: volt(400) })),
  lines: [
    { id: 'L', fromBusId: 'B', toBusId: 'C', impedance: { re: ohm(0.01), im: ohm(0.01) }, susceptance: siemens(0) },
  ],
  transformers: [{ id: 'T', fromBusId: 'B', toBusId: 'C', ratio: 1, impedance: { re: ohm(0.01), im: ohm(0.1) } }],
  loads: [
    {
      id: 'A',
      busId: 'C',
      power: { re: voltAmpere(100), im: voltAmpere(50) },
      ratedVoltage: volt(400),
      mix: { impedance: 1, current: 0, power: 0 },
      floor: perUnit(0.7),
    },
  ],
  capacitors: [{ id: 'K', busId: 'C', susceptance: siemens(0.001) }],
})

/** The buses named and the sentence for a case with something wrong. */
function refusal(changes: Partial<CaseInput>) {
  const { outcome, places, motors, series } = runCase({ ...sound, ...changes })
  if (outcome.kind !== 'refused') throw new Error(`not refused: ${outcome.kind}`)
  expect(places).toEqual([])
  expect(motors).toEqual([])
  expect(series.time).toEqual([])
  return outcome
}

const motor = (changes: Partial<MotorInput>): Partial<CaseInput> => ({ motors: [simpleMotor('M', started(), changes)] })
const supply = (changes: Partial<CaseInput['supply']>): Partial<CaseInput> => ({
  supply: { ...sound.supply, ...changes },
})
const first = <K extends 'lines' | 'transformers' | 'loads' | 'capacitors'>(
  key: K,
  changes: Partial<CaseInput[K][number]>,
) => ({
  [key]: [{ ...sound[key][0]!, ...changes }],
})

describe('a case that cannot be computed is refused, and says where and why:', () => {
  it('nothing, when it is sound', () => {
    expect(runCase(sound).outcome).toEqual({ kind: 'complete' })
  })

  it('a supply at a bus that is not there', () => {
    expect(refusal(supply({ busId: 'X' }))).toMatchObject({ cause: 'no-supply', buses: ['X'] })
  })

  it('an island', () => {
    const buses = [...sound.buses, { id: 'far', nominal: volt(400) }]
    expect(refusal({ buses })).toMatchObject({ cause: 'island', buses: ['far'] })
  })

  it('a loop of lines without impedance', () => {
    const zero = { ...sound.lines[0]!, impedance: { re: ohm(0), im: ohm(0) } }
    const lines = [zero, { ...zero, id: 'L2' }]
    expect(refusal({ lines })).toMatchObject({ cause: 'zero-impedance-loop', buses: ['B', 'C'] })
  })

  it('a bus that is there twice or has no voltage', () => {
    expect(refusal({ buses: [...sound.buses, sound.buses[0]!] }).detail).toContain('twice')
    expect(refusal({ buses: [sound.buses[0]!, { id: 'C', nominal: volt(0) }] }).buses).toEqual(['C'])
  })

  it('a frequency, criterion, limit or tolerance out of range', () => {
    expect(refusal({ frequency: hertz(0) }).detail).toContain('frequency')
    const settings = (changes: Partial<CaseInput['settings']>) =>
      refusal({ settings: { ...sound.settings, ...changes } }).detail
    expect(settings({ speedCriterion: perUnit(1.3) })).toContain('criterion')
    expect(settings({ timeLimit: second(-1) })).toContain('time limit')
    expect(settings({ tolerance: 0 })).toContain('tolerance')
    expect(settings({ tolerance: Number.NaN })).toContain('tolerance')
  })

  it('a source without impedance, with negative resistance or without voltage', () => {
    for (const impedance of [
      { re: ohm(0), im: ohm(0) },
      { re: ohm(-1), im: ohm(1) },
      { re: ohm(Number.POSITIVE_INFINITY), im: ohm(1) },
    ]) {
      expect(refusal(supply({ impedance })).buses).toEqual(['B'])
    }
    expect(refusal(supply({ hold: { kind: 'emf', voltage: volt(-400) } })).detail).toContain('voltage')
  })

  it('a motor in the stated level without sense or place', () => {
    const noCage = { ...singleCage, cages: [] }
    expect(refusal(supply({ motorsInLevel: [{ busId: 'B', circuit: noCage }] })).detail).toContain('cages')
    expect(refusal(supply({ motorsInLevel: [{ busId: 'X', circuit: singleCage }] })).buses).toEqual(['X'])
  })

  it('a branch from nowhere, onto itself, or with negative resistance', () => {
    expect(refusal(first('lines', { toBusId: 'X' })).detail).toContain('not in the case')
    expect(refusal(first('lines', { toBusId: 'B' })).detail).toContain('same bus')
    expect(refusal(first('lines', { impedance: { re: ohm(-0.1), im: ohm(1) } })).buses).toEqual(['B', 'C'])
    expect(refusal(first('lines', { susceptance: siemens(-1) })).detail).toContain('susceptance')
  })

  it('a transformer without impedance or ratio', () => {
    expect(refusal(first('transformers', { impedance: { re: ohm(0), im: ohm(0) } })).detail).toContain('impedance')
    expect(refusal(first('transformers', { ratio: 0 })).detail).toContain('ratio')
  })

  it('a load or capacitor without sense or place', () => {
    expect(refusal(first('loads', { busId: 'X' })).buses).toEqual(['X'])
    expect(refusal(first('loads', { ratedVoltage: volt(0) })).detail).toContain('rated voltage')
    expect(refusal(first('loads', { mix: { impedance: Number.NaN, current: 0, power: 1 } })).detail).toContain('shares')
    expect(refusal(first('capacitors', { busId: 'X' })).buses).toEqual(['X'])
    expect(refusal(first('capacitors', { susceptance: siemens(-1) })).detail).toContain('susceptance')
  })

  it('a motor without place, or there twice', () => {
    expect(refusal(motor({ busId: 'X' })).buses).toEqual(['X'])
    const twice = [simpleMotor('M', started()), simpleMotor('M', started())]
    expect(refusal({ motors: twice }).detail).toContain('twice')
  })

  it('a motor with a figure that no machine has', () => {
    const figures: [Partial<MotorInput>, string][] = [
      [{ ratedVoltage: volt(0) }, 'rated voltage'],
      [{ poles: 3 }, 'poles'],
      [{ ratedSpeed: radianPerSecond(158) }, 'synchronous'],
      [{ inertia: kilogramSquareMetre(0) }, 'inertia'],
      [{ torqueFactor: perUnit(0) }, 'torque factor'],
      [{ circuit: { ...singleCage, magnetising: ohm(0) } }, 'magnetising'],
      [{ circuit: { ...singleCage, core: ohm(0) } }, 'core'],
      [{ circuit: { ...singleCage, cages: [{ resistance: ohm(0), reactance: ohm(1) }] } }, 'cage'],
      [{ circuit: { ...singleCage, stator: { re: ohm(-1), im: ohm(1) } } }, 'stator'],
    ]
    for (const [changes, word] of figures) expect(refusal(motor(changes)).detail).toContain(word)
  })

  it('a start before zero, a tap above one, a gap or change-over before zero', () => {
    const duty = (each: MotorInput['duty']) => refusal({ motors: [simpleMotor('M', each)] }).detail
    expect(duty(started({ kind: 'direct' }, noLoad, -1))).toContain('before zero')
    expect(duty(started(autotransformer(1.1, { at: 1 })))).toContain('tap')
    expect(duty(started(autotransformer(0.5, { at: 1 }, -1)))).toContain('gap')
    expect(duty(started(autotransformer(0.5, { at: -1 })))).toContain('change-over')
  })

  it('a load curve that does not rise in speed, or has a torque that drives', () => {
    const curve = (speeds: number[], torques: number[]) =>
      refusal({
        motors: [
          simpleMotor(
            'M',
            started(
              { kind: 'direct' },
              { kind: 'points', speeds: speeds.map(radianPerSecond), torques: torques.map(newtonMetre) },
            ),
          ),
        ],
      }).detail
    expect(curve([0, 10, 10], [1, 2, 3])).toContain('rise')
    expect(curve([0, 10], [1])).toContain('each speed')
    expect(curve([0, 10], [1, -2])).toContain('zero or more')
    expect(curve([], [])).toContain('each speed')
    const breakaway = {
      ...noLoad,
      kind: 'power' as const,
      breakaway: { torque: newtonMetre(10), until: radianPerSecond(0) },
    }
    expect(refusal({ motors: [simpleMotor('M', started({ kind: 'direct' }, breakaway))] }).detail).toContain(
      'breakaway',
    )
  })
})
