import { describe, expect, it } from 'vitest'
import type { CaseInput, MotorInput, StaticLoadInput } from '@/lib/engine/case-input'
import type { CaseResult } from '@/lib/engine/case-result'
import type { GeneratorInput } from '@/lib/engine/generator-input'
import { runCase } from '@/lib/engine/run-case'
import { ohm, perUnit, second, volt, voltAmpere } from '@/lib/units/si'
import { generator } from '../../support/generator'
import { simpleMotor, simplePlant, squareLoad, started } from '../../support/simple-plant'

const onGenerator = (set: GeneratorInput, motors: MotorInput[], changes: Partial<CaseInput> = {}): CaseInput =>
  simplePlant(motors, 0.009, {
    supply: {
      busId: 'B',
      impedance: { re: ohm(0), im: ohm(1) },
      hold: { kind: 'bus-voltage', voltage: volt(400) },
      motorsInLevel: [],
      generator: set,
    },
    ...changes,
  })
const small = () => simpleMotor('M', started({ kind: 'direct' }, squareLoad(900, 50)))
const atB = (result: CaseResult) => result.places[0]!
/** A machine that stands for a locked rotor of a power factor: torque too small to turn its load. */
function lockedRotor(power: number, factor: number): MotorInput {
  const size = 400 ** 2 / power
  const re = factor * size
  const im = Math.sqrt(1 - factor ** 2) * size
  return simpleMotor('M', started({ kind: 'direct' }, squareLoad(1e6, 1e6)), {
    circuit: {
      stator: { re: ohm(re / 2), im: ohm(im / 2) },
      magnetising: ohm(1e9),
      core: null,
      cages: [{ resistance: ohm(re / 2), reactance: ohm(im / 2) }],
    },
  })
}
const still = { regulator: null, governor: null, quadrature: null, subtransient: null }

describe('a generator of constant E′', () => {
  // Voltage divider of a 2000 kVA, 0.2 power factor locked rotor on a 1000 kVA set (computed by hand, two ways).
  it.each([
    [0.12, 0.809],
    [0.15, 0.772],
    [0.2, 0.7172],
    [0.25, 0.6697],
  ])('X′ %f gives the voltage %f at twice its rating', (transient, expected) => {
    const set = generator({ ...still, transient: ohm(0.16 * transient), transientTime: second(1e9) })
    const result = runCase(onGenerator(set, [lockedRotor(2e6, 0.2)]))
    expect(atB(result).first / 400).toBeCloseTo(expected, 4)
    expect(atB(result).deepest.voltage / 400).toBeCloseTo(expected, 4)
  })
})

/** Voltage in parts of that before, on a reactance of 1: E′_q and E″_q in small steps, all in parts of rating. */
function twoFields(until: number): number {
  let [slow, quick] = [1, 1]
  const rates = (e: number, q: number): [number, number] => {
    const current = q / (0.14 + 1)
    return [(1 - e - (2.4 - 0.2) * current) / 2.5, (e - q - (0.2 - 0.14) * current) / ((0.02 * 0.2) / 0.14)]
  }
  const steps = Math.ceil(until / 1e-3)
  const h = until / steps
  for (let i = 0; i < steps; i++) {
    const [a, b] = rates(slow, quick)
    const [c, d] = rates(slow + (h / 2) * a, quick + (h / 2) * b)
    const [e, f] = rates(slow + (h / 2) * c, quick + (h / 2) * d)
    const [g, k] = rates(slow + h * e, quick + h * f)
    slow += (h / 6) * (a + 2 * c + 2 * e + g)
    quick += (h / 6) * (b + 2 * d + 2 * f + k)
  }
  return quick / (0.14 + 1)
}

