import type { LoadCurve } from '../case-input'

/**
 * A load curve cut at its corners, so that every piece is smooth:
 * T(ω) = base + slope·ω + rise·ω^exponent between one corner and the next. The last piece goes on without end.
 */
export interface LoadSegments {
  /** Speed at which each piece ends, rad/s; one fewer than pieces. */
  corners: Float64Array
  base: Float64Array
  slope: Float64Array
  rise: Float64Array
  exponent: number
}

/** Cuts a curve at its corners. Points are joined by straight lines and the last line is prolonged. */
export function loadSegments(curve: LoadCurve): LoadSegments {
  return curve.kind === 'points' ? fromPoints(curve.speeds, curve.torques) : fromPower(curve)
}

function fromPower(curve: Extract<LoadCurve, { kind: 'power' }>): LoadSegments {
  const rise = (curve.atRated - curve.constant) / curve.ratedSpeed ** curve.exponent
  if (curve.breakaway === null) {
    return {
      corners: new Float64Array(0),
      base: Float64Array.of(curve.constant),
      slope: new Float64Array(1),
      rise: Float64Array.of(rise),
      exponent: curve.exponent,
    }
  }
  const { torque, until } = curve.breakaway
  const there = curve.constant + rise * until ** curve.exponent
  return {
    corners: Float64Array.of(until),
    base: Float64Array.of(torque, curve.constant),
    slope: Float64Array.of((there - torque) / until, 0),
    rise: Float64Array.of(0, rise),
    exponent: curve.exponent,
  }
}

function fromPoints(speeds: readonly number[], torques: readonly number[]): LoadSegments {
  const pieces = Math.max(1, speeds.length - 1)
  const segments = {
    corners: Float64Array.from(speeds.slice(1, -1)),
    base: new Float64Array(pieces),
    slope: new Float64Array(pieces),
    rise: new Float64Array(pieces),
    exponent: 1,
  }
  for (let i = 0; i < pieces; i++) {
    const width = (speeds[i + 1] ?? speeds[i]!) - speeds[i]!
    const slope = width > 0 ? (torques[i + 1]! - torques[i]!) / width : 0
    segments.slope[i] = slope
    segments.base[i] = torques[i]! - slope * speeds[i]!
  }
  return segments
}

/** Torque in N·m on piece `piece` at speed ω ≥ 0 in rad/s; the piece may be prolonged past its corners. */
export function loadTorque(load: LoadSegments, piece: number, speed: number): number {
  const rise = load.rise[piece]!
  const line = load.base[piece]! + load.slope[piece]! * speed
  if (rise === 0) return line
  if (load.exponent === 2) return line + rise * speed * speed
  return line + rise * (speed > 0 ? speed ** load.exponent : load.exponent === 0 ? 1 : 0)
}

/** The piece that holds at a speed; at a corner the upper one. */
export function pieceAt(load: LoadSegments, speed: number): number {
  let piece = 0
  while (piece < load.corners.length && speed >= load.corners[piece]!) piece++
  return piece
}

/** Torque of the whole curve at speed ω ≥ 0. */
export const loadTorqueAt = (load: LoadSegments, speed: number): number => loadTorque(load, pieceAt(load, speed), speed)
