import { describe, expect, it } from 'vitest'
import type { CaseInput, MotorInput } from '@/lib/engine/case-input'
import type { StartOutcome } from '@/lib/engine/case-result'
import { runCase } from '@/lib/engine/run-case'
import { kilogramSquareMetre, ohm, perUnit, radianPerSecond, second, volt, voltAmpere } from '@/lib/units/si'
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
  synchronous,
} from '../../support/simple-plant'

const outcomeOf = (input: CaseInput, motor = 0): StartOutcome => runCase(input).motors[motor]!.start!.outcome

/** A machine with a saddle: strong at standstill, weak between, strong at breakdown. */
const saddled: Partial<MotorInput> = {
  circuit: {
    stator: { re: ohm(0.006), im: ohm(0.05) },
    magnetising: ohm(2.1),
    core: null,
    cages: [
      { resistance: ohm(0.005), reactance: ohm(0.17) },
      { resistance: ohm(0.5), reactance: ohm(0.02) },
    ],
  },
}

describe('a start', () => {
  it('has started when the speed criterion is reached on the running connection', () => {
    const outcome = outcomeOf(simplePlant([simpleMotor('M', started({ kind: 'direct' }, squareLoad(900)))]))
    expect(outcome.kind).toBe('started')
  })

  it('on a tap has started at the change-over when that comes after the criterion', () => {
    const motor = simpleMotor('M', started(autotransformer(0.7, { at: 12 }), squareLoad(500)))
    const result = runCase(simplePlant([motor]))
    const { outcome, timeToCriterion } = result.motors[0]!.start!
    expect(timeToCriterion).toBeLessThan(12)
    expect(outcome).toEqual({ kind: 'started', at: 12 })
  })

  it('counts its times from its own switching-on', () => {
    const at = (instant: number) =>
      runCase(simplePlant([simpleMotor('M', started({ kind: 'direct' }, squareLoad(900), instant))])).motors[0]!.start!
    expect(at(7).switchedOnAt).toBe(7)
    expect(at(7).timeToCriterion).toBeCloseTo(at(0).timeToCriterion!, 9)
    expect(at(7).peakLineCurrent.at).toBeCloseTo(at(0).peakLineCurrent.at + 7, 6)
  })

  it('is never turning when the load holds the shaft, and says what is missing', () => {
    const motor = simpleMotor('M', started(autotransformer(0.5, { rpm: 1400 }), constantLoad(900)))
    const result = runCase(simplePlant([motor]))
    const { outcome, standstill, lowestMotorVoltage, settledSpeed } = result.motors[0]!.start!
    expect(outcome.kind).toBe('never-turned')
    expect(outcome.kind === 'never-turned' && outcome.missing).toBeCloseTo(900 - standstill.torque, 6)
    expect(result.motors[0]!.speedAtEnd).toBe(0)
    expect(settledSpeed).toBe(0)
    expect(lowestMotorVoltage.voltage).toBe(standstill.motorVoltage)
    expect(result.outcome).toEqual({ kind: 'complete' })
  })

  it('turns once the change-over by time gives it the torque', () => {
    const motor = simpleMotor('M', started(autotransformer(0.5, { at: 3 }), constantLoad(300)))
    const result = runCase(simplePlant([motor]))
    const { outcome, timeTo95 } = result.motors[0]!.start!
    expect(outcome.kind).toBe('started')
    expect(timeTo95).toBeGreaterThan(3)
    const { time, motors } = result.series
    const resting = motors.M!.speed.filter((_, i) => time[i]! < 3)
    expect(Math.max(...resting)).toBe(0)
  })

  it('is not transferred when it hangs on its tap below the change-over speed', () => {
    const motor = simpleMotor('M', started(autotransformer(0.6, { rpm: 1480 }), squareLoad(1100)))
    const result = runCase(simplePlant([motor]))
    const { outcome, settledSpeed } = result.motors[0]!.start!
    expect(outcome.kind).toBe('not-transferred')
    const speed = outcome.kind === 'not-transferred' ? outcome.speed : radianPerSecond(0)
    expect(toRpm(speed)).toBeLessThan(1480)
    expect(settledSpeed).toBeCloseTo(speed, 3)
    expect(result.changeOvers).toEqual([])
    expect(result.places[0]!.settledAfterStart).toBeNull()
    expect(result.places[0]!.settledAfterProcess).toBeNull()
  })

  it('runs below the criterion when the load leaves it more slip than that', () => {
    const input = simplePlant([simpleMotor('M', started({ kind: 'direct' }, squareLoad(1400)))], 0.009, {
      settings: { speedCriterion: perUnit(1.005), timeLimit: second(60), tolerance: 1e-8 },
    })
    const outcome = outcomeOf(input)
    expect(outcome.kind).toBe('below-criterion')
    const slip = 1 - (outcome.kind === 'below-criterion' ? outcome.speed : 0) / synchronous
    expect(slip).toBeGreaterThan(0)
    expect(slip).toBeLessThan(0.1)
  })

  it('stalls in the saddle of its torque curve, with the torque that is missing to go on', () => {
    const motor = simpleMotor('M', started({ kind: 'direct' }, constantLoad(900)), saddled)
    const result = runCase(simplePlant([motor], 0.001))
    const { outcome } = result.motors[0]!.start!
    expect(outcome.kind).toBe('stalled')
    if (outcome.kind !== 'stalled') return
    expect(toRpm(outcome.speed)).toBeGreaterThan(300)
    expect(toRpm(outcome.speed)).toBeLessThan(1400)
    expect(outcome.missing).toBeGreaterThan(0)
    const lighter = simpleMotor('M', started({ kind: 'direct' }, constantLoad(900 - 1.01 * outcome.missing)), saddled)
    const heavier = simpleMotor('M', started({ kind: 'direct' }, constantLoad(900 - 0.97 * outcome.missing)), saddled)
    expect(outcomeOf(simplePlant([lighter], 0.001)).kind).toBe('started')
    expect(outcomeOf(simplePlant([heavier], 0.001)).kind).toBe('stalled')
  })

  it('passes a saddle that is all but closed, however slowly, and is not taken for stalled', () => {
    const motor = simpleMotor('M', started({ kind: 'direct' }, constantLoad(900)), saddled)
    const hang = outcomeOf(simplePlant([motor], 0.001))
    const missing = hang.kind === 'stalled' ? hang.missing : 0
    const just = simpleMotor('M', started({ kind: 'direct' }, constantLoad(900 - missing - 1)), saddled)
    expect(outcomeOf(simplePlant([just], 0.001)).kind).toBe('started')
  })

  it('is given up at the time limit while it still gains speed', () => {
    const motor = simpleMotor('M', started({ kind: 'direct' }, squareLoad(900)), { inertia: kilogramSquareMetre(400) })
    const input = simplePlant([motor], 0.009, {
      settings: { speedCriterion: perUnit(0.98), timeLimit: second(5), tolerance: 1e-8 },
    })
    const result = runCase(input)
    const { outcome, timeToCriterion } = result.motors[0]!.start!
    expect(outcome.kind).toBe('timed-out')
    expect(timeToCriterion).toBeNull()
    expect(result.series.time.at(-1)).toBeLessThanOrEqual(15)
  })

  it('that comes to a halt again has stalled at rest', () => {
    // Half a second after M a heavy machine N is switched on and takes the voltage that M needs.
    const motor = simpleMotor('M', started({ kind: 'direct' }, constantLoad(200)), { inertia: kilogramSquareMetre(20) })
    const other = simpleMotor('N', started({ kind: 'direct' }, noLoad, 0.5), { inertia: kilogramSquareMetre(1000) })
    const result = runCase(simplePlant([motor, other], 0.05))
    const { outcome } = result.motors[0]!.start!
    expect(outcome).toMatchObject({ kind: 'stalled', speed: 0 })
    expect(result.motors[0]!.speedAtEnd).toBe(0)
  })
})