describe('the field of a generator without regulator', () => {
  it('decays with T′_d = T′_d0·(X′_d + X)/(X_d + X) on a reactance X', () => {
    const x = 0.16
    const set = generator(still)
    const result = runCase(
      onGenerator(set, [lockedRotor(1e6, 1e-9)], {
        settings: { speedCriterion: perUnit(0.98), timeLimit: second(6), tolerance: 1e-9 },
      }),
    )
    const [xd, xt] = [2.4 * 0.16, 0.2 * 0.16]
    const time = (2.5 * (xt + x)) / (xd + x)
    const [first, last] = [(400 * x) / (xt + x), (400 * x) / (xd + x)]
    const { time: t, busVoltage } = result.series
    const volts = busVoltage.B!
    expect(atB(result).first).toBeCloseTo(first, 4)
    let looked = 0
    t.forEach((at, i) => {
      if (i === 0 || at > 5) return
      looked++
      expect(volts[i]! / (last + (first - last) * Math.exp(-at / time))).toBeCloseTo(1, 5)
    })
    expect(looked).toBeGreaterThan(5)
  })

  it('begins behind X″_d and falls to the transient curve with T″_d', () => {
    const _x = 0.16
    const set = generator({ ...still, subtransient: { reactance: ohm(0.14 * 0.16), time: second(0.02) } })
    const result = runCase(onGenerator(set, [lockedRotor(1e6, 1e-9)]))
    expect(atB(result).first / 400).toBeCloseTo(1 / 1.14, 6)
    const { time, busVoltage } = result.series
    const late = time.map((t, i) => [t, busVoltage.B![i]!] as const).filter(([t]) => t > 0.01 && t < 3)
    expect(late.length).toBeGreaterThan(3)
    for (const [t, u] of late) expect(u / 400 / twoFields(t)).toBeCloseTo(1, 5)
  })
})

describe('frequency on a generator', () => {
  it('dips as a first-order governor with droop lets it, for a step of power', () => {
    // 2H·n′ = p_m − p, T·p_m′ = −(n − 1)/droop − p_m: a damped second-order step answer.
    const [h, droop, lag] = [1.2, 0.04, 0.3]
    const set = generator({
      ...still,
      transientTime: second(1e9),
      transient: ohm(1e-6),
      synchronous: ohm(1e-6),
      governor: generator().governor,
      inertia: second(h),
    })
    const result = runCase(onGenerator(set, [lockedRotor(3e3, 1 - 1e-12)]))
    const p = 0.003
    const w0 = Math.sqrt(1 / (2 * h * lag * droop))
    const z = 1 / (2 * lag) / w0
    const wd = w0 * Math.sqrt(1 - z * z)
    const end = -p * droop
    // n − 1 = end·(1 − e^(−zw0·t)(cos wd·t + c·sin wd·t)), begin slope −p/2H.
    const c = (z * w0 - p / (2 * h * -end)) / wd
    const n = (t: number) => end * (1 - Math.exp(-z * w0 * t) * (Math.cos(wd * t) + c * Math.sin(wd * t)))
    let least = 0
    for (let t = 0; t < 5; t += 1e-4) least = Math.min(least, n(t))
    expect((result.generator!.lowestFrequency.frequency / 50 - 1) / least).toBeCloseTo(1, 2)
    expect((result.generator!.settledFrequency! / 50 - 1) / end).toBeCloseTo(1, 2)
  })

  it('moves the reactances and the synchronous speed: the motor settles lower on a drooping set', () => {
    const stiff = runCase(onGenerator(generator({ governor: null }), [small()]))
    const droops = runCase(onGenerator(generator(), [small()]))
    const [a, b] = [stiff, droops].map((one) => one.motors[0]!.start!.settledSpeed!)
    const part = droops.generator!.settledFrequency! / 50
    expect(part).toBeLessThan(0.999)
    expect(b! / a!).toBeCloseTo(part, 3)
  })
})

