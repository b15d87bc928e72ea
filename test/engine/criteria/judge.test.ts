import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { CaseResult } from '@/lib/engine/case-result'
import { closeBand, judge } from '@/lib/engine/criteria/judge'
import type { CloseMargins, RuleInput } from '@/lib/engine/criteria/rule'
import { runCase } from '@/lib/engine/run-case'
import { ampere, newtonMetre, perUnit, second } from '@/lib/units/si'
import { limitOn, tried, triedResult } from '../../support/made-result'
import {
  autotransformer,
  constantLoad,
  simpleMotor,
  simplePlant,
  squareLoad,
  started,
} from '../../support/simple-plant'

const margins: CloseMargins = { ofLimit: perUnit(0.1), voltage: perUnit(0.01) }
const starts = { perDay: 1, perHour: 1 }
const on = (rule: RuleInput, input = tried, result: CaseResult = triedResult) =>
  judge(rule, input, result, starts, margins)
const value = (each: number): RuleInput['limit'] => ({ kind: 'value', value: each })

const place = triedResult.places[0]!
const start = triedResult.motors[1]!.start!
const runs = triedResult.motors[0]!.running!

describe('a limit on a voltage', () => {
  it('takes the change in parts of the voltage before', () => {
    expect(on(limitOn())!.value).toBeCloseTo(1 - place.deepest.voltage / place.before, 12)
  })

  it('takes the change in parts of the nominal voltage, from the voltage before: the d of flicker texts', () => {
    expect(on(limitOn({ reference: 'nominal' }))!.value).toBeCloseTo((place.before - place.deepest.voltage) / 400, 12)
  })

  it('takes what remains of the nominal, rated or former voltage', () => {
    const remaining = (changes: Partial<RuleInput>) =>
      on(limitOn({ quantity: 'remaining-voltage', limit: value(0.8), ...changes }))!.value
    expect(remaining({ reference: 'nominal' })).toBeCloseTo(place.deepest.voltage / 400, 12)
    expect(remaining({ reference: 'before' })).toBeCloseTo(place.deepest.voltage / place.before, 12)
    const motor = { place: { kind: 'starting-motors' as const }, reference: 'rated' as const }
    expect(remaining(motor)).toBeCloseTo(start.lowestMotorVoltage.voltage / 400, 12)
  })

  it('looks at the instant it names', () => {
    const at = (instant: RuleInput['instant']) => on(limitOn({ instant }))!
    expect(at('first').value).toBeCloseTo(1 - place.first / place.before, 12)
    expect(at('deepest').value!).toBeGreaterThanOrEqual(at('first').value!)
    expect(at('deepest').at).toBe(place.deepest.at)
    expect(at('settled-after-start').value).toBeCloseTo(1 - place.settledAfterStart! / place.before, 12)
    expect(at('settled-after-process').value).toBeCloseTo(1 - place.settledAfterProcess! / place.before, 12)
  })

  it('at running motors looks at their own lowest voltage and names the worst', () => {
    const verdict = on(
      limitOn({
        place: { kind: 'running-motors' },
        quantity: 'remaining-voltage',
        reference: 'rated',
        limit: value(0.8),
      }),
    )!
    expect(verdict.value).toBeCloseTo(runs.lowestVoltage.voltage / 400, 12)
    expect(verdict).toMatchObject({ motorId: 'R', busId: 'B' })
  })

  it('at the first instant looks at each started motor’s own switching-on', () => {
    const late = simplePlant(
      [simpleMotor('M', started()), simpleMotor('N', started({ kind: 'direct' }, squareLoad(500), 10))],
      0.012,
    )
    const result = runCase(late)
    const verdict = on(
      limitOn({
        place: { kind: 'starting-motors' },
        quantity: 'remaining-voltage',
        reference: 'rated',
        instant: 'first',
        limit: value(0.8),
        appliesTo: { caseIds: null, methods: null, motorIds: ['N'] },
      }),
      late,
      result,
    )!
    expect(verdict.value).toBeCloseTo(result.motors[1]!.start!.standstill.motorVoltage / 400, 12)
    expect(verdict.at).toBe(10)
  })

  it('on the highest voltage takes the highest of the run or of a settled state', () => {
    const verdict = on(
      limitOn({ place: { kind: 'every-bus' }, quantity: 'highest-voltage', reference: 'nominal', limit: value(1.1) }),
    )!
    expect(verdict.value).toBeCloseTo(Math.max(place.highest.voltage, place.settledAfterStart!) / 400, 12)
    expect(verdict.margin).toBeCloseTo(1.1 - verdict.value!, 12)
  })

  it('at a bus that is not in the case is not assessed', () => {
    expect(on(limitOn({ place: { kind: 'bus', busId: 'X' } }))).toMatchObject({
      word: 'not-assessed',
      reason: 'place-not-in-case',
      busId: 'X',
      value: null,
    })
  })
})