describe('a load that all but holds the shaft', () => {
  // A running machine slows down in the dip and takes the voltage that made the shaft stir.
  const beside = simpleMotor('R', { kind: 'running', load: constantLoad(1100) }, { inertia: kilogramSquareMetre(20) })
  const withLoad = (torque: number) =>
    runCase(simplePlant([beside, simpleMotor('M', started({ kind: 'direct' }, constantLoad(torque)))], 0.03))
  const standstill = withLoad(1).motors[1]!.start!.standstill.torque

  it('lets it stir and come to rest again, without end neither of steps nor of switchings', () => {
    for (const part of [1 - 1e-3, 1 - 1e-6, 1 - 1e-9, 1]) {
      const result = withLoad(part * standstill)
      const { outcome } = result.motors[1]!.start!
      expect(['stalled', 'never-turned']).toContain(outcome.kind)
      expect(result.motors[1]!.speedAtEnd).toBe(0)
      expect(result.counters.steps).toBeLessThan(1000)
    }
  })

  it('holds it when the torque is a hair too small', () => {
    expect(withLoad(standstill * (1 + 1e-9)).motors[1]!.start!.outcome.kind).toBe('never-turned')
  })

  it('lets it go when the voltage comes back', () => {
    // N starts at the same time, light and unloaded; once it is up the voltage rises and M breaks away.
    const light = simpleMotor('N', started(), { inertia: kilogramSquareMetre(2) })
    const held = simpleMotor('M', started({ kind: 'direct' }, constantLoad(250)))
    const result = runCase(simplePlant([light, held], 0.04))
    const { time, motors } = result.series
    const stirs = time[motors.M!.speed.findIndex((speed) => speed > 0)]!
    expect(stirs).toBeGreaterThan(0.05)
    expect(result.motors[1]!.start!.outcome.kind).toBe('started')
  })
})

