import type { Complex } from '../../units/si'

/** Complex arithmetic for the set-up of a case; hot loops work on Float64Array instead. */
export const subtract = (a: Complex, b: Complex): Complex => ({ re: a.re - b.re, im: a.im - b.im })

export const conjugate = (a: Complex): Complex => ({ re: a.re, im: -a.im })

export const scale = (a: Complex, factor: number): Complex => ({ re: a.re * factor, im: a.im * factor })

/** 1/a; not finite for a = 0. */
export function reciprocal(a: Complex): Complex {
  const square = a.re * a.re + a.im * a.im
  return { re: a.re / square, im: -a.im / square }
}

export const magnitude = (a: Complex): number => Math.hypot(a.re, a.im)

export const isZero = (a: Complex): boolean => a.re === 0 && a.im === 0

export const add = (a: Complex, b: Complex): Complex => ({ re: a.re + b.re, im: a.im + b.im })

export const multiply = (a: Complex, b: Complex): Complex => ({
  re: a.re * b.re - a.im * b.im,
  im: a.re * b.im + a.im * b.re,
})

/** a/b; not finite for b = 0. */
export const divide = (a: Complex, b: Complex): Complex => multiply(a, reciprocal(b))