describe('the word of a verdict', () => {
  it('is fails beyond the limit, close within its band, meets inside it, on unrounded figures', () => {
    const change = on(limitOn())!.value!
    fc.assert(
      fc.property(fc.integer({ min: 300, max: 3000 }), (thousandths) => {
        const limit = (change * thousandths) / 1000
        const verdict = on(limitOn({ limit: value(limit) }))!
        const expected = change > limit ? 'fails' : limit - change < 0.1 * limit ? 'close' : 'meets'
        expect(verdict.word).toBe(expected)
        expect(verdict.margin).toBeCloseTo(limit - change, 12)
      }),
    )
  })

  it('counts a figure on the limit as inside it', () => {
    const change = on(limitOn())!.value!
    expect(on(limitOn({ limit: value(change) }))).toMatchObject({ word: 'close', margin: 0 })
    expect(on(limitOn({ limit: value(change * (1 - 1e-12)) }))!.word).toBe('fails')
  })

  it('on a remaining voltage is close within a hundredth of a per unit', () => {
    const left = on(limitOn({ quantity: 'remaining-voltage', reference: 'nominal' }))!.value!
    const word = (limit: number) =>
      on(limitOn({ quantity: 'remaining-voltage', reference: 'nominal', limit: value(limit) }))!.word
    expect(word(left - 0.011)).toBe('meets')
    expect(word(left - 0.009)).toBe('close')
    expect(word(left + 0.001)).toBe('fails')
  })

  it('has a band in parts of the limit for change, time, torque and heat, absolute for voltages', () => {
    expect(closeBand(limitOn(), 0.04, margins)).toBeCloseTo(0.004, 12)
    expect(closeBand(limitOn({ quantity: 'run-up-time' }), 20, margins)).toBeCloseTo(2, 12)
    expect(closeBand(limitOn({ quantity: 'remaining-voltage' }), 0.8, margins)).toBe(0.01)
    expect(closeBand(limitOn({ quantity: 'highest-voltage' }), 1.1, margins)).toBe(0.01)
  })

  it('is shown and does not count for a class of starts that is not in use', () => {
    const rare = { moreThanPerDay: null, atMostPerDay: 0, moreThanPerHour: null, atMostPerHour: null }
    expect(on(limitOn({ startClass: rare, limit: value(0.0001) }))).toMatchObject({ word: 'fails', inUse: false })
  })

  it('is none where the limit does not apply', () => {
    expect(on(limitOn({ appliesTo: { caseIds: ['other'], methods: null, motorIds: null } }))).toBeNull()
  })
})

const startRule = (quantity: RuleInput['quantity'], limit: number): RuleInput =>
  limitOn({ place: { kind: 'starting-motors' }, quantity, limit: value(limit) })

