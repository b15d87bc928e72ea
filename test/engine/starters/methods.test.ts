import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { MotorInput, Starter } from '@/lib/engine/case-input'
import type { CaseResult, StartResult } from '@/lib/engine/case-result'
import { runCase } from '@/lib/engine/run-case'
import type { ChangeOver } from '@/lib/engine/starter-input'
import { ampere, newtonMetre, ohm, perUnit, second, volt } from '@/lib/units/si'
import { fromRpm, toRpm } from '@/lib/units/speed'
import {
  autotransformer,
  constantLoad,
  noLoad,
  simpleMotor,
  simplePlant,
  singleCage,
  squareLoad,
  started,
} from '../../support/simple-plant'
import { reactor, rotorSteps, softStarter, startCapacitor, withCapacitors } from '../../support/starters'

const run = (duty: MotorInput['duty'], changes: Partial<MotorInput> = {}, reactance = 0.009): CaseResult =>
  runCase(simplePlant([simpleMotor('M', duty, changes)], reactance))
const startIn = (result: CaseResult): StartResult => result.motors[0]!.start!
const startBy = (starter: Starter, load = squareLoad(900, 50), reactance = 0.009): StartResult =>
  startIn(run(started(starter, load), {}, reactance))
const targets = (result: CaseResult) => result.changeOvers.map(({ to }) => to)

describe('a series reactor', () => {
  it('draws less, gives torque by the square of what is left, and is bypassed at its speed', () => {
    const direct = startBy({ kind: 'direct' })
    const result = run(started(reactor(0.03, 1400), squareLoad(900, 50)))
    const start = startIn(result)
    const share = start.standstill.motorVoltage / direct.standstill.motorVoltage
    expect(start.standstill.torque / direct.standstill.torque).toBeCloseTo(share ** 2, 8)
    expect(start.standstill.lineCurrent / direct.standstill.lineCurrent).toBeCloseTo(share, 8)
    expect(targets(result)).toEqual(['running'])
    expect(toRpm(result.changeOvers[0]!.speed)).toBeCloseTo(1400, 3)
    expect(start.outcome.kind).toBe('started')
  })

  it('is bypassed when the current has fallen or the motor’s voltage has risen to a level, at that very level', () => {
    const at = (changeOver: ChangeOver) => {
      const result = run(
        started({ kind: 'reactor', impedance: { re: ohm(0), im: ohm(0.03) }, changeOver }, squareLoad(900, 50)),
      )
      const { time, motors } = result.series
      // The sample just before the change-over: the first of two at one instant.
      const before = time.findIndex((t, i) => i > 1 && t === time[i + 1])
      return { result, series: motors.M!, before }
    }
    const byCurrent = at({ kind: 'current', below: ampere(700) })
    expect(byCurrent.series.lineCurrent[byCurrent.before]).toBeCloseTo(700, 3)
    const byVoltage = at({ kind: 'voltage', above: volt(330) })
    expect(byVoltage.series.motorVoltage[byVoltage.before]).toBeCloseTo(330, 4)
    for (const { result } of [byCurrent, byVoltage]) expect(startIn(result).outcome.kind).toBe('started')
  })

  it('stays in, and the start hangs, where the motor never reaches the condition', () => {
    const { outcome } = startBy(reactor(0.12, 1495), squareLoad(700, 50))
    expect(outcome.kind).toBe('not-transferred')
    const byCurrent = startBy(
      { kind: 'reactor', impedance: { re: ohm(0), im: ohm(0.12) }, changeOver: { kind: 'current', below: ampere(20) } },
      squareLoad(700, 50),
    )
    expect(byCurrent.outcome.kind).toBe('not-transferred')
  })

  it('bypassed at once when its condition is met from the beginning, and that is too early', () => {
    const result = run(
      started(
        {
          kind: 'reactor',
          impedance: { re: ohm(0), im: ohm(0.12) },
          changeOver: { kind: 'current', below: ampere(1e5) },
        },
        squareLoad(700, 50),
      ),
    )
    expect(result.changeOvers[0]!.at).toBeLessThan(1e-6)
    expect(result.changeOvers[0]!.tooEarly).toBe(true)
    expect(result.notices).toContainEqual({ kind: 'change-over-too-early', motorId: 'M' })
  })
})

