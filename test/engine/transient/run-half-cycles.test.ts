import { describe, expect, it } from 'vitest'
import type { InductionCircuit } from '@/lib/engine/case-input'
import { directTimeConstant } from '@/lib/engine/dynamic/machine-along'
import { createIntegrator } from '@/lib/engine/numeric/dormand-prince'
import { type HalfCycle, meanPower, meanSquareCurrent } from '@/lib/engine/transient/half-cycle'
import { readState, transientDerivative, transientMachine } from '@/lib/engine/transient/machine-equations'
import { type HalfCycleQuestion, runHalfCycles } from '@/lib/engine/transient/run-half-cycles'
import { transientStart } from '@/lib/engine/transient/transient-start'
import { ohm } from '@/lib/units/si'

// The 2250 hp machine of Krause, Wasynczuk, Sudhoff, Analysis of Electric Machinery (table from memory), 60 Hz, 4 poles.
const circuit: InductionCircuit = {
  stator: { re: ohm(0.029), im: ohm(0.226) },
  magnetising: ohm(13.04),
  core: null,
  cages: [{ resistance: ohm(0.022), reactance: ohm(0.226) }],
}
const supply = { impedance: { re: 0.01, im: 0.1 }, emf: 2300, frequency: 60 }
const machine = () => transientMachine(circuit, supply, 4, 0)
const free: HalfCycleQuestion = {
  loadTorque: () => 0,
  inertia: 63.87,
  from: 0,
  speeds: [],
  until: 1,
  kept: 0.1,
}

const halves = (question: Partial<HalfCycleQuestion>, of = machine()) => {
  const all: HalfCycle[] = []
  const run = runHalfCycles(of, { ...free, ...question }, (half) => {
    all.push({
      ...half,
      moments: half.moments.slice(),
      mean: { ...half.mean },
      torque: { ...half.torque },
    })
    return true
  })
  return { run, all }
}