describe('a running machine', () => {
  const running = (load: MotorInput['duty']['load'], changes: Partial<MotorInput> = {}) =>
    simpleMotor('R', { kind: 'running', load }, changes)

  it('rides through a dip that leaves it enough torque, and comes back to its speed', () => {
    const result = runCase(simplePlant([running(constantLoad(800)), simpleMotor('M', started())], 0.02))
    const { outcome, before, lowestSpeed, settledSpeed } = result.motors[0]!.running!
    expect(outcome).toEqual({ kind: 'rode-through' })
    expect(lowestSpeed.speed).toBeLessThan(before.speed)
    expect(settledSpeed).toBeCloseTo(before.speed, 0)
  })

  it('is pulled out by a dip that does not, stands still exactly and stays connected', () => {
    const heavy = simpleMotor('M', started(), { inertia: kilogramSquareMetre(40) })
    const result = runCase(simplePlant([running(constantLoad(1400)), heavy], 0.05))
    const { outcome, lowestSpeed, peakCurrent } = result.motors[0]!.running!
    expect(outcome.kind).toBe('pulled-out')
    expect(lowestSpeed.speed).toBe(0)
    expect(result.motors[0]!.speedAtEnd).toBe(0)
    expect(peakCurrent.current).toBeGreaterThan(1000)
    const { speed, lineCurrent } = result.series.motors.R!
    expect(Math.min(...speed)).toBe(0)
    expect(lineCurrent.at(-1)).toBeGreaterThan(1000)
  })

  it('that slows down past its breakdown speed and recovers rode through', () => {
    const brief = simpleMotor('M', started(), { inertia: kilogramSquareMetre(1) })
    const result = runCase(simplePlant([running(constantLoad(1100), { inertia: kilogramSquareMetre(3) }), brief], 0.07))
    const { outcome, lowestSpeed } = result.motors[0]!.running!
    const breakdown = synchronous * (1 - 0.074)
    expect(lowestSpeed.speed).toBeLessThan(breakdown)
    expect(outcome).toEqual({ kind: 'rode-through' })
  })

  it('without a balance of torques before the start leaves no case, and is named', () => {
    const result = runCase(simplePlant([running(constantLoad(6000)), simpleMotor('M', started())]))
    expect(result.outcome).toEqual({ kind: 'no-load-flow', busId: 'B' })
    expect(result.places).toEqual([])
    expect(result.motors).toHaveLength(1)
    expect(result.motors[0]!.running!.outcome).toEqual({ kind: 'no-equilibrium' })
  })
})

