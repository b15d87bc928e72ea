import { describe, expect, it } from 'vitest'
import type { MotorInput, Starter } from '@/lib/engine/case-input'
import type { CaseResult, StartResult } from '@/lib/engine/case-result'
import { runCase } from '@/lib/engine/run-case'
import { ampere, newtonMetre, second, volt } from '@/lib/units/si'
import { fromRpm, toRpm } from '@/lib/units/speed'
import { constantLoad, simpleMotor, simplePlant, squareLoad, started, synchronous } from '../../support/simple-plant'
import { drive } from '../../support/starters'

const run = (duty: MotorInput['duty'], reactance = 0.009): CaseResult =>
  runCase(simplePlant([simpleMotor('M', duty)], reactance))
const startIn = (result: CaseResult): StartResult => result.motors[0]!.start!
const startBy = (starter: Starter, load = squareLoad(900, 50)): StartResult => startIn(run(started(starter, load)))
const targets = (result: CaseResult) => result.changeOvers.map(({ to }) => to)

describe('a variable-speed drive', () => {
  const load = squareLoad(1100, 30)

  it('brings the motor along its ramp and settles at its speed', () => {
    const result = run(started(drive(), load))
    const start = startIn(result)
    expect(start.outcome.kind).toBe('started')
    expect(start.timeToCriterion!).toBeCloseTo(9.8, 1)
    expect(toRpm(start.settledSpeed!)).toBeCloseTo(1480, 2)
    expect(start.peakMotorCurrent.current).toBeLessThan(400.001)
  })

  it('shows the supply shaft power plus losses at its own power factor; magnetising current stays behind', () => {
    const result = run(started(drive(), load))
    const { speed, torque, activePower, reactivePower, lineCurrent } = result.series.motors.M!
    const rated = 1290.4
    speed.forEach((omega, i) => {
      // The first sample is that before switching on.
      if (i === 0) return
      const share = torque[i]! / rated
      const expected = Math.max(0, torque[i]! * omega) + 14e3 * (0.1225 + 0.8775 * share ** 2)
      expect(activePower[i]! / expected).toBeCloseTo(1, 3)
      expect(reactivePower[i]! / activePower[i]!).toBeCloseTo(Math.tan(Math.acos(0.96)), 6)
    })
    expect(lineCurrent[1]!).toBeLessThan(0.2 * startIn(result).standstill.motorCurrent)
  })

  it('draws more current from a lower voltage, being near constant power', () => {
    const at = (voltage: number) => {
      const plant = simplePlant([simpleMotor('M', started(drive(), load))], 1e-5)
      plant.supply = { ...plant.supply, hold: { kind: 'emf', voltage: volt(voltage) } }
      return startIn(runCase(plant)).peakLineCurrent.current
    }
    expect(at(360) / at(400)).toBeCloseTo(400 / 360, 3)
  })

  it('keeps to its current limit: the run-up is longer, and a load above it never turns', () => {
    const weak = startBy(drive({ currentLimit: ampere(300), rampTime: second(2) }), load)
    const strong = startBy(drive({ currentLimit: ampere(600), rampTime: second(2) }), load)
    expect(weak.peakMotorCurrent.current).toBeLessThanOrEqual(300 + 1e-6)
    expect(weak.timeToCriterion!).toBeGreaterThan(strong.timeToCriterion!)
    expect(startBy(drive({ torqueLimit: newtonMetre(500) }), constantLoad(600)).outcome.kind).toBe('never-turned')
  })

  it('trips where the voltage falls below its level, coasts and says so', () => {
    const weak = run(started(drive({ undervoltage: volt(380) }), load), 0.12)
    expect(startIn(weak).outcome).toMatchObject({ kind: 'tripped', cause: 'undervoltage' })
    expect(targets(weak).at(-1)).toBe('off')
    expect(weak.series.motors.M!.lineCurrent.at(-1)).toBe(0)
  })

  it('has started by the speed that its ramp ends at, where that is below rated', () => {
    const start = startBy(drive({ speed: fromRpm(900), rampTime: second(6) }), load)
    expect(start.outcome.kind).toBe('started')
    expect(toRpm(start.settledSpeed!)).toBeCloseTo(900, 2)
    expect(start.timeToCriterion!).toBeCloseTo(0.98 * 6, 1)
  })

  it('goes over to the line where it has a bypass', () => {
    const result = run(started(drive({ bypass: { kind: 'speed', at: fromRpm(1475) } }), load))
    expect(targets(result)).toEqual(['running'])
    expect(startIn(result).settledSpeed!).toBeLessThan(synchronous)
    expect(startIn(result).outcome.kind).toBe('started')
  })

  it('meets a far smaller dip than the direct start', () => {
    const deepest = (starter: Starter) => run(started(starter, load)).places[0]!.deepest.voltage
    expect(400 - deepest(drive())).toBeLessThan(0.4 * (400 - deepest({ kind: 'direct' })))
  })
})
