import { describe, expect, it } from 'vitest'
import { speedCase } from '@/lib/cli/speed-case'
import type { CaseInput, Starter } from '@/lib/engine/case-input'
import { runCase } from '@/lib/engine/run-case'
import { kilogramSquareMetre, ohm, perUnit, radianPerSecond, second } from '@/lib/units/si'
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

const thirdOrder = (input: CaseInput): CaseInput => ({ ...input, model: { kind: 'third-order' } })
const both = (input: CaseInput) => [runCase(input), runCase(thirdOrder(input))] as const
const close = (figure: number, value: number, tolerance: number) =>
  expect(Math.abs(figure - value)).toBeLessThanOrEqual(tolerance * Math.abs(value))

describe('the third-order model', () => {
  it('says so in its result', () => {
    expect(both(simplePlant([simpleMotor('M', started())])).map(({ model }) => model)).toEqual([
      'quasi-static',
      'third-order',
    ])
  })

  it('runs a large inertia up in the time of the quasi-static model to one per cent, at the same voltages', () => {
    const motor = simpleMotor('M', started({ kind: 'direct' }, squareLoad(900)), {
      inertia: kilogramSquareMetre(60),
    })
    const [steady, moving] = both(simplePlant([motor]))
    close(moving.motors[0]!.start!.timeToCriterion!, steady.motors[0]!.start!.timeToCriterion!, 0.01)
    close(moving.places[0]!.settledAfterStart!, steady.places[0]!.settledAfterStart!, 1e-9)
    close(moving.motors[0]!.start!.i2t, steady.motors[0]!.start!.i2t, 0.01)
  })

  it('ends where the quasi-static model ends: the fluxes at rest are the steady circuit, core loss and deep bars included', () => {
    const circuit = {
      ...singleCage,
      core: ohm(40),
      deepBar: { law: 'linear' as const, resistance: ohm(0.02), reactance: ohm(0.05) },
    }
    const motor = simpleMotor('M', started({ kind: 'direct' }, squareLoad(1000)), { circuit })
    const [steady, moving] = both(simplePlant([motor]))
    close(moving.motors[0]!.speedAtEnd, steady.motors[0]!.speedAtEnd, 1e-6)
    const [a, b] = [steady, moving].map(({ series }) => series.motors.M!)
    close(b!.lineCurrent.at(-1)!, a!.lineCurrent.at(-1)!, 1e-3)
    close(b!.torque.at(-1)!, a!.torque.at(-1)!, 1e-3)
    close(b!.reactivePower.at(-1)!, a!.reactivePower.at(-1)!, 1e-3)
  })

  it('leaves running machines where they are until something happens, and lets them feed the dip at first', () => {
    const running = simpleMotor('R', { kind: 'running', load: constantLoad(1000) })
    const starting = simpleMotor('M', started({ kind: 'direct' }, squareLoad(900), 1))
    const [steady, moving] = both(simplePlant([running, starting]))
    const { time, motors } = moving.series
    time.forEach((t, i) => {
      if (t < 1) close(motors.R!.torque[i]!, 1000, 1e-6)
    })
    close(moving.places[0]!.before, steady.places[0]!.before, 1e-9)
    expect(moving.places[0]!.first).toBeGreaterThan(steady.places[0]!.first)
    close(moving.motors[0]!.running!.lowestSpeed.speed, steady.motors[0]!.running!.lowestSpeed.speed, 0.01)
  })

  it('runs up through a whole network one to three per cent slower than the quasi-static model, by the time its fluxes take', () => {
    for (const count of [0, 2]) {
      const [steady, moving] = both(speedCase(count))
      const ratio = moving.motors[0]!.start!.timeToCriterion! / steady.motors[0]!.start!.timeToCriterion!
      expect(ratio).toBeGreaterThan(1)
      expect(ratio).toBeLessThan(1.03)
      close(moving.places[2]!.deepest.voltage, steady.places[2]!.deepest.voltage, 0.01)
      // Looked at from a fifth of a second on: the swing of the fluxes leaves some per cent, and the shaft is on its way.
      const least =
        moving.motors[0]!.start!.leastAccelerating.torque / steady.motors[0]!.start!.leastAccelerating.torque
      expect(least).toBeGreaterThan(0.96)
      expect(least).toBeLessThan(1.06)
      expect(moving.counters.largestMismatch).toBeLessThan(1e-8)
    }
  })

  it.each([
    ['on a tap', autotransformer(0.65, { rpm: 1440 })],
    ['in star', { kind: 'star-delta', changeOver: { kind: 'speed', at: radianPerSecond(152) }, gap: second(0) }],
  ] satisfies [string, Starter][])(
    'shows %s the share of current that the quasi-static model does',
    (_name, starter) => {
      const motor = simpleMotor('M', started(starter, squareLoad(150)), { inertia: kilogramSquareMetre(30) })
      const [steady, moving] = both(simplePlant([motor], 0.003))
      const [a, b] = [steady, moving].map((result) => result.motors[0]!.start!)
      expect(b!.outcome.kind).toBe('started')
      close(b!.timeToCriterion!, a!.timeToCriterion!, 0.02)
      close(b!.i2t, a!.i2t, 0.02)
    },
  )

  it('stays at standstill where the load holds the shaft, drawing the locked-rotor current', () => {
    const [steady, moving] = both(simplePlant([simpleMotor('M', started({ kind: 'direct' }, constantLoad(5000)))]))
    expect(moving.motors[0]!.start!.outcome.kind).toBe('never-turned')
    close(moving.series.motors.M!.lineCurrent.at(-1)!, steady.motors[0]!.start!.standstill.lineCurrent, 0.02)
  })

  it('reclosing after an open transition draws by the residual voltage: more at opposition than the quasi-static model', () => {
    const starter = autotransformer(0.65, { rpm: 1470 }, 0.3)
    const motor = simpleMotor('M', started(starter, noLoad), { inertia: kilogramSquareMetre(6) })
    const [steady, moving] = both(simplePlant([motor], 0.003))
    const back = (result: typeof steady) => result.changeOvers.at(-1)!.state.lineCurrent
    expect(Math.abs(back(moving) / back(steady) - 1)).toBeGreaterThan(0.1)
  })

  it('balances energy: what crosses the airgap is kinetic energy, load and rotor heat', () => {
    const motor = simpleMotor('M', started(), { inertia: kilogramSquareMetre(30) })
    const { kineticEnergy, slipEnergy } = runCase(thirdOrder(simplePlant([motor], 0.003))).motors[0]!.start!
    // Without load the heat of the rotor is the kinetic energy of synchronous speed, less what is left to go.
    close(slipEnergy / kineticEnergy, (1 - (1 - (0.98 * 1480) / 1500) ** 2) / ((0.98 * 1480) / 1500) ** 2, 0.02)
  })

  it('keeps machines by curves, soft starters and drives as steady circuits', () => {
    const soft: Starter = {
      kind: 'soft-starter',
      ramp: { kind: 'voltage', from: perUnit(0.4), to: perUnit(1) },
      rampTime: second(5),
      currentLimit: null,
      kick: null,
      bypass: null,
    }
    const motor = simpleMotor('M', started(soft, squareLoad(300)))
    const [steady, moving] = both(simplePlant([motor], 0.003))
    close(moving.motors[0]!.start!.timeToCriterion!, steady.motors[0]!.start!.timeToCriterion!, 1e-6)
  })
})
