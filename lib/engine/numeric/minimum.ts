const golden = (3 - Math.sqrt(5)) / 2

export interface Minimum {
  at: number
  value: number
}

/**
 * Least value of a function in a bracket, by parabolic steps guarded by the golden section.
 *
 * @param inside a point of the bracket that is not above its ends; the search starts there
 * @param tolerance width in x at which it ends; near a smooth minimum the value is then known to its square
 */
export function findMinimum(
  f: (x: number) => number,
  from: number,
  inside: Minimum,
  to: number,
  tolerance: number,
): Minimum {
  let [a, b] = [from, to]
  let [x, fx] = [inside.at, inside.value]
  let [w, fw, v, fv] = [x, fx, x, fx]
  let [step, before] = [0, 0]
  for (let round = 0; round < 60; round++) {
    const middle = (a + b) / 2
    if (Math.abs(x - middle) <= 2 * tolerance - (b - a) / 2) break
    let next = Number.NaN
    if (Math.abs(before) > tolerance) {
      const r = (x - w) * (fx - fv)
      const q = (x - v) * (fx - fw)
      const denominator = 2 * (q - r)
      const candidate = denominator === 0 ? Number.NaN : -((x - v) * q - (x - w) * r) / denominator
      if (Math.abs(candidate) < Math.abs(before) / 2 && x + candidate > a && x + candidate < b) next = candidate
    }
    before = step
    if (Number.isNaN(next)) {
      before = x < middle ? b - x : a - x
      next = golden * before
    }
    step = next
    const move = Math.abs(step) >= tolerance ? step : step > 0 ? tolerance : -tolerance
    const u = x + move
    const fu = f(u)
    if (fu <= fx) {
      if (u < x) b = x
      else a = x
      ;[v, fv, w, fw, x, fx] = [w, fw, x, fx, u, fu]
    } else {
      if (u < x) a = u
      else b = u
      if (fu <= fw || w === x) [v, fv, w, fw] = [w, fw, u, fu]
      else if (fu <= fv || v === x || v === w) [v, fv] = [u, fu]
    }
  }
  return { at: x, value: fx }
}
