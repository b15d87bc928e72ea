/**
 * Root of a continuous function between two arguments of opposite sign, by regula falsi in the Illinois form with
 * bisection whenever that does not halve the bracket twice running.
 *
 * @param tolerance half-width of the bracket at which the search ends, in the unit of the argument
 * @returns the middle of the last bracket; a bound itself when the function is zero there
 */
export function findRoot(
  f: (x: number) => number,
  from: number,
  to: number,
  tolerance: number,
  atFrom: number = f(from),
  atTo: number = f(to),
): number {
  let [a, b, fa, fb] = [from, to, atFrom, atTo]
  if (fa === 0) return a
  if (fb === 0) return b
  let slow = 0
  for (let round = 0; round < 200; round++) {
    const width = Math.abs(b - a)
    if (width <= 2 * tolerance) break
    let x = slow >= 2 ? (a + b) / 2 : (a * fb - b * fa) / (fb - fa)
    // A secant that lands on a bound makes no progress: keep it inside by at least the tolerance.
    const inset = Math.min(tolerance, width / 4)
    x = Math.min(Math.max(x, Math.min(a, b) + inset), Math.max(a, b) - inset)
    const fx = f(x)
    if (fx === 0) return x
    if (fx > 0 === fb > 0) {
      b = x
      fb = fx
      fa /= 2
    } else {
      a = b
      fa = fb
      b = x
      fb = fx
    }
    slow = Math.abs(b - a) > width / 2 ? slow + 1 : 0
  }
  return (a + b) / 2
}