describe('an autotransformer with a middle step', () => {
  const korndoerfer = (middle: number): Starter => ({
    ...(autotransformer(0.65, { rpm: 1400 }) as Extract<Starter, { kind: 'autotransformer' }>),
    middle: { impedance: { re: ohm(0), im: ohm(middle) }, time: second(0.4) },
  })

  it('goes from the tap behind the series part and then to the line, never without voltage', () => {
    const result = run(started(korndoerfer(0.2), squareLoad(900, 50)))
    expect(targets(result)).toEqual(['middle', 'running'])
    expect(result.changeOvers[1]!.at - result.changeOvers[0]!.at).toBeCloseTo(0.4, 9)
    expect(result.changeOvers[0]!.state.torque).toBeGreaterThan(0)
    expect(result.notices.some(({ kind }) => kind === 'open-transition-without-transient')).toBe(false)
  })

  it('softens the transfer: less current just after it than without the step', () => {
    const direct = run(started(autotransformer(0.65, { rpm: 1400 }), squareLoad(900, 50)))
    const stepped = run(started(korndoerfer(0.2), squareLoad(900, 50)))
    const largest = (result: CaseResult) => Math.max(...result.changeOvers.map(({ state }) => state.lineCurrent))
    expect(largest(stepped)).toBeLessThan(largest(direct))
  })
})

describe('a star-delta starter with transition resistors', () => {
  it('never leaves the motor without voltage', () => {
    const result = run(
      started(
        {
          kind: 'star-delta',
          changeOver: { kind: 'speed', at: fromRpm(1350) },
          gap: second(0),
          transition: { resistance: ohm(1), time: second(0.1) },
        },
        squareLoad(300, 20),
      ),
    )
    expect(targets(result)).toEqual(['middle', 'running'])
    expect(Math.min(...result.series.motors.M!.torque.slice(1))).toBeGreaterThan(0)
  })
})

describe('a soft starter', () => {
  it('conserves active power and passes one current: the line sees R_m and a larger reactance', () => {
    fc.assert(
      fc.property(fc.integer({ min: 30, max: 99 }), (percent) => {
        const from = perUnit(percent / 100)
        const start = startBy(softStarter({ ramp: { kind: 'voltage', from, to: perUnit(1) } }), constantLoad(3000))
        const { lineCurrent, motorCurrent, motorVoltage, power, powerFactor } = start.standstill
        expect(lineCurrent).toBeCloseTo(motorCurrent, 8)
        const busVoltage = Math.hypot(power.re, power.im) / (Math.sqrt(3) * lineCurrent)
        expect(motorVoltage / busVoltage).toBeCloseTo(from, 8)
        // R_m at standstill from the circuit at rest.
        const direct = startBy({ kind: 'direct' }, constantLoad(3000)).standstill
        const resistance = direct.power.re / (3 * direct.lineCurrent ** 2)
        expect(power.re).toBeCloseTo(3 * lineCurrent ** 2 * resistance, 3)
        expect(powerFactor).toBeLessThan(direct.powerFactor)
      }),
      { numRuns: 20 },
    )
  })

  it('that lets the whole voltage through is a direct start', () => {
    const whole = startBy(
      softStarter({ ramp: { kind: 'voltage', from: perUnit(1), to: perUnit(1) }, rampTime: second(0) }),
    )
    const direct = startBy({ kind: 'direct' })
    expect(whole.timeToCriterion).toBeCloseTo(direct.timeToCriterion!, 9)
    expect(whole.i2t / direct.i2t).toBeCloseTo(1, 9)
  })

  it('holds its current limit in the network, from the ramp on until the motor asks for less', () => {
    const start = startBy(softStarter({ currentLimit: ampere(1100) }), squareLoad(500, 20), 0.02)
    expect(start.peakLineCurrent.current).toBeCloseTo(1100, 4)
    expect(start.outcome.kind).toBe('started')
  })

  it('is in its running position once it conducts fully; before that nothing has started', () => {
    const result = run(started(softStarter({ rampTime: second(15) }), squareLoad(500, 20)))
    const start = startIn(result)
    expect(start.timeToCriterion!).toBeLessThan(8)
    expect(start.outcome).toEqual({ kind: 'started', at: expect.closeTo(15, 4) })
    expect(targets(result)).toEqual(['running'])
  })

  it('hangs below full voltage where its limit leaves too little torque, and says so', () => {
    const { outcome } = startBy(softStarter({ currentLimit: ampere(600) }), constantLoad(500))
    expect(outcome.kind).toBe('never-turned')
    const crawling = startBy(softStarter({ currentLimit: ampere(900) }), squareLoad(1250, 10))
    expect(crawling.outcome.kind).toBe('not-transferred')
  })

  it('breaks a load away with its kick, which ends after its time', () => {
    const ramp = { kind: 'voltage', from: perUnit(0.3), to: perUnit(0.6) } as const
    const load = constantLoad(250)
    const without = startBy(softStarter({ ramp }), load)
    const result = run(started(softStarter({ ramp, kick: { voltage: perUnit(0.8), time: second(0.3) } }), load))
    const { series } = result
    expect(without.standstill.torque).toBeLessThan(250)
    expect(series.motors.M!.speed[series.time.findIndex((t) => t > 0.25)]!).toBeGreaterThan(0)
    expect(result.changeOvers[0]).toMatchObject({ to: 'ramp', at: expect.closeTo(0.3, 9) })
  })

  it('on a torque ramp develops the torque asked for until it lets everything through', () => {
    const ramp = { kind: 'torque', from: newtonMetre(100), to: newtonMetre(700) } as const
    const result = run(started(softStarter({ ramp, rampTime: second(10) }), squareLoad(300, 20)))
    const { time, motors } = result.series
    for (let i = 1; i < time.length && time[i]! < 4; i++) {
      expect(motors.M!.torque[i]!).toBeCloseTo(100 + (600 * time[i]!) / 10, 2)
    }
    expect(startIn(result).outcome.kind).toBe('started')
  })

  it('runs a longer time on a longer ramp', () => {
    const times = [2, 5, 10, 20].map((ramp) => startBy(softStarter({ rampTime: second(ramp) })).timeToCriterion!)
    expect([...times].sort((a, b) => a - b)).toEqual(times)
  })
})

