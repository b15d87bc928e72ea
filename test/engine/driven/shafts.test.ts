import { describe, expect, it } from 'vitest'
import type { LoadCurve, MotorInput } from '@/lib/engine/case-input'
import type { CaseResult, StartResult } from '@/lib/engine/case-result'
import { loadSegments, loadTorqueAt, pieceAt } from '@/lib/engine/driven/load-segments'
import { runCase } from '@/lib/engine/run-case'
import { kilogramSquareMetre, newtonMetre } from '@/lib/units/si'
import { fromRpm, toRpm } from '@/lib/units/speed'
import {
  autotransformer,
  constantLoad,
  simpleMotor,
  simplePlant,
  squareLoad,
  started,
} from '../../support/simple-plant'

const points = (list: readonly (readonly [rpm: number, torque: number])[], active = false): LoadCurve => ({
  kind: 'points',
  speeds: list.map(([rpm]) => fromRpm(rpm)),
  torques: list.map(([, torque]) => newtonMetre(torque)),
  active,
})

const run = (load: LoadCurve, changes: Partial<MotorInput> = {}, initialRpm = 0): CaseResult => {
  const duty = started({ kind: 'direct' }, load)
  const initialSpeed = fromRpm(initialRpm)
  return runCase(simplePlant([simpleMotor('M', duty.kind === 'starting' ? { ...duty, initialSpeed } : duty, changes)]))
}
const startIn = (result: CaseResult, i = 0): StartResult => result.motors[i]!.start!

describe('a pump against a static head', () => {
  const curve: LoadCurve = {
    kind: 'check-valve',
    friction: newtonMetre(20),
    shut: newtonMetre(500),
    ratedSpeed: fromRpm(1480),
    breakaway: { torque: newtonMetre(150), until: fromRpm(50) },
    opensAt: fromRpm(1200),
    speeds: [1300, 1480].map(fromRpm),
    torques: [520, 1100].map(newtonMetre),
  }

  it('follows the closed curve until its check valve opens, then its points', () => {
    const load = loadSegments(curve)
    const closed = (rpm: number) => 20 + 480 * (rpm / 1480) ** 2
    expect(loadTorqueAt(load, 0)).toBe(150)
    expect(loadTorqueAt(load, fromRpm(600))).toBeCloseTo(closed(600), 9)
    expect(loadTorqueAt(load, fromRpm(1200))).toBeCloseTo(closed(1200), 9)
    expect(loadTorqueAt(load, fromRpm(1250))).toBeCloseTo((closed(1200) + 520) / 2, 9)
    expect(loadTorqueAt(load, fromRpm(1390))).toBeCloseTo(810, 9)
  })

  it('starts as the same curve typed in fine points', () => {
    const load = loadSegments(curve)
    const fine = points(Array.from({ length: 301 }, (_, i) => [5 * i, loadTorqueAt(load, fromRpm(5 * i))] as const))
    const [one, two] = [startIn(run(curve)), startIn(run(fine))]
    expect(one.timeToCriterion! / two.timeToCriterion!).toBeCloseTo(1, 3)
  })
})

describe('a load of constant power', () => {
  it('falls with speed above the line from standstill', () => {
    const load = loadSegments({
      kind: 'power',
      constant: newtonMetre(0),
      atRated: newtonMetre(800),
      ratedSpeed: fromRpm(1480),
      exponent: -1,
      breakaway: { torque: newtonMetre(1600), until: fromRpm(740) },
    })
    expect(loadTorqueAt(load, 0)).toBe(1600)
    expect(loadTorqueAt(load, fromRpm(740))).toBeCloseTo(1600, 9)
    expect(loadTorqueAt(load, fromRpm(1480))).toBeCloseTo(800, 9)
    expect(loadTorqueAt(load, fromRpm(1000)) * fromRpm(1000)).toBeCloseTo(800 * fromRpm(1480), 6)
  })
})

