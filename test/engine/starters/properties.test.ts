import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Starter } from '@/lib/engine/case-input'
import type { StartResult } from '@/lib/engine/case-result'
import { runCase } from '@/lib/engine/run-case'
import { ampere, kilogramSquareMetre, ohm, perUnit, second } from '@/lib/units/si'
import { autotransformer, simpleMotor, simplePlant, squareLoad, started } from '../../support/simple-plant'
import { drive, reactor, rotorSteps, softStarter } from '../../support/starters'

const methods: Record<string, Starter> = {
  direct: { kind: 'direct' },
  'a tap': autotransformer(0.65, { rpm: 1400 }),
  star: { kind: 'star-delta', changeOver: { kind: 'time', at: second(20) }, gap: second(0) },
  'a reactor': reactor(0.03, 1400),
  'a resistor': {
    kind: 'resistor',
    impedance: { re: ohm(0.05), im: ohm(0) },
    changeOver: { kind: 'time', at: second(20) },
  },
  'a soft starter': softStarter(),
  'a soft starter with a limit': softStarter({ currentLimit: ampere(1100) }),
  'part winding': {
    kind: 'part-winding',
    currentShare: perUnit(0.65),
    torqueShare: perUnit(0.45),
    windingShare: perUnit(0.5),
    changeOver: { kind: 'time', at: second(20) },
  },
  'rotor resistance': rotorSteps([0.05, 1300]),
  'a drive': drive(),
}
const loaded = squareLoad(400, 20)

const run = (starter: Starter, reactance: number, inertia = 6) =>
  runCase(
    simplePlant([simpleMotor('M', started(starter, loaded), { inertia: kilogramSquareMetre(inertia) })], reactance),
  )
const startIn = (result: ReturnType<typeof run>): StartResult => result.motors[0]!.start!

const reactances = fc.integer({ min: 1, max: 300 }).map((x) => x / 1e4)

describe('any starting method', () => {
  for (const [name, starter] of Object.entries(methods)) {
    it(`by ${name}: a stiffer supply never dips deeper at standstill, and no first dip is below that of the direct start`, () => {
      fc.assert(
        fc.property(reactances, fc.integer({ min: 11, max: 30 }), (x, tenths) => {
          const first = (one: Starter, reactance: number) => run(one, reactance).places[0]!.first
          const [stiff, weak] = [first(starter, x), first(starter, (x * tenths) / 10)]
          expect(stiff).toBeGreaterThanOrEqual(weak - 1e-9)
          // Rotor resistance turns the current rather than lowering it, so that it may dip a little more on a resistive path.
          if (name !== 'rotor resistance')
            expect(first(starter, x)).toBeGreaterThanOrEqual(first({ kind: 'direct' }, x) - 1e-9)
        }),
        { numRuns: 12 },
      )
    })

    it(`by ${name}: more inertia never comes to speed sooner`, () => {
      fc.assert(
        fc.property(
          reactances,
          fc.integer({ min: 2, max: 20 }),
          fc.integer({ min: 11, max: 30 }),
          (x, inertia, tenths) => {
            const times = [inertia, (inertia * tenths) / 10].map((one) => startIn(run(starter, x, one)).timeToCriterion)
            if (times[0] !== null && times[1] !== null) expect(times[1]!).toBeGreaterThanOrEqual(times[0]! * (1 - 1e-7))
          },
        ),
        { numRuns: 12 },
      )
    })

    it(`by ${name}: line current, bus voltage and power fit together at every sample`, () => {
      const { series, places } = run(starter, 0.01)
      expect(places[0]!.before).toBeCloseTo(400, 9)
      const { lineCurrent, activePower, reactivePower } = series.motors.M!
      lineCurrent.forEach((current, i) => {
        const apparent = Math.hypot(activePower[i]!, reactivePower[i]!)
        // The whole current of a drive holds harmonics: displacement factor over total factor.
        const fundamental = name === 'a drive' ? (current * 0.93) / 0.96 : current
        expect(Math.sqrt(3) * series.busVoltage.B![i]! * fundamental).toBeCloseTo(apparent, 3)
      })
    })
  }

  it('that reduces voltage to a part k takes k of the current behind an impedance, k² on a tap, and k² of the torque', () => {
    const direct = startIn(run({ kind: 'direct' }, 1e-7)).standstill
    for (const name of ['a reactor', 'a resistor', 'a soft starter', 'a tap']) {
      const { motorVoltage, lineCurrent, torque } = startIn(run(methods[name]!, 1e-7)).standstill
      const k = motorVoltage / direct.motorVoltage
      expect(lineCurrent / direct.lineCurrent).toBeCloseTo(name === 'a tap' ? k ** 2 : k, 6)
      expect(torque / direct.torque).toBeCloseTo(k ** 2, 6)
    }
  })
})
