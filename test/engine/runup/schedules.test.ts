import { describe, expect, it } from 'vitest'
import type { CaseInput, MotorInput } from '@/lib/engine/case-input'
import type { CaseResult, StartResult } from '@/lib/engine/case-result'
import { runCase } from '@/lib/engine/run-case'
import type { Contactor, Disturbance } from '@/lib/engine/schedule-input'
import { perUnit, second, volt } from '@/lib/units/si'
import { constantLoad, simpleMotor, simplePlant, squareLoad, started } from '../../support/simple-plant'

type Starting = Extract<MotorInput['duty'], { kind: 'starting' }>

const starting = (changes: Partial<Starting> = {}, load = squareLoad(900, 50), at = 0): Starting => ({
  ...(started({ kind: 'direct' }, load, at) as Starting),
  ...changes,
})
const startOf = (result: CaseResult, id: string): StartResult | undefined =>
  result.motors.find(({ motorId }) => motorId === id)?.start ?? undefined
const waitingFor = (motorId: string, interval = 0) => ({ after: { motorId, interval: second(interval) } })
const run = (motors: MotorInput[], changes: Partial<CaseInput> = {}, reactance = 0.009): CaseResult =>
  runCase(simplePlant(motors, reactance, changes))

describe('starts that wait for one another', () => {
  it('follow when the former runs, and not before the least interval is over', () => {
    const at = (interval: number) => {
      const result = run([simpleMotor('A', starting()), simpleMotor('B', starting(waitingFor('A', interval)))])
      return { a: startOf(result, 'A')!, b: startOf(result, 'B')! }
    }
    const soon = at(0)
    if (soon.a.outcome.kind !== 'started') throw new Error('A does not start')
    expect(soon.b.switchedOnAt).toBeCloseTo(soon.a.outcome.at, 9)
    expect(soon.b.outcome.kind).toBe('started')
    expect(at(20).b.switchedOnAt).toBeCloseTo(20, 9)
  })

  it('give the same run as fixed instants at the same times', () => {
    const waited = run([simpleMotor('A', starting()), simpleMotor('B', starting(waitingFor('A', 7)))])
    const fixed = run([simpleMotor('A', starting()), simpleMotor('B', starting({}, undefined, 7))])
    expect(startOf(waited, 'B')!.timeToCriterion).toBeCloseTo(startOf(fixed, 'B')!.timeToCriterion!, 9)
    expect(waited.places[0]!.deepest.voltage).toBeCloseTo(fixed.places[0]!.deepest.voltage, 8)
  })

  it('go on in a chain whatever the order of the records', () => {
    const motors = [
      simpleMotor('C', starting(waitingFor('B'))),
      simpleMotor('A', starting()),
      simpleMotor('B', starting(waitingFor('A'))),
    ]
    const result = run(motors)
    const [a, b, c] = ['A', 'B', 'C'].map((id) => startOf(result, id)!.switchedOnAt)
    expect(a!).toBe(0)
    expect(b!).toBeGreaterThan(1)
    expect(c!).toBeGreaterThan(b! + 1)
  })

  it('are not switched on where the former never starts, and that is said', () => {
    const result = run([
      simpleMotor('A', starting({}, constantLoad(3000))),
      simpleMotor('B', starting(waitingFor('A'))),
      simpleMotor('C', starting(waitingFor('B'))),
    ])
    expect(startOf(result, 'A')!.outcome.kind).toBe('never-turned')
    expect(startOf(result, 'B')).toBeUndefined()
    expect(result.notices).toContainEqual({ kind: 'not-switched-on', motorId: 'B', waitsFor: 'A' })
    expect(result.notices).toContainEqual({ kind: 'not-switched-on', motorId: 'C', waitsFor: 'B' })
  })

  it('are refused where they wait for themselves or for a motor that is not started', () => {
    const detail = (motors: MotorInput[]) => {
      const { outcome } = run(motors)
      return outcome.kind === 'refused' ? outcome.detail : ''
    }
    expect(detail([simpleMotor('A', starting(waitingFor('B'))), simpleMotor('B', starting(waitingFor('A')))])).toMatch(
      /waits for itself/,
    )
    expect(detail([simpleMotor('A', starting(waitingFor('X')))])).toMatch(/waits for X, which is not started/)
  })

  it('at one instant dip deeper than each by itself', () => {
    const together = run([simpleMotor('A', starting()), simpleMotor('B', starting())])
    const alone = run([simpleMotor('A', starting())])
    expect(together.places[0]!.deepest.voltage).toBeLessThan(alone.places[0]!.deepest.voltage - 10)
    expect(startOf(together, 'A')!.timeToCriterion!).toBeGreaterThan(startOf(alone, 'A')!.timeToCriterion!)
  })
})

