import type { Ohm } from '../../units/si'
import { type Complex, ohm, siemens } from '../../units/si'
import type { CapacitorInput, LineInput, ThreeWindingInput, TransformerInput } from '../case-input'

const scaled = ({ re, im }: Complex<Ohm>, part: number): Complex<Ohm> => ({ re, im: ohm(im * part) })

/** Lines, transformers and capacitors at another frequency, in parts of rated: X ∝ f, B ∝ f, R as it is. */
export const linesAt = (lines: readonly LineInput[], part: number): LineInput[] =>
  lines.map((line) => ({
    ...line,
    impedance: scaled(line.impedance, part),
    susceptance: siemens(line.susceptance * part),
  }))

export const transformersAt = <T extends TransformerInput>(transformers: readonly T[], part: number): T[] =>
  transformers.map((one) => ({ ...one, impedance: scaled(one.impedance, part) }))

export const threeWindingsAt = (transformers: readonly ThreeWindingInput[], part: number): ThreeWindingInput[] =>
  transformers.map((one) => {
    const [first, second, third] = one.impedance
    return { ...one, impedance: [scaled(first, part), scaled(second, part), scaled(third, part)] as const }
  })

export const capacitorsAt = (capacitors: readonly CapacitorInput[], part: number): CapacitorInput[] =>
  capacitors.map((one) => ({ ...one, susceptance: siemens(one.susceptance * part) }))