const constantPower = (busId: string, p: number) => ({
  id: `L${busId}`,
  busId,
  power: { re: voltAmpere(p), im: voltAmpere(p / 3) },
  ratedVoltage: volt(400),
  mix: { impedance: 0, current: 0, power: 1 },
  floor: perUnit(0),
})

describe('a network', () => {
  it('without a solution before the start gives no case', () => {
    const result = runCase(simplePlant([simpleMotor('M', started())], 0.05, { loads: [constantPower('B', 2e6)] }))
    expect(result.outcome).toEqual({ kind: 'no-load-flow', busId: 'B' })
    expect(result.series.time).toEqual([])
  })

  it('that collapses at the switching-on says so, with instant and bus and no number', () => {
    const result = runCase(
      simplePlant([simpleMotor('M', started({ kind: 'direct' }, noLoad, 2))], 0.05, {
        loads: [constantPower('B', 9e5)],
      }),
    )
    expect(result.outcome).toEqual({ kind: 'collapsed', at: 2, busId: 'B' })
    expect(result.places).toEqual([])
    expect(result.motors).toEqual([])
  })

  it('that collapses on the way keeps what went before', () => {
    // The running machine slows down in the dip and draws the network over the edge.
    const result = runCase(
      simplePlant(
        [
          simpleMotor('R', { kind: 'running', load: constantLoad(1100) }, { inertia: kilogramSquareMetre(30) }),
          simpleMotor('M', started(), { inertia: kilogramSquareMetre(30) }),
        ],
        0.06,
        { loads: [constantPower('B', 5e5)] },
      ),
    )
    expect(result.outcome.kind).toBe('collapsed')
    const at = result.outcome.kind === 'collapsed' ? result.outcome.at : 0
    expect(at).toBeGreaterThan(0.01)
    expect(result.places[0]!.deepest.at).toBeLessThanOrEqual(at)
    expect(result.places[0]!.settledAfterStart).toBeNull()
    expect(result.series.time.at(-1)).toBeCloseTo(at, 2)
  })

  it('with loads that turn to impedance below their floor says so instead of collapsing', () => {
    const load = { ...constantPower('B', 9e5), floor: perUnit(0.7) }
    const result = runCase(simplePlant([simpleMotor('M', started())], 0.05, { loads: [load] }))
    expect(result.outcome).toEqual({ kind: 'complete' })
    expect(result.notices).toContainEqual({ kind: 'load-below-floor', loadId: 'LB', at: 0 })
  })

  it('without a motor is a load flow', () => {
    const result = runCase(simplePlant([], 0.02, { loads: [constantPower('B', 2e5)] }))
    expect(result.outcome).toEqual({ kind: 'complete' })
    expect(result.places[0]!.before).toBeLessThan(400)
    expect(result.places[0]!.first).toBe(result.places[0]!.before)
    expect(result.places[0]!.deepest).toEqual({ voltage: result.places[0]!.before, at: 0 })
    expect(result.supply!.powerBefore.re).toBeCloseTo(2e5, 3)
    expect(result.supply!.powerFirst).toBeNull()
  })
})

