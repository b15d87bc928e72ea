import { describe, expect, it } from 'vitest'
import type { InductionCircuit } from '@/lib/engine/case-input'
import { evaluateMachine, machineTable } from '@/lib/engine/machines/machine-table'
import { residualDecayTime } from '@/lib/engine/machines/residual-voltage'
import { cagesOf, createRotorFluxes } from '@/lib/engine/machines/rotor-flux'
import { createIntegrator } from '@/lib/engine/numeric/dormand-prince'
import { ohm } from '@/lib/units/si'
import { singleCage } from '../../support/simple-plant'

const base = 100 * Math.PI
const double: InductionCircuit = {
  ...singleCage,
  core: ohm(30),
  cages: [
    { resistance: ohm(0.009), reactance: ohm(0.09) },
    { resistance: ohm(0.04), reactance: ohm(0.05) },
  ],
}
const deep: InductionCircuit = { ...singleCage, deepBar: { law: 'bar', depth: 2, slotShare: 0.6 } }

describe('rotor fluxes', () => {
  it.each([
    ['one cage', singleCage],
    ['two cages and core loss', double],
    ['a deep bar', deep],
  ] as const)('at rest are the steady circuit at every slip: %s', (_name, circuit) => {
    const table = machineTable([circuit])
    const fluxes = createRotorFluxes(table, base)
    const [state, rate] = [new Float64Array(4), new Float64Array(4)]
    for (const slip of [-1, -0.2, -0.01, 0.001, 0.02, 0.3, 1, 1.8]) {
      state.fill(0)
      fluxes.settle(0, slip, 390, 40, state, 0)
      fluxes.look(0, slip, state, 0)
      // i = (u − E')/Z'
      const [zr, zi] = fluxes.impedance
      const [dr, di] = [390 - fluxes.voltage[0]!, 40 - fluxes.voltage[1]!]
      const size = zr! ** 2 + zi! ** 2
      const current = { re: (dr * zr! + di * zi!) / size, im: (di * zr! - dr * zi!) / size }
      evaluateMachine(table, 0, slip)
      const [yr, yi] = table.admittance
      expect(current.re).toBeCloseTo(yr! * 390 - yi! * 40, 8)
      expect(current.im).toBeCloseTo(yr! * 40 + yi! * 390, 8)
      fluxes.carry(0, current.re, current.im, state, 0)
      expect(fluxes.airgap[0]! / (table.airgap[0]! * (390 ** 2 + 40 ** 2))).toBeCloseTo(1, 9)
      expect(fluxes.rotorLoss[0]! / (slip * fluxes.airgap[0]!)).toBeCloseTo(1, 9)
      fluxes.rates(0, slip, state, 0, rate)
      for (let k = 0; k < 2 * cagesOf(table, 0); k++) expect(Math.abs(rate[k]! / (base * 390))).toBeLessThan(1e-12)
    }
  })

  it('of a machine cut off decay with the open-circuit time constant of its rotor, turning at slip', () => {
    for (const circuit of [singleCage, { ...double, core: null }]) {
      const table = machineTable([circuit])
      const fluxes = createRotorFluxes(table, base)
      const state = new Float64Array(4)
      fluxes.settle(0, 0.01, 400, 0, state, 0)
      const integrator = createIntegrator(
        state,
        (_t, y, dy) => {
          fluxes.look(0, 0.01, y, 0)
          fluxes.carry(0, 0, 0, y, 0)
          fluxes.rates(0, 0.01, y, 0, dy)
          return true
        },
        new Float64Array(4).fill(1e-8),
        0.01,
      )
      integrator.restart(0, 0)
      const voltageAt = (t: number): number => {
        while (integrator.time < t) integrator.advance(t)
        fluxes.look(0, 0.01, state, 0)
        return Math.hypot(fluxes.voltage[0]!, fluxes.voltage[1]!)
      }
      // The voltage to a quarter takes ln 4 time constants; the fast mode of two cages is over after a tenth of a second.
      const decay = residualDecayTime(circuit, 50)!
      const first = voltageAt(0.2)
      expect(voltageAt(0.2 + decay) / first).toBeCloseTo(0.25, 4)
    }
  })
})

describe('the time that a residual voltage lasts', () => {
  it('is ln 4·(X_r + X_m)/(ω_b·R_r) for one cage, and for two that are one split', () => {
    const { resistance, reactance } = singleCage.cages[0]!
    const closed = (Math.log(4) * (reactance + singleCage.magnetising)) / (base * resistance)
    expect(residualDecayTime(singleCage, 50)).toBeCloseTo(closed, 12)
    const half = { resistance: ohm(2 * resistance), reactance: ohm(2 * reactance) }
    expect(residualDecayTime({ ...singleCage, cages: [half, half] }, 50)).toBeCloseTo(closed, 9)
  })

  it('is not known of a machine by its curves', () => {
    const curves = { voltage: 400, speeds: [], torques: [], interpolation: 'linear', currents: [], powerFactors: [] }
    expect(residualDecayTime(curves as never, 50)).toBeNull()
  })
})
