/** One sample through a filter; keeps its state. */
export type Filter = (sample: number) => number

/** Second-order section b/a in z⁻¹, a₀ = 1, transposed direct form II. */
function section(b0: number, b1: number, b2: number, a1: number, a2: number): Filter {
  let [s1, s2] = [0, 0]
  return (x) => {
    const y = b0 * x + s1
    s1 = b1 * x - a1 * y + s2
    s2 = b2 * x - a2 * y
    return y
  }
}

/** (n₂s² + n₁s + n₀)/(d₂s² + d₁s + d₀) sampled at `rate` by the bilinear transform. */
export function analogSection(
  [n2, n1, n0]: readonly [number, number, number],
  [d2, d1, d0]: readonly [number, number, number],
  rate: number,
): Filter {
  const c = 2 * rate
  const a = d2 * c * c + d1 * c + d0
  return section(
    (n2 * c * c + n1 * c + n0) / a,
    (2 * (n0 - n2 * c * c)) / a,
    (n2 * c * c - n1 * c + n0) / a,
    (2 * (d0 - d2 * c * c)) / a,
    (d2 * c * c - d1 * c + d0) / a,
  )
}

/** First-order high-pass with its corner at `frequency`, Hz. */
export const highPass = (frequency: number, rate: number): Filter =>
  analogSection([0, 1, 0], [0, 1, 2 * Math.PI * frequency], rate)

/** First-order low-pass with a time constant in s. */
export const lag = (time: number, rate: number): Filter => analogSection([0, 0, 1], [0, time, 1], rate)

/** Butterworth low-pass of sixth order with its corner at `frequency`, Hz, which the transform keeps. */
export function butterworth6(frequency: number, rate: number): Filter {
  const w = 2 * rate * Math.tan((Math.PI * frequency) / rate)
  const sections = [1, 3, 5].map((k) =>
    analogSection([0, 0, w * w], [1, 2 * w * Math.sin((k * Math.PI) / 12), w * w], rate),
  )
  return (x) => sections.reduce((value, filter) => filter(value), x)
}