describe('a passive load that turns backwards at switching on', () => {
  it('helps to stop and hinders to start: its torque turns with the motion', () => {
    const load = loadSegments(squareLoad(900, 100))
    expect(loadTorqueAt(load, -fromRpm(1480))).toBeCloseTo(-900, 9)
    expect(pieceAt(load, -1)).toBe(-1)
  })

  it('is braked to zero and started, which takes longer and heats more than from rest', () => {
    const [rest, backwards] = [run(squareLoad(900, 50)), run(squareLoad(900, 50), {}, -500)]
    const [a, b] = [startIn(rest), startIn(backwards)]
    expect(b.outcome.kind).toBe('started')
    expect(toRpm(b.standstill.speed)).toBeCloseTo(-500, 6)
    expect(b.timeToCriterion!).toBeGreaterThan(a.timeToCriterion!)
    expect(b.slipEnergy).toBeGreaterThan(a.slipEnergy)
    expect(b.settledSpeed).toBeCloseTo(a.settledSpeed!, 8)
  })

  it('stays at zero where the motor cannot start it from there', () => {
    const { outcome } = startIn(
      run(
        points([
          [0, 2600],
          [50, 300],
          [1500, 300],
        ]),
        {},
        -200,
      ),
    )
    expect(outcome.kind).toBe('stalled')
  })

  it('a flying start forwards is shorter than one from rest', () => {
    const [rest, flying] = [startIn(run(squareLoad(900, 50))), startIn(run(squareLoad(900, 50), {}, 700))]
    expect(flying.timeToCriterion!).toBeLessThan(rest.timeToCriterion!)
  })
})

describe('an active load', () => {
  it('runs the shaft backwards where the motor is too weak, through standstill and on', () => {
    // A loaded incline without a backstop: 1200 N·m at any speed, more than the motor has on half voltage.
    const incline = points(
      [
        [-1500, 1200],
        [1500, 1200],
      ],
      true,
    )
    const duty = started(autotransformer(0.4, { at: 1e3 }), incline)
    const result = runCase(simplePlant([simpleMotor('M', duty)]))
    expect(result.motors[0]!.speedAtEnd).toBeLessThan(0)
  })

  it('is held back in step where the motor has the torque', () => {
    const start = startIn(
      run(
        points(
          [
            [-1500, 300],
            [1500, 300],
          ],
          true,
        ),
      ),
    )
    expect(start.outcome.kind).toBe('started')
  })

  it('that helps (negative torque) brings the motor past synchronous speed as a generator', () => {
    const start = startIn(
      run(
        points(
          [
            [-100, -300],
            [1600, -300],
          ],
          true,
        ),
      ),
    )
    expect(toRpm(start.settledSpeed!)).toBeGreaterThan(1500)
  })

  it('that runs away ends the run instead of keeping a caller waiting', () => {
    const start = startIn(
      run(
        points(
          [
            [-800, 2000],
            [0, 1500],
            [1000, 1500],
          ],
          true,
        ),
      ),
    )
    expect(start.outcome.kind).toBe('timed-out')
    expect(start.outcome).toMatchObject({ speed: expect.any(Number) })
  })

  it('a back-spinning pump is braked from its reverse speed and started', () => {
    const pump = points(
      [
        [-900, 0],
        [0, 250],
        [400, 150],
        [1000, 400],
        [1480, 900],
      ],
      true,
    )
    const [back, rest] = [startIn(run(pump, {}, -600)), startIn(run(pump))]
    expect(back.outcome.kind).toBe('started')
    expect(back.timeToCriterion!).toBeGreaterThan(1.2 * rest.timeToCriterion!)
    expect(back.i2t).toBeGreaterThan(rest.i2t)
  })
})

