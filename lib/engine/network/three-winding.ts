import type { Complex } from '../../units/si'
import type { ThreeWindingInput } from '../case-input'
import { add, divide, magnitude, multiply } from '../numeric/complex'

/** One of the three couplings between the windings of a three-winding transformer. */
export interface Coupling {
  from: number
  to: number
  /** Siemens at the rated voltage of the first winding. */
  admittance: Complex
}

const pairs = [
  [0, 1, 2],
  [1, 2, 0],
  [2, 0, 1],
] as const

/**
 * The couplings between the windings, pair by pair, with the star's own hidden node eliminated: y = z_third / Σ z·z.
 *
 * Holds for an arm without impedance or with a negative one, as the star of a middle winding often has.
 * Null where the star is singular: at least two arms without impedance, or arms that cancel.
 */
export function couplings({ impedance }: ThreeWindingInput): Coupling[] | null {
  const [z12, z23, z31] = impedance
  const half = (a: Complex, b: Complex, c: Complex): Complex => ({
    re: (a.re + b.re - c.re) / 2,
    im: (a.im + b.im - c.im) / 2,
  })
  const arms = [half(z12, z31, z23), half(z12, z23, z31), half(z23, z31, z12)] as const
  const products = pairs.map(([i, j]) => multiply(arms[i], arms[j]))
  const sum = products.reduce(add)
  const size = magnitude(z12) + magnitude(z23) + magnitude(z31)
  if (!(magnitude(sum) > 1e-12 * size * size)) return null
  return pairs.map(([from, to, third]) => ({ from, to, admittance: divide(arms[third], sum) }))
}