describe('part winding, rotor resistance and captive transformer', () => {
  it('part winding takes the stated shares of current and torque, then the whole winding', () => {
    const starter: Starter = {
      kind: 'part-winding',
      currentShare: perUnit(0.65),
      torqueShare: perUnit(0.45),
      windingShare: perUnit(0.5),
      changeOver: { kind: 'time', at: second(2) },
    }
    const stiff = (one: Starter) => startBy(one, noLoad, 1e-7)
    const [part, direct] = [stiff(starter), stiff({ kind: 'direct' })]
    expect(part.standstill.lineCurrent / direct.standstill.lineCurrent).toBeCloseTo(0.65, 5)
    expect(part.standstill.torque / direct.standstill.torque).toBeCloseTo(0.45, 5)
  })

  it('heats half a winding four times as much an A²s as the whole', () => {
    const declared = {
      lockedRotorCurrent: ampere(1800),
      lockedRotorTorque: newtonMetre(1000),
      permissibleTime: { time: second(10), state: 'hot' as const },
    }
    const starter: Starter = {
      kind: 'part-winding',
      currentShare: perUnit(0.65),
      torqueShare: perUnit(0.45),
      windingShare: perUnit(0.5),
      changeOver: { kind: 'speed', at: fromRpm(1460) },
    }
    const start = startIn(run(started(starter, noLoad), { declared }))
    expect(start.outcome.kind).toBe('started')
    expect(start.heatUsed.byCurrent! * 1800 ** 2 * 10).toBeGreaterThan(3.9 * start.i2t)
    expect(start.heatUsed.byCurrent! * 1800 ** 2 * 10).toBeLessThan(4 * start.i2t + 1)
  })

  it('rotor steps go one after the other and leave the motor as it is without them', () => {
    const result = run(started(rotorSteps([0.12, 900], [0.04, 1300]), constantLoad(900)))
    const start = startIn(result)
    expect(targets(result)).toEqual(['rotor', 'running'])
    expect(result.changeOvers.map(({ speed }) => Math.round(toRpm(speed)))).toEqual([900, 1300])
    const direct = startBy({ kind: 'direct' }, constantLoad(300))
    expect(start.outcome.kind).toBe('started')
    expect(startBy(rotorSteps([0.12, 900]), constantLoad(300)).settledSpeed).toBeCloseTo(direct.settledSpeed!, 9)
  })

  it('most of the slip heat of a start with rotor steps falls outside the motor', () => {
    const [inside, without] = [
      startBy(rotorSteps([0.0925, 1350]), noLoad, 1e-7),
      startBy({ kind: 'direct' }, noLoad, 1e-7),
    ]
    // Without load the whole rotor circuit takes the kinetic energy; a tenth of it or so falls in the rotor up to the step.
    const slip = 1 - (0.98 * 1480) / 1500
    const whole = (1 - slip ** 2) / (1 - slip) ** 2
    expect(without.slipEnergy / without.kineticEnergy).toBeCloseTo(whole, 4)
    expect(inside.slipEnergy / inside.kineticEnergy).toBeLessThan(0.15 * whole)
  })

  it('rotor resistance moves the breakdown slip and not the breakdown torque', () => {
    const peak = (starter: Starter) => Math.max(...run(started(starter, noLoad), {}, 1e-7).series.motors.M!.torque)
    const rotorOnly = { ...singleCage, stator: { re: ohm(1e-9), im: ohm(0.06) } }
    const of = (ohms: number) =>
      Math.max(
        ...runCase(
          simplePlant([simpleMotor('M', started(rotorSteps([ohms, 1480]), noLoad), { circuit: rotorOnly })], 1e-7),
        ).series.motors.M!.torque.filter((_, i, all) => i < all.length - 1),
      )
    expect(of(0.03) / of(0.06)).toBeCloseTo(1, 3)
    expect(peak(rotorSteps([0.03, 1480]))).toBeGreaterThan(0)
  })

  it('a captive transformer is the same as that transformer in the network', () => {
    const impedance = { re: ohm(0.02), im: ohm(0.3) }
    const motor = simpleMotor('M', started({ kind: 'captive-transformer', ratio: perUnit(0.4), impedance }), {})
    const captive = simplePlant([motor], 0.05)
    captive.buses = [{ id: 'B', nominal: volt(1000) }]
    captive.supply = { ...captive.supply, hold: { kind: 'emf', voltage: volt(1000) } }
    const apart = {
      ...captive,
      buses: [...captive.buses, { id: 'S', nominal: volt(400) }],
      // Impedance on the to side there, on the bus side here.
      transformers: [
        {
          id: 'T',
          fromBusId: 'B',
          toBusId: 'S',
          ratio: 2.5,
          impedance: { re: ohm(0.02 / 6.25), im: ohm(0.3 / 6.25) },
        },
      ],
      motors: [{ ...motor, busId: 'S', duty: started() }],
    }
    const [one, two] = [runCase(captive), runCase(apart)]
    expect(startIn(one).timeToCriterion).toBeCloseTo(startIn(two).timeToCriterion!, 6)
    expect(startIn(one).standstill.motorVoltage).toBeCloseTo(startIn(two).standstill.motorVoltage, 8)
    expect(startIn(one).standstill.lineCurrent).toBeCloseTo(0.4 * startIn(two).standstill.lineCurrent, 8)
    expect(one.places[0]!.deepest.voltage).toBeCloseTo(two.places[0]!.deepest.voltage, 8)
  })
})

