import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { InductionCircuit, Starter } from '@/lib/engine/case-input'
import { evaluateMachine, machineTable } from '@/lib/engine/machines/machine-table'
import { connect, connections, disconnect, evaluateConnection } from '@/lib/engine/starters/connection'
import { hasGap, type Position, stepsOf } from '@/lib/engine/starters/position'
import { ohm, perUnit, second } from '@/lib/units/si'

const circuit: InductionCircuit = {
  stator: { re: ohm(0.3), im: ohm(3.5) },
  magnetising: ohm(93),
  core: ohm(1387),
  cages: [
    { resistance: ohm(0.32), reactance: ohm(6.4) },
    { resistance: ohm(1.74), reactance: ohm(3.2) },
  ],
}

const tap = (k: number, r = 0, x = 0): Starter => ({
  kind: 'autotransformer',
  tap: perUnit(k),
  impedance: { re: ohm(r), im: ohm(x) },
  changeOver: { kind: 'time', at: second(5) },
  gap: second(0.1),
})

const starDelta: Starter = { kind: 'star-delta', changeOver: { kind: 'time', at: second(5) }, gap: second(0.05) }

/** The connection of the machine at a slip, on a bus of 1 V. */
function at(starter: Starter, position: Position, slip = 1) {
  const machines = machineTable([circuit])
  const connection = connections(1)
  connect(connection, 0, stepsOf(starter).find((step) => step.position === position)!, 0, machine)
  evaluateMachine(machines, 0, slip)
  evaluateConnection(connection, machines, 0)
  const y = { re: machines.admittance[0]!, im: machines.admittance[1]! }
  return { y, line: { re: connection.admittance[0]!, im: connection.admittance[1]! }, connection }
}

const machine = { ratedTorque: 100, inertia: 2, ratedVoltage: 400 }
const positions = (starter: Starter) => stepsOf(starter).map((step) => step.position)

const size = ({ re, im }: { re: number; im: number }) => Math.hypot(re, im)

describe('a starting device', () => {
  it('begins on its tap, in star, or at once in the running position', () => {
    expect(positions({ kind: 'direct' })).toEqual(['running'])
    expect(positions(tap(0.65))).toEqual(['tap', 'open', 'running'])
    expect(positions(starDelta)).toEqual(['star', 'open', 'running'])
  })

  it('leaves its first position by its condition and the gap after its time; the running position is kept', () => {
    expect(stepsOf(starDelta).map(({ until }) => until)).toEqual([
      { kind: 'time', at: 5 },
      { kind: 'after', time: 0.05 },
      null,
    ])
    expect(hasGap({ kind: 'direct' })).toBe(false)
    expect(hasGap(tap(0.5))).toBe(true)
  })

  it('on an ideal tap k draws k² of the line current of the direct start and gives k² of the torque', () => {
    fc.assert(
      fc.property(fc.integer({ min: 30, max: 100 }), (percent) => {
        const k = percent / 100
        const { y, line, connection } = at(tap(k), 'tap')
        expect(size(line) / size(y)).toBeCloseTo(k * k, 10)
        expect(connection.winding[0]).toBeCloseTo(k * k, 10)
        expect(connection.terminal[0]).toBeCloseTo(k, 10)
        expect(connection.current[0]).toBeCloseTo(1 / k, 10)
      }),
    )
  })

  it('on a tap with own impedance keeps I_line = k·I_motor and U_motor = k(U − z·I_line)', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 40, max: 95 }),
        fc.integer({ min: 0, max: 200 }),
        fc.integer({ min: 1, max: 100 }),
        (percent, x, slip) => {
          const [k, zRe, zIm] = [percent / 100, x / 800, x / 100]
          const { y, line, connection } = at(tap(k, zRe, zIm), 'tap', slip / 100)
          // Star admittances at 1 V: the line current is y_line, the motor's is y·U_motor.
          const left = { re: 1 - (zRe * line.re - zIm * line.im), im: -(zRe * line.im + zIm * line.re) }
          const terminal = k * size(left)
          expect(connection.terminal[0]).toBeCloseTo(terminal, 10)
          expect(connection.winding[0]).toBeCloseTo(terminal ** 2, 10)
          expect(size(y) * terminal).toBeCloseTo(size(line) * connection.current[0]!, 10)
          expect(connection.current[0]).toBeCloseTo(1 / k, 10)
        },
      ),
    )
  })

  it('loses no power in an ideal tap: what the line gives, the motor takes', () => {
    const { y, line, connection } = at(tap(0.65), 'tap', 0.4)
    expect(line.re).toBeCloseTo(y.re * connection.terminal[0]! ** 2, 12)
    expect(line.im).toBeCloseTo(y.im * connection.terminal[0]! ** 2, 12)
  })

  it('in star draws a third of the current and gives a third of the torque at the same line voltage', () => {
    const { y, line, connection } = at(starDelta, 'star')
    expect(line.re).toBeCloseTo(y.re / 3, 12)
    expect(line.im).toBeCloseTo(y.im / 3, 12)
    expect(connection.winding[0]).toBeCloseTo(1 / 3, 12)
    expect(connection.terminal[0]).toBe(1)
    expect(connection.current[0]).toBe(1)
  })

  it('in the running position is not there', () => {
    for (const starter of [{ kind: 'direct' as const }, tap(0.65, 0.1, 0.6), starDelta]) {
      const { y, line, connection } = at(starter, 'running')
      expect(line).toEqual(y)
      expect(connection.winding[0]).toBe(1)
      expect(connection.terminal[0]).toBe(1)
      expect(connection.current[0]).toBe(1)
    }
  })

  it('draws nothing while off or open, also after it was on', () => {
    const machines = machineTable([circuit])
    const connection = connections(1)
    const steps = stepsOf(tap(0.65))
    evaluateMachine(machines, 0, 1)
    connect(connection, 0, steps[0]!, 0, machine)
    evaluateConnection(connection, machines, 0)
    expect(connection.admittance[0]).toBeGreaterThan(0)
    for (const position of ['open', 'off'] as const) {
      if (position === 'open') connect(connection, 0, steps[1]!, 0, machine)
      else disconnect(connection, 0)
      evaluateConnection(connection, machines, 0)
      expect([...connection.admittance]).toEqual([0, 0])
      expect(connection.winding[0]).toBe(0)
      expect(connection.terminal[0]).toBe(0)
    }
  })
})
