import { analogSection, butterworth6, type Filter, highPass, lag } from './filters'
import { type Lamp, type LampWeighting, lampWeightings } from './lamps'

const pi2 = 2 * Math.PI

/** Size of the weighting filter and the high-pass before it at a frequency, Hz. */
function gain({ k, lambda, f1, f2, f3, f4 }: LampWeighting, frequency: number): number {
  const first = (corner: number): number => Math.hypot(1, frequency / corner)
  const resonance = Math.hypot(f1 * f1 - frequency * frequency, 2 * lambda * frequency)
  return ((k * f1 * frequency) / resonance) * (first(f2) / (first(f3) * first(f4)))
}

/** Peak of the smoothed square of a sine of amplitude 1: half of it, and the ripple at twice its frequency. */
const smoothedPeak = (frequency: number): number => 0.5 * (1 + 1 / Math.hypot(1, 2 * pi2 * frequency * smoothing))

/** Time constant of the smoothing that stands for the memory of the eye, s. */
const smoothing = 0.3

/** Factor that makes the reference sine reach a sensation of 1. */
function scaleOf(weighting: LampWeighting): number {
  const { frequency, change } = weighting.reference
  // A change of the voltage by ΔU/U peak to peak changes its square by the same number as amplitude.
  const amplitude = change * gain(weighting, frequency)
  return 1 / (amplitude * amplitude * smoothedPeak(frequency))
}

/**
 * Flickermeter on the square of a voltage in parts of its mean: the sensation P_inst against time.
 *
 * High-pass of 0.05 Hz, Butterworth low-pass, lamp weighting, square, 0.3 s of smoothing. Source: IEC 61000-4-15,
 * blocks 2 to 4. The input may be u² of the instantaneous voltage or of its RMS envelope; less 1, so that a steady
 * voltage is 0.
 *
 * @param rate samples a second; 1000 or more keeps the filters true
 */
export function flickermeter(lamp: Lamp, rate: number): Filter {
  const weighting = lampWeightings[lamp]
  const { k, lambda, f1, f2, f3, f4, lowPass } = weighting
  const [w1, w2, w3, w4] = [pi2 * f1, pi2 * f2, pi2 * f3, pi2 * f4]
  const slow = highPass(0.05, rate)
  const carrier = butterworth6(lowPass, rate)
  const eye = analogSection([0, k * w1, 0], [1, 2 * pi2 * lambda, w1 * w1], rate)
  const brain = analogSection([0, 1 / w2, 1], [1 / (w3 * w4), 1 / w3 + 1 / w4, 1], rate)
  const memory = lag(smoothing, rate)
  const scale = scaleOf(weighting)
  return (change) => {
    const weighted = brain(eye(carrier(slow(change))))
    return scale * memory(weighted * weighted)
  }
}

/**
 * Short-term severity of a record of sensations by the percentiles of IEC 61000-4-15, block 5.
 *
 * @param sensations P_inst at even times over the whole period; sorted in place
 */
export function shortTermSeverity(sensations: Float64Array): number {
  sensations.sort()
  const n = sensations.length
  /** Exceeded during so many per cent of the time. */
  const exceeded = (percent: number): number =>
    sensations[Math.min(n - 1, Math.max(0, Math.ceil(n * (1 - percent / 100)) - 1))]!
  const mean = (...percents: number[]): number =>
    percents.reduce((sum, percent) => sum + exceeded(percent), 0) / percents.length
  return Math.sqrt(
    0.0314 * exceeded(0.1) +
      0.0525 * mean(0.7, 1, 1.5) +
      0.0657 * mean(2.2, 3, 4) +
      0.28 * mean(6, 8, 10, 13, 17) +
      0.08 * mean(30, 50, 80),
  )
}

/** Long-term severity of twelve short-term ones in succession. */
export const longTermSeverity = (values: readonly number[]): number =>
  Math.cbrt(values.reduce((sum, value) => sum + value ** 3, 0) / values.length)
