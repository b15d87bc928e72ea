import { describe, expect, it } from 'vitest'
import type { CaseInput, MotorInput } from '@/lib/engine/case-input'
import type { CaseResult } from '@/lib/engine/case-result'
import { judge } from '@/lib/engine/criteria/judge'
import { runCase } from '@/lib/engine/run-case'
import type { Contactor, Disturbance, SecondSupply } from '@/lib/engine/schedule-input'
import { ohm, perUnit, second, volt } from '@/lib/units/si'
import { generator } from '../../support/generator'
import { limitOn } from '../../support/made-result'
import { simpleMotor, simplePlant, squareLoad } from '../../support/simple-plant'

const running = (id: string, contactor?: Contactor): MotorInput =>
  simpleMotor(id, { kind: 'running', load: squareLoad(900, 50), ...(contactor && { contactor }) })
const network = (reactance: number, emf = 400): SecondSupply => ({
  impedance: { re: ohm(reactance / 10), im: ohm(reactance) },
  emf: volt(emf),
  angle: 0,
})
const transfer = (dead: number, to?: SecondSupply, decayTime?: number): Disturbance => ({
  at: second(1),
  duration: second(dead),
  remaining: perUnit(0),
  ...(to && { to }),
  ...(decayTime !== undefined && { decayTime: second(decayTime) }),
})
const run = (motors: MotorInput[], disturbance: Disturbance, changes: Partial<CaseInput> = {}): CaseResult =>
  runCase(simplePlant(motors, 0.009, { disturbance, ...changes }))
const kinds = (result: CaseResult) => result.notices.map(({ kind }) => kind)

describe('a transfer to a second supply', () => {
  it('of equal level and voltage is the same as the return of the first', () => {
    const back = run([running('A')], transfer(0.5))
    const over = run([running('A')], transfer(0.5, network(0.009)))
    expect(over.places[0]!.deepest).toEqual(back.places[0]!.deepest)
    expect(over.motors[0]!.running!.settledSpeed).toBeCloseTo(back.motors[0]!.running!.settledSpeed!, 6)
  })

  it('that is weaker settles at the voltage that it gives by itself', () => {
    const result = run([running('A')], transfer(0.5, network(0.03, 405)))
    const alone = runCase(
      simplePlant([running('A')], 0.03, {
        supply: {
          busId: 'B',
          impedance: { re: ohm(0.003), im: ohm(0.03) },
          hold: { kind: 'emf', voltage: volt(405) },
          motorsInLevel: [],
        },
      }),
    )
    expect(result.motors[0]!.running!.outcome.kind).toBe('rode-through')
    expect(result.places[0]!.settledAfterStart).toBeCloseTo(alone.places[0]!.before, 3)
    expect(result.places[0]!.before).not.toBeCloseTo(alone.places[0]!.before, 0)
  })

  it('angle of the second supply changes no size while motors are steady circuits', () => {
    const [a, b] = [0, 1].map((angle) => run([running('A')], transfer(0.4, { ...network(0.012), angle })))
    expect(a!.motors[0]!.running!.peakCurrent.current).toBeCloseTo(b!.motors[0]!.running!.peakCurrent.current, 6)
  })

  it('contactors drop out in the dead time and close again each by its delay', () => {
    const contactor = (delay: number): Contactor => ({
      dropOut: volt(240),
      delay: second(0.1),
      reclose: { above: volt(340), delay: second(delay) },
    })
    const result = run([running('A', contactor(1)), running('B', contactor(4))], transfer(1.5, network(0.02)))
    for (const [k, delay] of [1, 4].entries()) {
      expect(result.motors[k]!.running!.outcome).toMatchObject({
        kind: 're-accelerated',
        droppedAt: expect.closeTo(1.1, 6),
        reclosedAt: expect.closeTo(2.5 + delay, 1),
      })
    }
  })

  it('to a generator: the set takes the load, its frequency dips and comes back to its droop', () => {
    const result = run([running('A')], transfer(1, { ...network(1), generator: generator() }))
    expect(result.outcome.kind).toBe('complete')
    const { generator: found, motors, series } = result
    expect(found!.held).toBe(400)
    expect(found!.first!).toBeLessThan(390)
    expect(found!.outcome).toBe('recovered')
    expect(found!.lowestFrequency.at).toBeGreaterThan(2)
    expect(found!.lowestFrequency.frequency).toBeLessThan(found!.settledFrequency!)
    expect(motors[0]!.running!.outcome.kind).toBe('rode-through')
    series.time.forEach((t, i) => {
      if (t < 2) expect(series.generator!.frequency[i]).toBe(50)
    })
  })

  it('from a generator to the network brings the frequency back to rated', () => {
    const supply = {
      busId: 'B',
      impedance: { re: ohm(0), im: ohm(1) },
      hold: { kind: 'bus-voltage' as const, voltage: volt(400) },
      motorsInLevel: [],
      generator: generator(),
    }
    const result = run([running('A')], transfer(0.3, network(0.009)), { supply })
    expect(result.outcome.kind).toBe('complete')
    expect(result.series.generator!.frequency.at(-1)).toBe(50)
    const plain = runCase(simplePlant([running('A')]))
    expect(result.motors[0]!.running!.settledSpeed).toBeCloseTo(plain.motors[0]!.running!.before.speed, 3)
  })
})

describe('the residual voltage at a transfer', () => {
  it('is a caution where the dead time is shorter than the stated decay, and where nobody states it', () => {
    expect(kinds(run([running('A')], transfer(0.3, network(0.01), 0.8)))).toContain('transfer-within-residual')
    expect(kinds(run([running('A')], transfer(0.9, network(0.01), 0.8)))).toEqual([])
    expect(kinds(run([running('A')], transfer(0.9, network(0.01))))).toContain('residual-voltage-not-modelled')
  })

  it('what cannot be is refused in words', () => {
    const detail = (disturbance: Disturbance) => {
      const { outcome } = run([running('A')], disturbance)
      return outcome.kind === 'refused' ? outcome.detail : ''
    }
    expect(detail({ ...transfer(1, network(0.01)), remaining: perUnit(0.5) })).toMatch(/none in between/)
    expect(detail(transfer(1, network(0)))).toMatch(/impedance above zero/)
  })
})

describe('limits on voltage at a transfer', () => {
  const limit = limitOn({ place: { kind: 'bus', busId: 'B' }, limit: { kind: 'value', value: 0.999 } })
  const margins = { ofLimit: perUnit(0.1), voltage: perUnit(0.01) }
  const word = (dead: number, decayTime?: number) => {
    const input = simplePlant([running('A')], 0.009, { disturbance: transfer(dead, network(0.01), decayTime) })
    const rule = { ...limit, instant: 'deepest' as const, limit: { kind: 'value' as const, value: 1.5 } }
    return judge(rule, input, runCase(input), { perDay: 1, perHour: 1 }, margins)
  }
  it('are not assessed while the residual voltage lasts, by the decay that is stated', () => {
    expect(word(0.3, 0.8)).toMatchObject({ word: 'not-assessed', reason: 'transient-only' })
    expect(word(0.9, 0.8)!.word).toBe('meets')
  })
})
