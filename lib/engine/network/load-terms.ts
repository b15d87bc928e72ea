import type { NonlinearLoads } from './static-load'

/**
 * What a load adds to the current balance at a voltage V, written into six numbers: the current (re, im) and, as real
 * 2 × 2 block, its derivative by (re, im) of V.
 *
 * I = conj(S₀)·g(w)·V with w = |V|² and, below the floor, w = that of the floor.
 *
 * @param share part of the load that is on
 */
export function loadTerms(
  loads: NonlinearLoads,
  l: number,
  vRe: number,
  vIm: number,
  share: number,
  into: Float64Array,
): void {
  const square = vRe * vRe + vIm * vIm
  const inside = square > loads.floor[l]!
  const w = inside ? square : loads.floor[l]!
  const inverse = 1 / w
  const root = loads.current[l]! === 0 ? 0 : loads.current[l]! / Math.sqrt(w)
  const power = loads.share[l]! * inverse
  const g = share * (root + power)
  const sRe = loads.power[2 * l]!
  const sIm = loads.power[2 * l + 1]!
  into[0] = g * (sRe * vRe - sIm * vIm)
  into[1] = g * (sRe * vIm + sIm * vRe)
  // dg/dw of the voltage-dependent part; zero below the floor.
  const slope = inside ? -share * (root / 2 + power) * inverse : 0
  const own = g + slope * square
  // ∂I/∂V = S*·own, ∂I/∂V* = S*·slope·V².
  const squareRe = slope * (vRe * vRe - vIm * vIm)
  const squareIm = slope * 2 * vRe * vIm
  const aRe = sRe * own
  const aIm = sIm * own
  const bRe = sRe * squareRe - sIm * squareIm
  const bIm = sRe * squareIm + sIm * squareRe
  into[2] = aRe + bRe
  into[3] = -aIm + bIm
  into[4] = aIm + bIm
  into[5] = aRe - bRe
}