describe('attempts in one run', () => {
  const attempts = (...list: (readonly [runFor: number, rest: number])[]) => ({
    attempts: list.map(([runFor, rest]) => ({ runFor: second(runFor), rest: second(rest) })),
  })

  it('a failed start is abandoned after its time, coasts, and the next begins after the rest', () => {
    const result = run([simpleMotor('M', starting(attempts([0.8, 30]), squareLoad(900, 100)))])
    const { start, earlierAttempts } = result.motors[0]!
    expect(earlierAttempts).toHaveLength(1)
    expect(earlierAttempts![0]!.outcome).toMatchObject({ kind: 'abandoned', at: expect.closeTo(0.8, 9) })
    expect(start!.switchedOnAt).toBeCloseTo(30.8, 9)
    expect(start!.outcome.kind).toBe('started')
    expect(result.changeOvers.map(({ to }) => to)).toEqual(['off'])
  })

  it('each attempt has its own heat, current and time; the last is that of a single start from rest', () => {
    const single = startOf(run([simpleMotor('M', starting({}, squareLoad(900, 100)))]), 'M')!
    const result = run([simpleMotor('M', starting(attempts([10, 60], [10, 60]), squareLoad(900, 100)))])
    const { start, earlierAttempts } = result.motors[0]!
    expect(earlierAttempts).toHaveLength(2)
    for (const one of [...earlierAttempts!, start!]) {
      expect(one.outcome).toEqual({ kind: 'started', at: expect.closeTo(single.timeToCriterion!, 6) })
      expect(one.i2t / single.i2t).toBeCloseTo(1, 6)
      expect(one.slipEnergy / single.slipEnergy).toBeCloseTo(1, 6)
      expect(one.peakLineCurrent.current / single.peakLineCurrent.current).toBeCloseTo(1, 6)
    }
  })

  it('a short rest catches the shaft still turning', () => {
    const result = run([simpleMotor('M', starting(attempts([5, 1]), squareLoad(900, 20)))])
    const { start } = result.motors[0]!
    expect(start!.standstill.speed).toBeGreaterThan(50)
    expect(start!.timeToCriterion!).toBeLessThan(result.motors[0]!.earlierAttempts![0]!.timeToCriterion!)
  })

  it('take the network back to what it was in between', () => {
    const result = run([simpleMotor('M', starting(attempts([5, 60]), squareLoad(900, 100)))])
    const { time, busVoltage } = result.series
    const resting = time.findIndex((t) => t > 40)
    expect(busVoltage.B![resting]).toBeCloseTo(result.places[0]!.before, 6)
  })
})

