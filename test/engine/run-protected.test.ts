import { describe, expect, it } from 'vitest'
import type { CaseInput, MotorInput } from '@/lib/engine/case-input'
import type { StartResult } from '@/lib/engine/case-result'
import { judge } from '@/lib/engine/criteria/judge'
import type { RuleInput, RuleQuantity } from '@/lib/engine/criteria/rule'
import { inverseTime } from '@/lib/engine/protection/inverse-curve'
import type { RelayElement } from '@/lib/engine/protection-input'
import { runCase } from '@/lib/engine/run-case'
import { runProtected } from '@/lib/engine/run-protected'
import { runWithVariants } from '@/lib/engine/run-variants'
import { ampere, newtonMetre, perUnit, second } from '@/lib/units/si'
import { constantLoad, simpleMotor, simplePlant, squareLoad, started } from '../support/simple-plant'

const element = (multiplier: number, pickUp = 500): RelayElement => ({
  kind: 'inverse',
  curve: 'extremely-inverse',
  pickUp: ampere(pickUp),
  multiplier,
  reset: null,
})

const thermal = {
  cold: second(20),
  hot: second(12),
  limits: [],
  coolingRunning: second(1200),
  coolingStopped: second(3600),
}

const motor = (elements: readonly RelayElement[], changes: Partial<MotorInput> = {}): MotorInput =>
  simpleMotor('M', started({ kind: 'direct' }, squareLoad(900)), {
    declared: {
      lockedRotorCurrent: ampere(2100),
      lockedRotorTorque: newtonMetre(1700),
      permissibleTime: { time: second(12), state: 'hot' },
      thermal,
    },
    protection: { measures: 'motor', elements },
    ...changes,
  })

const plant = (one: MotorInput): CaseInput => simplePlant([one], 0.004)
const startOf = (input: CaseInput): StartResult => runProtected(input).motors[0]!.start!
const rule = (quantity: RuleQuantity, limit: number): RuleInput => ({
  id: 'r',
  place: { kind: 'starting-motors' },
  quantity,
  instant: 'deepest',
  reference: 'rated',
  limit: { kind: 'value', value: limit },
  appliesTo: { caseIds: null, methods: null, motorIds: null },
  startClass: null,
})
const verdict = (input: CaseInput, quantity: RuleQuantity, limit: number) =>
  judge(
    rule(quantity, limit),
    input,
    runProtected(input),
    { perDay: 1, perHour: 1 },
    { ofLimit: perUnit(0.1), voltage: perUnit(0.01) },
  )!

const withoutRelay = plant(motor([]))
const free = runCase(withoutRelay).motors[0]!.start!
const runUp = free.outcome.kind === 'started' ? free.outcome.at : Number.NaN

describe('a start under its relay', () => {
  it('is the start without it where nothing operates, with its margin', () => {
    const input = plant(motor([element(1)]))
    const { protection, heatBalance: _, ...own } = startOf(input)
    expect(own).toEqual(free)
    const [one] = protection!.elements
    expect(one!.operatesAt).toBeNull()
    expect(protection!.startedAt).toBeCloseTo(runUp, 9)
    expect(protection!.tripMargin).toBe(one!.least!.time)
    // Current at standstill, were it to stay, less what has gone by is close to it: the current is nearly steady.
    const held = inverseTime('extremely-inverse', free.standstill.motorCurrent / 500)!
    expect(protection!.lockedRotor.trip).toBeCloseTo(held, 9)
    expect(protection!.tripMargin).toBeLessThan(held)
    expect(protection!.tripMargin).toBeGreaterThan(held - runUp)
  })

  it('has less margin by an independent sum over its own curve', () => {
    const input = plant(motor([element(1)]))
    const { series, motors } = runProtected(input)
    const currents = series.motors.M!.motorCurrent
    let travelled = 0
    let least = Number.POSITIVE_INFINITY
    const steps = 20_000
    const at = (t: number): number => {
      const k = Math.min(
        series.time.length - 2,
        Math.max(
          0,
          series.time.findLastIndex((one) => one <= t),
        ),
      )
      const [a, b] = [series.time[k]!, series.time[k + 1]!]
      return currents[k]! + ((currents[k + 1]! - currents[k]!) * (t - a)) / (b - a || 1)
    }
    for (let k = 0; k <= steps; k++) {
      const time = inverseTime('extremely-inverse', at((runUp * k) / steps) / 500)
      if (time === null) continue
      least = Math.min(least, (1 - travelled) * time)
      travelled += runUp / steps / time
    }
    expect(motors[0]!.start!.protection!.tripMargin! / least).toBeCloseTo(1, 3)
  })

  it('is tripped where its element operates first, and the run goes on without the motor', () => {
    const input = plant(motor([element(0.05)]))
    const result = runProtected(input)
    const { outcome, protection } = result.motors[0]!.start!
    expect(outcome).toMatchObject({ kind: 'tripped', cause: 'protection' })
    const at = outcome.kind === 'tripped' ? outcome.at : Number.NaN
    expect(at).toBeCloseTo(protection!.elements[0]!.operatesAt!, 12)
    expect(protection!.tripMargin).toBeCloseTo(at - runUp, 9)
    expect(result.series.motors.M!.motorCurrent.at(-1)).toBe(0)
    expect(result.places[0]!.settledAfterStart).toBeNull()
  })

  it('keeps its outcome where it stalls, with the instant at which the relay will operate', () => {
    const stuck = motor([element(1)], { duty: started({ kind: 'direct' }, constantLoad(9000)) })
    const { outcome, protection } = startOf(plant(stuck))
    expect(outcome.kind).toBe('never-turned')
    expect(protection!.elements[0]!.operatesAt).toBeCloseTo(protection!.lockedRotor.trip!, 6)
    expect(protection!.tripMargin).toBeNull()
  })

  it('never comes closer to a trip when the time multiplier grows', () => {
    const margins = [0.8, 1, 1.5, 3].map(
      (multiplier) => startOf(plant(motor([element(multiplier)]))).protection!.tripMargin!,
    )
    expect(margins).toEqual(margins.toSorted((a, b) => a - b))
  })
})

