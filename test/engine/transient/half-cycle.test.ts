import { describe, expect, it } from 'vitest'
import { currentRms, type HalfCycle, meanPower, meanSquareCurrent, voltageRms } from '@/lib/engine/transient/half-cycle'

/** Half a period of a space vector p(θ), its derivative by the angle and the unit vector, by 2,000 points. */
function halfOf(current: (angle: number) => [number, number], slope: (angle: number) => [number, number]): HalfCycle {
  const moments = new Float64Array(36)
  const points = 2000
  for (let n = 0; n <= points; n++) {
    const angle = (n * Math.PI) / points
    const weight = (n === 0 || n === points ? 1 : n % 2 ? 4 : 2) / (3 * points)
    const w = [Math.cos(angle), Math.sin(angle), ...current(angle), ...slope(angle)]
    for (let i = 0; i < 6; i++) for (let j = 0; j < 6; j++) moments[6 * i + j]! += weight * w[i]! * w[j]!
  }
  return {
    from: 0,
    to: 0.01,
    moments,
    mean: { re: 0, im: 0 },
    torque: { mean: 0, low: 0, high: 0 },
    peak: 0,
    rotorLoss: 0,
    speed: 0,
  }
}

const turning = (amplitude: number, phase: number) =>
  halfOf(
    (angle) => [amplitude * Math.cos(angle + phase), amplitude * Math.sin(angle + phase)],
    (angle) => [-amplitude * Math.sin(angle + phase), amplitude * Math.cos(angle + phase)],
  )

describe('the root mean square over half a period', () => {
  it('of a sine is its amplitude over the root of two, in every phase and at every switching angle', () => {
    for (const angle of [null, 0, 0.7]) {
      const { least, most } = currentRms(turning(100, 0.4), angle)
      expect(least).toBeCloseTo(100 / Math.SQRT2, 8)
      expect(most).toBeCloseTo(100 / Math.SQRT2, 8)
    }
  })

  it('of a sine with a direct component is A²/2 + D² − 4AD·sin φ/π in its phase', () => {
    const [amplitude, direct, phase] = [100, 60, 0.9]
    const half = halfOf(
      (angle) => [amplitude * Math.cos(angle + phase) + direct, amplitude * Math.sin(angle + phase)],
      (angle) => [-amplitude * Math.sin(angle + phase), amplitude * Math.cos(angle + phase)],
    )
    const closed = [0, 1, 2].map((k) => {
      const turn = (k * 2 * Math.PI) / 3
      const own = direct * Math.cos(turn)
      return Math.sqrt(amplitude ** 2 / 2 + own ** 2 - (4 * amplitude * own * Math.sin(phase - turn)) / Math.PI)
    })
    const all = currentRms(half, 0)
    expect(all.least).toBeCloseTo(Math.min(...closed), 8)
    expect(all.most).toBeCloseTo(Math.max(...closed), 8)
  })

  it('at the worst angle bounds that of every stated one, and is reached by some', () => {
    const half = halfOf(
      (angle) => [80 * Math.cos(angle) + 50, 80 * Math.sin(angle) - 20],
      (angle) => [-80 * Math.sin(angle), 80 * Math.cos(angle)],
    )
    const worst = currentRms(half, null)
    const stated = Array.from({ length: 360 }, (_, k) => currentRms(half, (k * Math.PI) / 180))
    expect(Math.min(...stated.map(({ least }) => least))).toBeCloseTo(worst.least, 2)
    expect(Math.max(...stated.map(({ most }) => most))).toBeCloseTo(worst.most, 2)
    for (const { least, most } of stated) {
      expect(least).toBeGreaterThanOrEqual(worst.least - 1e-9)
      expect(most).toBeLessThanOrEqual(worst.most + 1e-9)
    }
    expect(meanSquareCurrent(half)).toBeLessThan(worst.most ** 2)
  })

  it('behind R and X is that of the phasors in the steady state, power included', () => {
    const half = turning(50, -0.8)
    const seen = { re: 325, im: 10, resistance: 0.7, reactance: 2 }
    const current = { re: 50 * Math.cos(0.8), im: -50 * Math.sin(0.8) }
    const voltage = {
      re: seen.re - seen.resistance * current.re + seen.reactance * current.im,
      im: seen.im - seen.resistance * current.im - seen.reactance * current.re,
    }
    expect(voltageRms(half, seen, null).least).toBeCloseTo(Math.hypot(voltage.re, voltage.im) / Math.SQRT2, 8)
    const { active, reactive } = meanPower(half, seen)
    expect(active).toBeCloseTo(1.5 * (voltage.re * current.re + voltage.im * current.im), 6)
    expect(reactive).toBeCloseTo(1.5 * (voltage.im * current.re - voltage.re * current.im), 6)
  })
})
