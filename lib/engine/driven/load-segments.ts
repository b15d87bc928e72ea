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
  /** The torque keeps its sign at speeds below zero; a passive load's turns with the motion. */
  active: boolean
}

/** Cuts a curve at its corners. Points are joined by straight lines and the last line is prolonged. */
export function loadSegments(curve: LoadCurve): LoadSegments {
  switch (curve.kind) {
    case 'power':
      return fromPower(curve)
    case 'points':
      return fromPoints(curve)
    case 'check-valve':
      return fromCheckValve(curve)
  }
}

interface Piece {
  from: number
  base: number
  slope: number
  rise: number
}

const assemble = (pieces: readonly Piece[], exponent: number, active: boolean): LoadSegments => ({
  corners: Float64Array.from(pieces.slice(1), ({ from }) => from),
  base: Float64Array.from(pieces, ({ base }) => base),
  slope: Float64Array.from(pieces, ({ slope }) => slope),
  rise: Float64Array.from(pieces, ({ rise }) => rise),
  exponent,
  active,
})

/** Straight line through two points, from the first on. */
const line = (from: number, torque: number, to: number, end: number): Piece => {
  const slope = to > from ? (end - torque) / (to - from) : 0
  return { from, base: torque - slope * from, slope, rise: 0 }
}

/** The curve of a power of speed, with its breakaway line in front where there is one. */
function powerPieces(curve: Omit<Extract<LoadCurve, { kind: 'power' }>, 'kind'>): Piece[] {
  const rise = (curve.atRated - curve.constant) / curve.ratedSpeed ** curve.exponent
  const power: Piece = { from: 0, base: curve.constant, slope: 0, rise }
  if (curve.breakaway === null) return [power]
  const { torque, until } = curve.breakaway
  return [line(0, torque, until, curve.constant + rise * until ** curve.exponent), { ...power, from: until }]
}

const fromPower = (curve: Extract<LoadCurve, { kind: 'power' }>): LoadSegments =>
  assemble(powerPieces(curve), curve.exponent, false)

/** Part of the largest speed that a steep rise takes at least. */
const steepest = 2e-3

/**
 * Rising points a hair apart are a jump of torque: a shaft held on it would ask for steps without end. Such a jump is
 * spread over 0.2 % of the largest speed, or half the way to its neighbours where they are closer. A shaft passes a
 * falling jump at once, so that it stays as typed.
 */
function spreadJumps(speeds: readonly number[], torques: readonly number[]): number[] {
  const spread = [...speeds]
  const width = steepest * Math.max(...speeds.map(Math.abs))
  const least = 1e-2 * Math.max(...torques.map(Math.abs))
  for (let i = 0; i + 1 < speeds.length; i++) {
    const [low, high] = [speeds[i]!, speeds[i + 1]!]
    if (high - low >= width || torques[i + 1]! - torques[i]! < least) continue
    const middle = (low + high) / 2
    const before = i === 0 ? low : Math.max(middle - width / 2, (spread[i - 1]! + low) / 2)
    const after = i + 2 < speeds.length ? Math.min(middle + width / 2, (high + speeds[i + 2]!) / 2) : middle + width / 2
    spread[i] = Math.min(low, before)
    spread[i + 1] = Math.max(high, after)
  }
  return spread
}

function fromPoints({ speeds, torques, active }: Extract<LoadCurve, { kind: 'points' }>): LoadSegments {
  const at = spreadJumps(speeds, torques)
  const pieces = Array.from({ length: Math.max(1, at.length - 1) }, (_, i) =>
    line(at[i]!, torques[i]!, at[i + 1] ?? at[i]!, torques[i + 1] ?? torques[i]!),
  )
  return assemble(pieces, 1, active ?? false)
}

function fromCheckValve(curve: Extract<LoadCurve, { kind: 'check-valve' }>): LoadSegments {
  const { friction, shut, ratedSpeed, breakaway, opensAt, speeds, torques } = curve
  const closed = powerPieces({ constant: friction, atRated: shut, ratedSpeed, exponent: 2, breakaway })
  const opening = friction + (shut - friction) * (opensAt / ratedSpeed) ** 2
  const [at, to] = [
    [opensAt, ...speeds],
    [opening, ...torques],
  ]
  const open = speeds.map((_, i) => line(at[i]!, to[i]!, at[i + 1]!, to[i + 1]!))
  return assemble([...closed, ...open], 2, false)
}

/** Torque in N·m on piece `piece` at speed ω in rad/s; the piece may be prolonged past its corners. */
export function loadTorque(load: LoadSegments, piece: number, speed: number): number {
  if (piece < 0) return loadTorqueAt(load, speed)
  const rise = load.rise[piece]!
  const line = load.base[piece]! + load.slope[piece]! * speed
  if (rise === 0) return line
  if (load.exponent === 2) return line + rise * speed * speed
  return line + rise * (speed > 0 ? speed ** load.exponent : load.exponent === 0 ? 1 : 0)
}

/** The piece that holds at a speed; at a corner the upper one. −1 for a passive load that turns backwards. */
export function pieceAt(load: LoadSegments, speed: number): number {
  if (speed < 0 && !load.active) return -1
  let piece = 0
  while (piece < load.corners.length && speed >= load.corners[piece]!) piece++
  return piece
}

/** Torque of the whole curve at a speed; that of a passive load turns with the motion. */
export function loadTorqueAt(load: LoadSegments, speed: number): number {
  const piece = pieceAt(load, speed)
  return piece < 0 ? -loadTorque(load, pieceAt(load, -speed), -speed) : loadTorque(load, piece, speed)
}