describe('an open transition', () => {
  it('leaves the motor without torque for the gap, to be slowed down by its load', () => {
    const motor = simpleMotor('M', started(autotransformer(0.7, { rpm: 1200 }, 0.2), constantLoad(120)))
    const result = runCase(simplePlant([motor]))
    const [open, closed] = result.changeOvers
    expect(open).toMatchObject({ to: 'open', motorId: 'M' })
    expect(closed!.at - open!.at).toBeCloseTo(0.2, 9)
    // dω/dt = −120/6 for 0.2 s.
    expect(open!.speed - closed!.speed).toBeCloseTo((120 / 6) * 0.2, 6)
    expect(toRpm(open!.speed)).toBeCloseTo(1200, 6)
    expect(open!.busVoltages[0]).toBeCloseTo(400, 6)
  })

  it('does not count as want of accelerating torque', () => {
    const motor = simpleMotor('M', started(autotransformer(0.8, { rpm: 1200 }, 0.1), squareLoad(400)))
    expect(runCase(simplePlant([motor])).motors[0]!.start!.leastAccelerating.torque).toBeGreaterThan(0)
  })

  it('is too early when it closes above breakdown slip', () => {
    const at = (rpm: number) => {
      const motor = simpleMotor('M', started(autotransformer(0.7, { rpm }, 0.01), squareLoad(400)))
      return runCase(simplePlant([motor])).changeOvers.at(-1)!.tooEarly
    }
    expect(at(1200)).toBe(true)
    expect(at(1450)).toBe(false)
    // Breakdown slip of the circuit alone: R_r/√(R_th² + (X_th + X_r)²).
    expect(singleCage.cages[0]!.resistance / 0.1247).toBeCloseTo(0.0742, 3)
  })
})

describe('several starts', () => {
  it('may lie far apart in time: nothing moves between them', () => {
    const motors = [
      simpleMotor('M', started({ kind: 'direct' }, squareLoad(900))),
      simpleMotor('N', started({ kind: 'direct' }, squareLoad(900), 3600)),
    ]
    const result = runCase(simplePlant(motors, 0.02))
    expect(result.motors.map(({ start }) => start!.outcome.kind)).toEqual(['started', 'started'])
    expect(result.counters.steps).toBeLessThan(1500)
    const settled = runCase(simplePlant(motors.slice(0, 1), 0.02)).motors[0]!.start!.settledSpeed!
    const { time, motors: series } = result.series
    const before = time.findLastIndex((t, i) => t === 3600 && time[i + 1] === 3600)
    expect(series.M!.speed[before]).toBeCloseTo(settled, 6)
  })

  it('at one instant share the dip', () => {
    const together = runCase(
      simplePlant(
        [
          simpleMotor('M', started({ kind: 'direct' }, squareLoad(900))),
          simpleMotor('N', started({ kind: 'direct' }, squareLoad(900))),
        ],
        0.01,
      ),
    )
    const alone = runCase(simplePlant([simpleMotor('M', started({ kind: 'direct' }, squareLoad(900)))], 0.01))
    expect(together.places[0]!.first).toBeLessThan(alone.places[0]!.first)
    expect(together.motors[0]!.start!.timeToCriterion).toBeCloseTo(together.motors[1]!.start!.timeToCriterion!, 9)
  })

  it('meet the settled plant in the process state of all of them', () => {
    const motor = (id: string, at: number): MotorInput => {
      const base = simpleMotor(id, started({ kind: 'direct' }, squareLoad(300), at))
      if (base.duty.kind !== 'starting') throw new Error('not started')
      return { ...base, duty: { ...base.duty, processLoad: squareLoad(1200) } }
    }
    const [place] = runCase(simplePlant([motor('M', 0), motor('N', 8)], 0.01)).places
    expect(place!.settledAfterProcess!).toBeLessThan(place!.settledAfterStart!)
    const loaded = runCase(simplePlant([motor('M', 0)], 0.01)).motors[0]!.start!
    expect(loaded.settledSpeed! / fromRpm(1500)).toBeGreaterThan(0.99)
  })
})