describe('two motors on one shaft', () => {
  const twins = (at = 0, second = squareLoad(450, 25)) => [
    simpleMotor('A', started({ kind: 'direct' }, squareLoad(450, 25)), { shaft: 'S' }),
    simpleMotor('B', started({ kind: 'direct' }, second, at), { shaft: 'S' }),
  ]

  it('start together as one motor with half the load and inertia on a bus of half the impedance', () => {
    const pair = runCase(simplePlant(twins(), 0.009))
    const one = runCase(simplePlant([simpleMotor('M', started({ kind: 'direct' }, squareLoad(450, 25)))], 0.018))
    expect(startIn(pair).timeToCriterion).toBeCloseTo(startIn(one).timeToCriterion!, 6)
    expect(startIn(pair, 1).settledSpeed).toBeCloseTo(startIn(one).settledSpeed!, 8)
  })

  it('have one speed at every instant, also when one joins later', () => {
    const result = runCase(simplePlant(twins(1)))
    const { A, B } = result.series.motors
    A!.speed.forEach((speed, i) => {
      expect(B!.speed[i]).toBeCloseTo(speed, 9)
    })
    expect(startIn(result).outcome.kind).toBe('started')
    expect(startIn(result, 1).outcome.kind).toBe('started')
    expect(startIn(result, 1).standstill.speed).toBeGreaterThan(10)
  })

  it('share the load however it is laid to them', () => {
    const [even, uneven] = [
      runCase(simplePlant(twins())),
      runCase(
        simplePlant([
          simpleMotor('A', started({ kind: 'direct' }, squareLoad(900, 50)), { shaft: 'S' }),
          simpleMotor('B', started({ kind: 'direct' }, constantLoad(0)), {
            shaft: 'S',
            inertia: kilogramSquareMetre(6),
          }),
        ]),
      ),
    ]
    expect(startIn(uneven).timeToCriterion).toBeCloseTo(startIn(even).timeToCriterion!, 7)
  })

  it('run before the start at their common balance', () => {
    const running = (id: string, torque: number) =>
      simpleMotor(id, { kind: 'running', load: squareLoad(torque) }, { shaft: 'S' })
    const result = runCase(simplePlant([running('A', 1500), running('B', 100), simpleMotor('M', started())]))
    const [a, b] = result.motors.map(({ running: one }) => one!)
    expect(a!.before.speed).toBeCloseTo(b!.before.speed, 9)
    expect(a!.before.torque).toBeCloseTo(b!.before.torque, 6)
    expect(a!.outcome.kind).toBe('rode-through')
  })
})

describe('points a hair apart', () => {
  /** A jump of torque at 1000 r/min that the motor cannot pass. */
  const jump = (gapRpm: number, above: number) =>
    points([
      [0, 100],
      [1000, 200],
      [1000 + gapRpm, above],
      [1500, above],
    ])

  it('do not make the run-up step or flip without end', () => {
    for (const gap of [1e-6, 1e-4, 1e-2]) {
      const result = run(jump(gap, 5000))
      expect(result.outcome.kind).toBe('complete')
      expect(startIn(result).outcome.kind).toBe('stalled')
      expect(Math.abs(toRpm(startIn(result).settledSpeed!) - 1000)).toBeLessThan(1.5)
      expect(result.counters.steps).toBeLessThan(20_000)
    }
  })

  it('nor while another motor is still on its way', () => {
    const slow = simpleMotor('L', started({ kind: 'direct' }, constantLoad(0), 5), {
      inertia: kilogramSquareMetre(60),
    })
    const stuck = simpleMotor('M', started({ kind: 'direct' }, jump(1e-6, 5000)))
    const result = runCase(simplePlant([stuck, slow]))
    expect(startIn(result, 1).outcome.kind).toBe('started')
    expect(result.counters.steps).toBeLessThan(200_000)
  })

  it('change a run that passes them by next to nothing', () => {
    const [close, wide] = [startIn(run(jump(1e-6, 600))), startIn(run(jump(1, 600)))]
    expect(close.timeToCriterion! / wide.timeToCriterion!).toBeCloseTo(1, 3)
  })

  it('keep their order and their neighbours when they are spread', () => {
    const load = loadSegments(
      points([
        [0, 100],
        [1000, 200],
        [1000.000001, 800],
        [1000.1, 900],
        [1500, 900],
      ]),
    )
    expect([...load.corners].every((corner, i, all) => i === 0 || corner > all[i - 1]!)).toBe(true)
    expect(Math.abs(loadTorqueAt(load, fromRpm(990)) - 199)).toBeLessThan(0.3)
    expect(loadTorqueAt(load, fromRpm(1400))).toBeCloseTo(900, 9)
  })
})
