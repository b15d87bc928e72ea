/**
 * Solves the real system A·x = b in place by elimination with row pivoting; `a` (n² numbers, row after row) is
 * destroyed and `b` becomes x. Nothing is allocated.
 *
 * @returns false when A is singular.
 */
export function solveReal(a: Float64Array, b: Float64Array, n: number): boolean {
  for (let k = 0; k < n; k++) {
    let row = k
    let size = Math.abs(a[k * n + k]!)
    for (let i = k + 1; i < n; i++) {
      const here = Math.abs(a[i * n + k]!)
      if (here > size) {
        size = here
        row = i
      }
    }
    if (!(size > 0)) return false
    if (row !== k) {
      for (let j = k; j < n; j++) {
        const kept = a[k * n + j]!
        a[k * n + j] = a[row * n + j]!
        a[row * n + j] = kept
      }
      const kept = b[k]!
      b[k] = b[row]!
      b[row] = kept
    }
    const inverse = 1 / a[k * n + k]!
    for (let i = k + 1; i < n; i++) {
      const factor = a[i * n + k]! * inverse
      if (factor === 0) continue
      for (let j = k + 1; j < n; j++) a[i * n + j] = a[i * n + j]! - factor * a[k * n + j]!
      b[i] = b[i]! - factor * b[k]!
    }
  }
  for (let k = n - 1; k >= 0; k--) {
    let sum = b[k]!
    for (let j = k + 1; j < n; j++) sum -= a[k * n + j]! * b[j]!
    b[k] = sum / a[k * n + k]!
  }
  return true
}
