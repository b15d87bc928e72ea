import { type Complex, type Ohm, ohm } from '../../units/si'

/** R + jX of an impedance given by its size in ohm and its X/R. */
export const impedanceByAngle = (size: number, xOverR: number): Complex<Ohm> => {
  const angle = Math.atan(xOverR)
  return { re: ohm(size * Math.cos(angle)), im: ohm(size * Math.sin(angle)) }
}
