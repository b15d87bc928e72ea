/**
 * Quadratic means of everything that goes with the current of one machine over half a period.
 *
 * With p the current's space vector in the stationary frame (A peak), u a unit vector turning with the supply and
 * r = (dp/dt)/ω_b, any voltage of an R-L network is v = a·u − R·p − X·r, so that its mean square in any direction
 * follows from the means of the products of u, p and r: the mean square of a phase over half a period of the supply is
 * that of the whole period in the steady state.
 */
export interface HalfCycle {
  from: number
  to: number
  /** Means of the products of Re u, Im u, Re p, Im p, Re r, Im r: six rows of six. */
  moments: Float64Array
  /** Mean of p, A peak; two successive halves make its direct component. */
  mean: { re: number; im: number }
  torque: { mean: number; low: number; high: number }
  /** Largest length of p, A peak. */
  peak: number
  /** Mean loss in the rotor circuits, W. */
  rotorLoss: number
  /** At its end, rad/s. */
  speed: number
}

/** A voltage a·u − R·p − X·r: a in V peak of a phase (re, im), R and X in ohm. */
export interface Seen {
  re: number
  im: number
  resistance: number
  reactance: number
}

/** Root mean squares of a space vector: the least and the most of its phases. */
export interface PhaseRms {
  least: number
  most: number
}

const weights = new Float64Array(12)

function quadratic(moments: Float64Array, a: number, b: number): number {
  let sum = 0
  for (let i = 0; i < 6; i++) {
    const left = weights[a + i]!
    if (left === 0) continue
    let row = 0
    for (let j = 0; j < 6; j++) row += moments[6 * i + j]! * weights[b + j]!
    sum += left * row
  }
  return sum
}

/**
 * From mean squares along two axes and the mean of their product.
 *
 * @param angle of phase a's voltage at switching on, rad: then the three phases are looked at; null for every direction, as
 * the worst switching instant of all would have it
 */
function phases(xx: number, yy: number, xy: number, angle: number | null): PhaseRms {
  const middle = (xx + yy) / 2
  const half = (xx - yy) / 2
  const root = (square: number) => Math.sqrt(Math.max(0, square))
  if (angle === null) {
    const swing = Math.hypot(half, xy)
    return { least: root(middle - swing), most: root(middle + swing) }
  }
  const squares = [0, 1, 2].map((k) => {
    const direction = 2 * (-angle + (k * 2 * Math.PI) / 3)
    return middle + half * Math.cos(direction) + xy * Math.sin(direction)
  })
  return { least: root(Math.min(...squares)), most: root(Math.max(...squares)) }
}

/** RMS of the phases of a voltage over the half period, V of a phase. */
export function voltageRms({ moments }: HalfCycle, { re, im, resistance, reactance }: Seen, angle: number | null) {
  weights.set([re, -im, -resistance, 0, -reactance, 0, im, re, 0, -resistance, 0, -reactance])
  return phases(quadratic(moments, 0, 0), quadratic(moments, 6, 6), quadratic(moments, 0, 6), angle)
}

/** RMS of the phase currents, A. */
export const currentRms = ({ moments }: HalfCycle, angle: number | null): PhaseRms =>
  phases(moments[14]!, moments[21]!, moments[15]!, angle)

/** Mean square of the current over all three phases, A². */
export const meanSquareCurrent = ({ moments }: HalfCycle): number => (moments[14]! + moments[21]!) / 2

/** Mean power at a voltage that the current flows into, W and var. */
export function meanPower({ moments }: HalfCycle, { re, im, resistance, reactance }: Seen) {
  const row = (i: number) => moments.subarray(6 * i, 6 * i + 6)
  const [x, y] = [
    [re, -im, -resistance, 0, -reactance, 0],
    [im, re, 0, -resistance, 0, -reactance],
  ] as const
  const dot = (a: readonly number[], b: Float64Array) => a.reduce((sum, each, k) => sum + each * b[k]!, 0)
  const [pRe, pIm] = [row(2), row(3)]
  return { active: 1.5 * (dot(x, pRe) + dot(y, pIm)), reactive: 1.5 * (dot(y, pRe) - dot(x, pIm)) }
}