describe('a limit on a start', () => {
  const declared = {
    lockedRotorCurrent: ampere(1600),
    lockedRotorTorque: newtonMetre(450),
    permissibleTime: { time: second(10), state: 'hot' as const },
  }
  const short = simplePlant([simpleMotor('M', started({ kind: 'direct' }, squareLoad(700)), { declared })], 0.012)
  const shortResult = runCase(short)
  const held = simplePlant(
    [simpleMotor('M', started(autotransformer(0.5, { rpm: 1400 }), constantLoad(900)), { declared })],
    0.012,
  )
  const heldResult = runCase(held)

  it('takes the run-up time to speed and running position', () => {
    const verdict = on(startRule('run-up-time', 20))!
    expect(verdict.value).toBe(start.timeToCriterion)
    expect(verdict).toMatchObject({ word: 'meets', motorId: 'M', at: start.timeToCriterion })
  })

  it('takes the least accelerating torque in parts of rated, which must not be less', () => {
    const verdict = on(startRule('accelerating-torque', 0.01))!
    expect(verdict.value).toBe(start.leastAccelerating.ofRated)
    expect(verdict.margin).toBeCloseTo(start.leastAccelerating.ofRated - 0.01, 12)
    expect(on(startRule('accelerating-torque', 5))!.word).toBe('fails')
  })

  it('takes the heat used in parts of the permissible, and knows nothing where that is not declared', () => {
    expect(on(startRule('heat-used', 0.6), short, shortResult)!.value).toBe(
      shortResult.motors[0]!.start!.heatUsed.figure,
    )
    expect(on(startRule('heat-used', 0.6))).toMatchObject({
      word: 'not-assessed',
      reason: 'not-declared',
      motorId: 'M',
    })
  })

  it('fails on time without a figure when the motor does not start', () => {
    expect(on(startRule('run-up-time', 20), held, heldResult)).toMatchObject({
      word: 'fails',
      value: null,
      margin: null,
      motorId: 'M',
    })
  })

  it('fails on accelerating torque when the load holds the shaft', () => {
    const verdict = on(startRule('accelerating-torque', 0.1), held, heldResult)!
    expect(verdict.word).toBe('fails')
    expect(verdict.value!).toBeLessThan(0)
  })

  it('says nothing of the heat of a start that does not end, unless it is used up already', () => {
    const [heat, small] = [startRule('heat-used', 1e9), startRule('heat-used', 1e-9)]
    expect(on(heat, held, heldResult)).toMatchObject({ word: 'not-assessed', reason: 'state-not-reached' })
    expect(on(small, held, heldResult)!.word).toBe('fails')
  })

  it('does not know the settled voltage of a start that does not end', () => {
    expect(on(limitOn({ instant: 'settled-after-process' }), held, heldResult)).toMatchObject({
      word: 'not-assessed',
      reason: 'state-not-reached',
    })
  })

  it('is judged by the worst of several motors', () => {
    const motors = [
      simpleMotor('M', started({ kind: 'direct' }, squareLoad(500))),
      simpleMotor('N', started({ kind: 'direct' }, squareLoad(900))),
    ]
    const input = simplePlant(motors, 0.012)
    const result = runCase(input)
    const verdict = on(startRule('run-up-time', 60), input, result)!
    expect(verdict.motorId).toBe('N')
    expect(verdict.value).toBe(Math.max(...result.motors.map((motor) => motor.start!.timeToCriterion!)))
  })
})

describe('a case without figures', () => {
  const without = (outcome: CaseResult['outcome']): CaseResult => ({ ...triedResult, outcome, places: [], motors: [] })

  it('is not assessed, with the reason', () => {
    const reasons: [CaseResult['outcome'], string][] = [
      [{ kind: 'no-load-flow', busId: 'B' }, 'case-not-computed'],
      [{ kind: 'refused', cause: 'island', buses: ['B'], detail: '' }, 'case-refused'],
    ]
    for (const [outcome, reason] of reasons) {
      expect(on(limitOn(), tried, without(outcome))).toMatchObject({
        word: 'not-assessed',
        reason,
        value: null,
        margin: null,
      })
    }
  })

  it('fails what a collapse of the voltage makes unreachable, without a figure but with place and instant', () => {
    const collapsed = without({ kind: 'collapsed', at: second(1), busId: 'B' })
    const failed = { word: 'fails', reason: 'case-collapsed', value: null, margin: null, busId: 'B', at: 1 }
    expect(on(limitOn(), tried, collapsed)).toMatchObject(failed)
    expect(on(startRule('run-up-time', 60), tried, collapsed)).toMatchObject(failed)
    expect(on(limitOn({ instant: 'first' }), tried, collapsed)).toMatchObject({ word: 'not-assessed' })
    expect(on(startRule('heat-used', 1), tried, collapsed)).toMatchObject({ word: 'not-assessed' })
  })
})