describe('limits on margins', () => {
  it('hold the time to a trip, and fail where the relay is first or the start never comes', () => {
    const margin = startOf(plant(motor([element(1)]))).protection!.tripMargin!
    expect(verdict(plant(motor([element(1)])), 'trip-margin', margin / 2)).toMatchObject({
      word: 'meets',
      value: margin,
    })
    expect(verdict(plant(motor([element(1)])), 'trip-margin', margin * 2).word).toBe('fails')
    expect(verdict(plant(motor([element(0.05)])), 'trip-margin', 0.1).word).toBe('fails')
    const stuck = motor([element(1)], { duty: started({ kind: 'direct' }, constantLoad(9000)) })
    expect(verdict(plant(stuck), 'trip-margin', 0.1).word).toBe('fails')
  })

  it('hold permissible locked-rotor time less time to trip, at the voltage of the start', () => {
    const input = plant(motor([element(1)]))
    const { current, trip, permissible, margin } = startOf(input).protection!.lockedRotor
    // 12 s at 2100 A, I²t at what this supply gives.
    expect(permissible).toBeCloseTo(12 * (2100 / current) ** 2, 9)
    expect(margin).toBeCloseTo(permissible! - trip!, 12)
    expect(verdict(input, 'thermal-margin', margin! / 2).word).toBe('meets')
    expect(verdict(input, 'thermal-margin', margin! * 2).word).toBe('fails')
  })

  it('are not assessed without a relay, without a pick-up or without the permissible time', () => {
    const bare = simplePlant([simpleMotor('M', started({ kind: 'direct' }, squareLoad(900)))], 0.004)
    expect(verdict(bare, 'trip-margin', 1)).toMatchObject({ word: 'not-assessed', reason: 'no-protection' })
    const high = plant(motor([element(1, 9000)]))
    expect(verdict(high, 'trip-margin', 1)).toMatchObject({ word: 'not-assessed', reason: 'no-pick-up' })
    // A held rotor that nothing takes off fails.
    expect(verdict(high, 'thermal-margin', 1).word).toBe('fails')
    const declared = { lockedRotorCurrent: null, lockedRotorTorque: null, permissibleTime: null }
    expect(verdict(plant(motor([element(1)], { declared })), 'thermal-margin', 1)).toMatchObject({
      word: 'not-assessed',
      reason: 'not-declared',
    })
  })
})