describe('a dip of the supply', () => {
  const running = (id: string, contactor?: Contactor, load = squareLoad(900, 50)) =>
    simpleMotor(id, { kind: 'running', load, ...(contactor && { contactor }) })
  const dip = (remaining: number, duration: number): { disturbance: Disturbance } => ({
    disturbance: { at: second(1), duration: second(duration), remaining: perUnit(remaining) },
  })
  const contactor = (reclose: Contactor['reclose'], delay = 0.05): Contactor => ({
    dropOut: volt(260),
    delay: second(delay),
    reclose,
  })
  const outcome = (result: CaseResult, i = 0) => result.motors[i]!.running!.outcome

  it('slows running motors down and lets them come back, drawing more than before', () => {
    const result = run([running('A'), running('B')], dip(0.5, 0.4))
    const { lowestSpeed, before, peakCurrent, settledSpeed } = result.motors[0]!.running!
    expect(outcome(result).kind).toBe('rode-through')
    expect(lowestSpeed.speed).toBeLessThan(before.speed - 2)
    expect(lowestSpeed.at).toBeCloseTo(1.4, 1)
    expect(peakCurrent.current).toBeGreaterThan(1.5 * before.motorCurrent)
    expect(settledSpeed).toBeCloseTo(before.speed, 4)
  })

  it('stalls motors together that a longer one lets fall too far', () => {
    const heavy = (duration: number) =>
      run(
        [running('A', undefined, constantLoad(1100)), running('B', undefined, constantLoad(1100))],
        dip(0.3, duration),
        0.015,
      )
    expect(outcome(heavy(0.05)).kind).toBe('rode-through')
    expect(outcome(heavy(1.5)).kind).toBe('pulled-out')
  })

  it('lower and longer costs more speed', () => {
    const lowest = (remaining: number, duration: number) =>
      run([running('A')], dip(remaining, duration)).motors[0]!.running!.lowestSpeed.speed
    expect(lowest(0.3, 0.3)).toBeLessThan(lowest(0.6, 0.3))
    expect(lowest(0.5, 0.6)).toBeLessThan(lowest(0.5, 0.3))
  })

  it('a contactor drops out after its delay and stays out, or comes back and the motor re-accelerates', () => {
    const stays = run([running('A', contactor(null))], dip(0.4, 0.4))
    expect(outcome(stays)).toEqual({ kind: 'dropped-out', at: expect.closeTo(1.05, 6) })
    const back = run([running('A', contactor({ above: volt(340), delay: second(0.2) }))], dip(0.4, 0.4))
    expect(outcome(back)).toEqual({
      kind: 're-accelerated',
      droppedAt: expect.closeTo(1.05, 6),
      reclosedAt: expect.closeTo(1.6, 6),
    })
    expect(back.motors[0]!.running!.settledSpeed).toBeCloseTo(back.motors[0]!.running!.before.speed, 6)
  })

  it('shorter than the delay, or above the hold-in voltage, moves no contactor', () => {
    for (const one of [dip(0.4, 0.04), dip(0.75, 1)]) {
      expect(outcome(run([running('A', contactor(null))], one)).kind).toBe('rode-through')
    }
  })

  it('contactors with different delays spread the re-acceleration and lift the lowest voltage after the dip', () => {
    const lowestAfter = (delays: readonly number[]) => {
      const result = run(
        delays.map((delay, i) => running(`M${i}`, contactor({ above: volt(320), delay: second(delay) }))),
        dip(0.2, 0.8),
        0.02,
      )
      const { time, busVoltage } = result.series
      return Math.min(...busVoltage.B!.filter((_, i) => time[i]! > 1.801))
    }
    expect(lowestAfter([0.2, 2, 4])).toBeGreaterThan(lowestAfter([0.2, 0.2, 0.2]))
  })

  it('without any supply the plant is dead, coasts, and the residual voltage is said to be left out', () => {
    const result = run([running('A'), running('B')], dip(0, 0.3))
    expect(result.outcome).toEqual({ kind: 'complete' })
    expect(result.places[0]!.deepest).toEqual({ voltage: 0, at: expect.closeTo(1, 6) })
    expect(result.notices).toContainEqual({ kind: 'residual-voltage-not-modelled' })
    // J·dω/dt = −T_L while nothing drives: the speed at the end of the gap in closed form for a constant load.
    const constant = run([running('A', undefined, constantLoad(600))], dip(0, 0.3))
    const { before, lowestSpeed } = constant.motors[0]!.running!
    expect(lowestSpeed.speed).toBeCloseTo(before.speed - (600 * 0.3) / 6, 6)
    expect(outcome(constant).kind).toBe('rode-through')
  })

  it('trips a drive and not its neighbour on the line', () => {
    const result = run([running('A'), simpleMotor('M', starting())], dip(0.6, 0.2))
    expect(startOf(result, 'M')!.outcome.kind).toBe('started')
    expect(outcome(result).kind).toBe('rode-through')
  })

  it('ends a start whose contactor lacks voltage for longer than its delay', () => {
    const contactor = { dropOut: volt(260), delay: second(0.1) }
    const at = (duration: number) =>
      startOf(run([simpleMotor('M', starting({ contactor }))], dip(0.5, duration)), 'M')!.outcome
    expect(at(0.3)).toMatchObject({ kind: 'tripped', cause: 'contactor', at: expect.closeTo(1.1, 6) })
    expect(at(0.05).kind).toBe('started')
    // A start may pull its own contactor out.
    const own = startOf(run([simpleMotor('M', starting({ contactor }))], {}, 0.09), 'M')!.outcome
    expect(own).toMatchObject({ kind: 'tripped', at: expect.closeTo(0.1, 6) })
  })

  it('with values that cannot be is refused', () => {
    const refused = (changes: Partial<CaseInput>, motors = [running('A')]) => run(motors, changes).outcome.kind
    expect(refused({ disturbance: { at: second(1), duration: second(0), remaining: perUnit(0.5) } })).toBe('refused')
    expect(refused({}, [running('A', { ...contactor(null), dropOut: volt(0) })])).toBe('refused')
    expect(refused({}, [running('A', contactor({ above: volt(100), delay: second(0) }))])).toBe('refused')
  })
})