describe('a start with capacitors', () => {
  it('draws the reactive current from them and drops them at their speed', () => {
    const duty = started({ kind: 'direct' }, squareLoad(900, 50))
    const [plain, helped] = [run(duty), run(withCapacitors(duty, startCapacitor(300)))]
    expect(startIn(helped).standstill.lineCurrent).toBeLessThan(startIn(plain).standstill.lineCurrent)
    expect(startIn(helped).standstill.motorCurrent).toBeGreaterThan(startIn(plain).standstill.motorCurrent)
    expect(helped.places[0]!.first).toBeGreaterThan(plain.places[0]!.first)
    expect(targets(helped)).toEqual(['capacitor-out'])
    expect(toRpm(helped.changeOvers[0]!.speed)).toBeCloseTo(1450, 3)
    expect(startIn(helped).settledSpeed).toBeCloseTo(startIn(plain).settledSpeed!, 8)
  })

  it('switches steps off one after the other, by voltage as well', () => {
    const duty = started({ kind: 'direct' }, squareLoad(900, 50))
    const result = run(
      withCapacitors(
        duty,
        startCapacitor(200, { off: { kind: 'voltage', above: volt(385) } }),
        startCapacitor(100, { off: { kind: 'time', at: second(20) } }),
        startCapacitor(50, { on: { kind: 'time', at: second(0.5) }, off: null }),
      ),
    )
    expect(targets(result)).toEqual(['capacitor-in', 'capacitor-out', 'capacitor-out'])
    expect(result.changeOvers[1]!.busVoltages[0]!).toBeLessThan(385)
    expect(result.changeOvers[2]!.at).toBeCloseTo(20, 9)
  })

  it('that stay in lift the voltage after the start above what it was before', () => {
    const result = run(withCapacitors(started(), startCapacitor(400, { off: null })))
    expect(result.places[0]!.highest.voltage).toBeGreaterThan(result.places[0]!.before)
  })
})