describe('attempts with a memory of their heat', () => {
  const repeated = (elements: readonly RelayElement[], rest: number, heat: Partial<typeof thermal> = {}): CaseInput =>
    plant(
      motor(elements, {
        duty: {
          ...(started({ kind: 'direct' }, squareLoad(900)) as Extract<MotorInput['duty'], { kind: 'starting' }>),
          attempts: [{ runFor: second(runUp + 1), rest: second(rest) }],
        },
        declared: {
          lockedRotorCurrent: ampere(2100),
          lockedRotorTorque: newtonMetre(1700),
          permissibleTime: { time: second(20), state: 'cold' },
          thermal: { ...thermal, ...heat },
        },
      }),
    )
  const image = (): RelayElement => {
    // Heated to six tenths by one start from cold.
    const share = 0.6
    return {
      kind: 'thermal-image',
      heating: second(((free.standstill.motorCurrent / 300) ** 2 * runUp) / share),
      cooling: second(1800),
      lasting: ampere(300),
      before: ampere(0),
      inhibit: perUnit(0.7),
    }
  }

  it('carry what the rest leaves into the next start and its heat used', () => {
    const { motors } = runProtected(repeated([], 600))
    const [first, last] = [motors[0]!.earlierAttempts![0]!, motors[0]!.start!]
    expect(first.heatBalance!.before).toBe(0)
    expect(last.heatBalance!.before).toBeGreaterThan(0.8 * first.heatBalance!.after)
    expect(last.heatBalance!.before).toBeLessThan(first.heatBalance!.after)
    expect(last.heatUsed.withEarlier).toBeCloseTo(last.heatBalance!.after, 12)
    expect(last.heatUsed.withEarlier!).toBeGreaterThan(1.5 * last.heatUsed.figure!)
    const longer = runProtected(repeated([], 3000)).motors[0]!.start!
    expect(longer.heatBalance!.before).toBeLessThan(last.heatBalance!.before)
  })

  it('are tripped by the thermal image where the rest is too short', () => {
    const soon = runProtected(repeated([image()], 10)).motors[0]!
    expect(soon.earlierAttempts![0]!.outcome.kind).toBe('started')
    expect(soon.start!.outcome).toMatchObject({ kind: 'tripped', cause: 'protection' })
    expect(soon.start!.protection!.elements[0]!.heat!.before).toBeGreaterThan(0.4)
    const later = runProtected(repeated([image()], 3600)).motors[0]!
    expect(later.start!.outcome.kind).toBe('started')
    expect(later.start!.protection!.elements[0]!.heat!.before).toBeLessThan(0.2)
  })

  it('are not released above the inhibit level, with the rest that is missing', () => {
    const eager = { ...image(), inhibit: perUnit(0.3) } as RelayElement
    const { protection } = runProtected(repeated([eager], 10)).motors[0]!.start!
    const [one] = protection!.elements
    expect(one!.inhibitedFor).toBeCloseTo(1800 * Math.log(one!.heat!.before / 0.3), 9)
    expect(verdict(repeated([eager], 10), 'trip-margin', 0.1).word).toBe('fails')
  })

  it('ends an attempt early where the relay operates, and keeps the instant of the next', () => {
    const { motors } = runProtected(repeated([element(0.05)], 30))
    const [first, last] = [motors[0]!.earlierAttempts![0]!, motors[0]!.start!]
    expect(first.outcome).toMatchObject({ kind: 'tripped', cause: 'protection' })
    expect(last.switchedOnAt).toBeCloseTo(runUp + 31, 9)
    expect(last.outcome).toMatchObject({ kind: 'tripped', cause: 'protection' })
  })
})

describe('a start under its relay by the fifth-order model', () => {
  const fifth = (elements: readonly RelayElement[]) =>
    runWithVariants({ ...plant(motor(elements)), model: { kind: 'fifth-order', switchingAngle: null } })

  it('has the margin of its own current, which lasts longer and is higher at first', () => {
    const result = fifth([element(1)])
    const own = result.motors[0]!.start!
    expect(result.model).toBe('fifth-order')
    const steady = startOf(plant(motor([element(1)])))
    expect(own.protection!.startedAt).toBeCloseTo(own.timeToCriterion!, 9)
    expect(own.protection!.tripMargin!).toBeLessThan(steady.protection!.tripMargin!)
  })

  it('ends where the relay operates though the quasi-static start gets through', () => {
    // Between the two run-ups: a multiplier at which the steady start has some hundredths of a second left.
    const multipliers = Array.from({ length: 400 }, (_, k) => 1 - k / 400)
    const last = multipliers.findLast((each) => startOf(plant(motor([element(each)]))).outcome.kind === 'started')!
    const result = fifth([element(last)])
    expect(result.motors[0]!.start!.outcome).toMatchObject({ kind: 'tripped', cause: 'protection' })
  })

  it('is left to the quasi-static model where that one is tripped already', () => {
    expect(fifth([element(0.001)]).notices).toContainEqual({ kind: 'transient-model-unfit', cause: 'trip' })
  })
})

describe('what a reader must know of a relay', () => {
  it('is a stage without delay below the first cycles of a direct start', () => {
    const stage = (pickUp: number, delay: number): RelayElement => ({
      kind: 'definite',
      pickUp: ampere(pickUp),
      delay: second(delay),
    })
    const noticed = (element_: RelayElement) =>
      runWithVariants(plant(motor([element_]))).notices.filter(({ kind }) => kind === 'stage-below-offset')
    const rms = free.peakMotorCurrent.current
    expect(noticed(stage(1.1 * rms, 0.02))).toMatchObject([{ motorId: 'M', pickUp: 1.1 * rms }])
    expect(noticed(stage(2 * rms, 0.02))).toEqual([])
    expect(noticed(stage(1.1 * rms, 0.3))).toEqual([])
  })

  it('is a running current above the setting, by the instant at which it will trip', () => {
    const input = plant(motor([element(60, 100)]))
    const { protection, outcome, settledSpeed } = startOf(input)
    expect(outcome.kind).toBe('started')
    expect(settledSpeed).not.toBeNull()
    expect(protection!.elements[0]!.operatesAt!).toBeGreaterThan(protection!.startedAt!)
    expect(protection!.tripMargin!).toBeGreaterThan(0)
  })
})
