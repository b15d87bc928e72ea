import type { Complex } from '@/lib/units/si'

/** The few operations that a hand calculation needs. */
export const add = (a: Complex, b: Complex): Complex => ({ re: a.re + b.re, im: a.im + b.im })
export const scale = (a: Complex, factor: number): Complex => ({ re: a.re * factor, im: a.im * factor })
export const magnitude = ({ re, im }: Complex): number => Math.hypot(re, im)

export const inverse = ({ re, im }: Complex): Complex => {
  const square = re * re + im * im
  return { re: re / square, im: -im / square }
}

/** Parts of an impedance of this magnitude by its ratio X/R. */
export const byRatio = (size: number, xOverR: number): Complex => {
  const re = size / Math.hypot(1, xOverR)
  return { re, im: re * xOverR }
}