describe('the transient model', () => {
  it('written in the stationary frame is the same to round-off', () => {
    const m = machine()
    const { base, poles, resistance, leakage, mutual } = m
    const [r, x] = [circuit.cages[0]!.resistance, circuit.cages[0]!.reactance]
    const [inertia, load] = [63.87, 500]
    const peak = Math.sqrt(2 / 3) * supply.emf
    // α and β: ψ_s' = ω_b(v − r·i_s), ψ_r' = ω_b(−r_r·i_r) + jω_r·ψ_r.
    const stationary = (t: number, y: Float64Array, dy: Float64Array): boolean => {
      const [sa, sb, ra, rb, speed] = y as unknown as [number, number, number, number, number]
      const [ma, mb] = [mutual * (sa / leakage + ra / x), mutual * (sb / leakage + rb / x)]
      const [ia, ib] = [(sa - ma) / leakage, (sb - mb) / leakage]
      const turning = (speed * poles) / 2
      dy[0] = base * (peak * Math.cos(base * t) - resistance * ia)
      dy[1] = base * (peak * Math.sin(base * t) - resistance * ib)
      dy[2] = (-base * r * (ra - ma)) / x - turning * rb
      dy[3] = (-base * r * (rb - mb)) / x + turning * ra
      dy[4] = ((0.75 * poles * (sa * ib - sb * ia)) / base - load) / inertia
      return true
    }
    const until = 0.25
    const scale = new Float64Array(5).fill(1e-11 * peak)
    scale[4] = 1e-11 * 188
    const run = (derivative: Parameters<typeof createIntegrator>[1]) => {
      const integrator = createIntegrator(new Float64Array(5), derivative, scale, 1e-3)
      integrator.restart(0, 0)
      while (integrator.time < until) integrator.advance(until)
      return integrator.state
    }
    const fixed = run(stationary)
    const turningFrame = run(transientDerivative(m, () => load, inertia))
    const reading = { q: 0, d: 0, torque: 0 }
    readState(m, turningFrame, reading)
    const [cos, sin] = [Math.cos(base * until), Math.sin(base * until)]
    // ψ = ψ_q − jψ_d, turned by the angle of the frame.
    expect((turningFrame[0]! * cos + turningFrame[1]! * sin) / peak).toBeCloseTo(fixed[0]! / peak, 9)
    expect((turningFrame[0]! * sin - turningFrame[1]! * cos) / peak).toBeCloseTo(fixed[1]! / peak, 9)
    expect((turningFrame[2]! * cos + turningFrame[3]! * sin) / peak).toBeCloseTo(fixed[2]! / peak, 9)
    expect(turningFrame[4]! / 188).toBeCloseTo(fixed[4]! / 188, 10)
  })

  it('by half periods has the peaks of the run that looks 192 times a period', () => {
    const { run } = halves({ until: 0.3 })
    const other = transientStart(machine(), { ...free, until: 0.3, whole: true })
    expect(run.peak.current / other.peakVector.current).toBeCloseTo(1, 4)
    expect(run.peakTorque.torque / other.peakTorque.torque).toBeCloseTo(1, 3)
    expect(run.lowestTorque.torque / other.lowestTorque.torque).toBeCloseTo(1, 3)
  })

  it('balances energy over a run-up: supply = kinetic energy + heat of stator, supply resistance and rotor', () => {
    const m = machine()
    const { all } = halves({ until: 4 }, m)
    const emf = { re: Math.sqrt(2 / 3) * supply.emf, im: 0, resistance: 0, reactance: 0 }
    const sum = (value: (half: HalfCycle) => number) =>
      all.reduce((total, half) => total + value(half) * (half.to - half.from), 0)
    const taken = sum((half) => meanPower(half, emf).active)
    const stator = sum((half) => 3 * m.resistance * meanSquareCurrent(half))
    const rotor = sum((half) => half.rotorLoss)
    const kinetic = (63.87 * all.at(-1)!.speed ** 2) / 2
    // What the field holds is a few parts in ten thousand of it.
    expect(taken / (stator + rotor + kinetic)).toBeCloseTo(1, 3)
    expect(rotor / kinetic).toBeGreaterThan(1)
  })

  it.each([
    ['5 per cent', 0.022, 0.05],
    ['half a per cent with a tenth of the rotor resistance', 0.0022, 0.005],
  ])(
    'the direct component of the current decays with (X_s + X_m‖X_r + X)/(ω_b(R_s + R)) to %s',
    (_name, resistance, off) => {
      const rotor = { resistance: ohm(resistance), reactance: ohm(0.226) }
      const m = transientMachine({ ...circuit, cages: [rotor] }, supply, 4, 0)
      const { all } = halves({ from: 60 * Math.PI, inertia: 1e9, until: 0.4 }, m)
      // Over whole periods; the rotor's own flux turns with the supply and has no mean.
      const direct = all
        .slice(1)
        .map((half, i) => Math.hypot(half.mean.re + all[i]!.mean.re, half.mean.im + all[i]!.mean.im) / 2)
      const [from, to] = [2, 14]
      const found = (to - from) / 120 / Math.log(direct[from]! / direct[to]!)
      expect(Math.abs(found / directTimeConstant(m) - 1)).toBeLessThan(off)
    },
  )

  it('has a peak current of 1.1 to 1.7 times the symmetrical peak and a peak torque of 2.5 to 9 times that of locked rotor', () => {
    // Ranges as the method of this study states them, from machines of 3 to 2250 hp.
    const stiff = transientMachine(circuit, { ...supply, impedance: { re: 0, im: 0 } }, 4, 0)
    const { run } = halves({ until: 0.5 }, stiff)
    // Locked rotor at 2300 V: 2944.4 A and 2932.98 N·m, as in the table of that machine recomputed.
    expect(Number((run.peak.current / (Math.SQRT2 * 2944.4)).toFixed(1))).toBeLessThanOrEqual(1.7)
    expect(run.peak.current / (Math.SQRT2 * 2944.4)).toBeGreaterThan(1.1)
    expect(run.peakTorque.torque / 2932.98).toBeGreaterThan(2.5)
    expect(run.peakTorque.torque / 2932.98).toBeLessThan(9)
  })
})