describe('limiting cases of a generator', () => {
  it('the first instant is that of a network with the same reactance and voltage before', () => {
    const set = generator({ quadrature: null })
    const network = simplePlant([small()], 0.009, {
      supply: {
        busId: 'B',
        impedance: { re: ohm(0), im: ohm(0.14 * 0.16) },
        hold: { kind: 'bus-voltage', voltage: volt(400) },
        motorsInLevel: [],
      },
    })
    const [a, b] = [runCase(onGenerator(set, [small()])), runCase(network)]
    expect(atB(a).first).toBeCloseTo(atB(b).first, 6)
  })

  it('a huge set with a quick regulator is a stiff supply', () => {
    const huge = generator({ regulator: { ...generator().regulator!, gain: 30, time: second(0.02) } }, 1e9)
    const stiff = simplePlant([small()], 1e-6)
    const [a, b] = [runCase(onGenerator(huge, [small()])), runCase(stiff)]
    expect(a.outcome.kind).toBe('complete')
    expect(a.motors[0]!.start!.timeToCriterion! / b.motors[0]!.start!.timeToCriterion!).toBeCloseTo(1, 2)
    expect(a.places[0]!.deepest.voltage).toBeGreaterThan(399)
    expect(a.generator!.lowestFrequency.frequency).toBeGreaterThan(49.98)
  })

  it('with load in the quadrature axis the set stands still before the start', () => {
    const load: StaticLoadInput = {
      id: 'L',
      busId: 'B',
      power: { re: voltAmpere(400e3), im: voltAmpere(200e3) },
      ratedVoltage: volt(400),
      mix: { impedance: 1, current: 0, power: 0 },
      floor: perUnit(0.7),
    }
    const late = simpleMotor('M', started({ kind: 'direct' }, squareLoad(900, 50), 5))
    const result = runCase(onGenerator(generator(), [late], { loads: [load] }))
    const { time, busVoltage, generator: course } = result.series
    time.forEach((t, i) => {
      if (t >= 5) return
      expect(busVoltage.B![i]!).toBeCloseTo(400, 6)
      expect(course!.frequency[i]!).toBeCloseTo(50, 9)
    })
    expect(result.generator!.outcome).toBe('recovered')
    expect(result.places[0]!.settledAfterStart!).toBeGreaterThan(395)
  })
})

describe('what the regulator can do', () => {
  it('initial and sustained dip are two figures', () => {
    const { generator: found, places } = runCase(onGenerator(generator(), [small()]))
    expect(found!.first).toBe(places[0]!.first)
    expect(found!.lowest.voltage).toBeLessThan(found!.first!)
    expect(found!.sustained!).toBeGreaterThan(found!.lowest.voltage + 10)
    expect(found!.outcome).toBe('recovered')
  })

  it('a gain too high for its lags hunts, and is not called recovered', () => {
    const set = generator({ regulator: { ...generator().regulator!, gain: 150, reset: null } })
    const short = { settings: { speedCriterion: perUnit(0.98), timeLimit: second(5), tolerance: 1e-6 } }
    expect(runCase(onGenerator(set, [small()], short)).generator!.outcome).toBe('hunting')
  })

  it('a ceiling too low for the start leaves it unrecovered and is said', () => {
    const set = generator({
      regulator: { gain: 15, time: second(0.05), reset: second(1), ceiling: perUnit(1.3), fedFromTerminals: true },
    })
    const result = runCase(onGenerator(set, [lockedRotor(1.2e6, 0.2)]))
    expect(result.generator!.outcome).toBe('not-recovered')
    expect(result.notices.map(({ kind }) => kind)).toContain('excitation-at-ceiling')
    // E_fd at its ceiling 1.3·V behind X_d on X: V·(…) has the solution zero only where X_d + X exceeds 1.3·X.
    expect(result.generator!.sustained!).toBeLessThan(100)
  })

  it('a prime mover too small is overloaded and its frequency falls', () => {
    const set = generator({ governor: { ...generator().governor!, largestPower: 100e3 as never } })
    const result = runCase(onGenerator(set, [small()]))
    expect(result.notices.map(({ kind }) => kind)).toContain('prime-mover-overloaded')
    expect(result.generator!.lowestFrequency.frequency).toBeLessThan(48)
  })

  it('a set that cannot carry what runs before the start is refused in words', () => {
    const load: StaticLoadInput = {
      id: 'L',
      busId: 'B',
      power: { re: voltAmpere(1.2e6), im: voltAmpere(0) },
      ratedVoltage: volt(400),
      mix: { impedance: 1, current: 0, power: 0 },
      floor: perUnit(0.7),
    }
    const { outcome } = runCase(onGenerator(generator(), [small()], { loads: [load] }))
    expect(outcome).toMatchObject({ kind: 'refused', detail: expect.stringMatching(/prime mover/) })
  })
})
