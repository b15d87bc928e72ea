/** A double-cage circuit as a vector, in any one unit of impedance: r_s, x_s, x_m, r_c, r₁, x₁ (inner), r₂, x₂ (outer). */
export type CircuitVector = Float64Array

/** What a circuit does at one slip and 1 V (1 pu): power drawn, current, airgap power. */
export interface SlipState {
  active: number
  reactive: number
  current: number
  airgap: number
}

/**
 * State of the double-cage circuit at a slip between 0 (exclusive) and 1.
 * y_r = Σ s/(r + j·s·x) over the cages; y_e = y_r + 1/(j·x_m) + 1/r_c; y = y_e/(1 + z_s·y_e).
 */
export const stateAtSlip = (circuit: CircuitVector, slip: number): SlipState => {
  const rs = circuit[0]!
  const xs = circuit[1]!
  const xm = circuit[2]!
  const rc = circuit[3]!
  const r1 = circuit[4]!
  const x1 = circuit[5]!
  const r2 = circuit[6]!
  const x2 = circuit[7]!
  const d1 = r1 * r1 + (slip * x1) ** 2
  const d2 = r2 * r2 + (slip * x2) ** 2
  const gr = slip * (r1 / d1 + r2 / d2)
  const br = -slip * slip * (x1 / d1 + x2 / d2)
  const ge = gr + 1 / rc
  const be = br - 1 / xm
  const cr = 1 + rs * ge - xs * be
  const ci = rs * be + xs * ge
  const square = cr * cr + ci * ci
  const g = (ge * cr + be * ci) / square
  const b = (be * cr - ge * ci) / square
  return { active: g, reactive: -b, current: Math.hypot(g, b), airgap: gr / square }
}
