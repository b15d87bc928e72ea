import { describe, expect, it } from 'vitest'
import { runCase } from '@/lib/engine/run-case'
import { kilogramSquareMetre, ohm, perUnit } from '@/lib/units/si'
import { fromRpm, toRpm } from '@/lib/units/speed'
import {
  autotransformer,
  noLoad,
  simpleMotor,
  simplePlant,
  singleCage,
  squareLoad,
  started,
  synchronous,
} from '../../support/simple-plant'

/** Supply and stator impedance in series as one Thevenin source of the rotor, per phase. */
function rotorSource(reactance: number) {
  const [r, x, xm] = [singleCage.stator.re + reactance / 10, singleCage.stator.im + reactance, singleCage.magnetising]
  const square = r * r + (x + xm) ** 2
  const rth = (xm * xm * r) / square
  const xth = (xm * (r * r + x * (x + xm))) / square
  const rotor = singleCage.cages[0]!
  const root = Math.hypot(rth, xth + rotor.reactance)
  const sb = rotor.resistance / root
  // Three phases at E line to line: V_th² is E²·xm²/|…|².
  const tb = (400 ** 2 * xm * xm) / square / (2 * synchronous * (rth + root))
  return { sb, tb, a: rth / rotor.resistance }
}

/** t(s) = Jω_s/(2T_b(1 + a·s_b))·[(1 − s²)/(2s_b) + s_b·ln(1/s) + 2a·s_b(1 − s)]. */
function runUpTime(inertia: number, reactance: number, slip: number): number {
  const { sb, tb, a } = rotorSource(reactance)
  const bracket = (1 - slip * slip) / (2 * sb) + sb * Math.log(1 / slip) + 2 * a * sb * (1 - slip)
  return ((inertia * synchronous) / (2 * tb * (1 + a * sb))) * bracket
}

describe('a run-up without load torque', () => {
  for (const reactance of [0.001, 0.009, 0.03]) {
    for (const inertia of [2, 6, 40]) {
      it(`takes the time of the closed form behind ${reactance} Ω with ${inertia} kg·m²`, () => {
        const motor = simpleMotor('M', started(), { inertia: kilogramSquareMetre(inertia) })
        const { start } = runCase(simplePlant([motor], reactance)).motors[0]!
        const slipAt = (part: number) => 1 - (part * motor.ratedSpeed) / synchronous
        expect(start!.timeTo95! / runUpTime(inertia, reactance, slipAt(0.95))).toBeCloseTo(1, 6)
        expect(start!.timeToCriterion! / runUpTime(inertia, reactance, slipAt(0.98))).toBeCloseTo(1, 6)
      })
    }
  }

  it('turns as much heat into the rotor as it gains in kinetic energy, less the slip left: Jω_s²(1 − s²)/2', () => {
    for (const tap of [1, 0.7, 0.5]) {
      const starter = tap === 1 ? { kind: 'direct' as const } : autotransformer(tap, { rpm: 1495 })
      const motor = simpleMotor('M', started(starter))
      const { start } = runCase(simplePlant([motor])).motors[0]!
      const slip = 1 - (0.98 * motor.ratedSpeed) / synchronous
      expect(start!.slipEnergy / ((6 * synchronous ** 2 * (1 - slip * slip)) / 2)).toBeCloseTo(1, 6)
      expect(start!.kineticEnergy).toBeCloseTo((6 * (0.98 * motor.ratedSpeed) ** 2) / 2, 6)
    }
  })

  it('leaves the rotor heat independent of the supply', () => {
    const heat = (reactance: number) =>
      runCase(simplePlant([simpleMotor('M', started())], reactance)).motors[0]!.start!.slipEnergy
    expect(heat(0.03) / heat(0.001)).toBeCloseTo(1, 6)
  })

  it('scales in time with the inertia', () => {
    const time = (inertia: number) => {
      const motor = simpleMotor('M', started(), { inertia: kilogramSquareMetre(inertia) })
      return runCase(simplePlant([motor])).motors[0]!.start!.timeToCriterion!
    }
    expect(time(12) / time(6)).toBeCloseTo(2, 6)
  })
})

describe('the settled state', () => {
  it('is synchronous speed without load', () => {
    const { start } = runCase(simplePlant([simpleMotor('M', started())])).motors[0]!
    expect(toRpm(start!.settledSpeed!)).toBeCloseTo(1500, 4)
  })

  it('balances motor and load torque by Kloss’s curve', () => {
    const load = squareLoad(1000)
    const { start } = runCase(simplePlant([simpleMotor('M', started({ kind: 'direct' }, load))])).motors[0]!
    const slip = 1 - start!.settledSpeed! / synchronous
    const { sb, tb, a } = rotorSource(0.009)
    expect((2 * tb * (1 + a * sb)) / (slip / sb + sb / slip + 2 * a * sb)).toBeCloseTo(
      1000 * (start!.settledSpeed! / fromRpm(1480)) ** 2,
      5,
    )
  })

  it('with a torque factor below one lies at more slip', () => {
    const speed = (factor: number) =>
      runCase(
        simplePlant([
          simpleMotor('M', started({ kind: 'direct' }, squareLoad(1000)), { torqueFactor: perUnit(factor) }),
        ]),
      ).motors[0]!.start!.settledSpeed!
    expect(speed(0.85)).toBeLessThan(speed(1))
  })
})

describe('standstill', () => {
  it('has the voltage E·Z_m/(Z_m + Z_s) and its current and torque', () => {
    const result = runCase(simplePlant([simpleMotor('M', started())]))
    const rotor = singleCage.cages[0]!
    const [rr, xr, xm] = [rotor.resistance, rotor.reactance, singleCage.magnetising]
    // jX_m ∥ (R_r + jX_r), then the stator in series.
    const square = rr * rr + (xr + xm) ** 2
    const zm = {
      re: singleCage.stator.re + (xm * xm * rr) / square,
      im: singleCage.stator.im + (xm * (rr * rr + xr * (xr + xm))) / square,
    }
    const whole = Math.hypot(zm.re + 0.0009, zm.im + 0.009)
    const { standstill } = result.motors[0]!.start!
    expect(standstill.motorVoltage).toBeCloseTo((400 * Math.hypot(zm.re, zm.im)) / whole, 8)
    expect(standstill.lineCurrent).toBeCloseTo(400 / Math.sqrt(3) / whole, 8)
    expect(standstill.powerFactor).toBeCloseTo(zm.re / Math.hypot(zm.re, zm.im), 10)
    expect(standstill.torque).toBeCloseTo(
      (3 * standstill.lineCurrent ** 2 * (zm.re - singleCage.stator.re)) / synchronous,
      6,
    )
    expect(result.places[0]!.first).toBeCloseTo(standstill.motorVoltage, 9)
  })

  it('never has a deeper dip behind a stiffer supply', () => {
    const dips = [0.002, 0.005, 0.01, 0.02, 0.04].map((reactance) => {
      const { first, before } = runCase(simplePlant([simpleMotor('M', started())], reactance)).places[0]!
      return 1 - first / before
    })
    expect(dips).toEqual([...dips].sort((a, b) => a - b))
  })

  it('draws core loss beside the motor current where a core resistance is given', () => {
    const power = (core: number | null) =>
      runCase(
        simplePlant([
          simpleMotor('M', started({ kind: 'direct' }, noLoad), {
            circuit: { ...singleCage, core: core === null ? null : ohm(core) },
          }),
        ]),
      ).motors[0]!.start!.standstill.power.re
    expect(power(20)).toBeGreaterThan(power(null))
  })
})
