/**
 * Dense complex linear equations by elimination with row pivoting.
 *
 * A matrix of order n is one Float64Array of 2n² numbers: element (i, j) has its real part at 2(i·n + j) and its
 * imaginary part right after. A block of right-hand sides has the same layout with `columns` in the place of n.
 */

/**
 * Solves A·X = B in place: `a` is destroyed, `b` becomes X.
 *
 * @returns false when a pivot falls below 1e-14 of the largest element of its column at the start (A is singular to working precision).
 */
export function solveComplex(a: Float64Array, b: Float64Array, n: number, columns: number): boolean {
  const scales = columnScales(a, n)
  for (let k = 0; k < n; k++) {
    const pivot = pivotRow(a, n, k)
    if (!(pivot.size > 1e-14 * scales[k]!)) return false
    if (pivot.row !== k) {
      swapRows(a, n, k, pivot.row)
      swapRows(b, columns, k, pivot.row)
    }
    const at = 2 * (k * n + k)
    const square = a[at]! * a[at]! + a[at + 1]! * a[at + 1]!
    const inverseRe = a[at]! / square
    const inverseIm = -a[at + 1]! / square
    for (let i = k + 1; i < n; i++) {
      const below = 2 * (i * n + k)
      const re = a[below]! * inverseRe - a[below + 1]! * inverseIm
      const im = a[below]! * inverseIm + a[below + 1]! * inverseRe
      if (re === 0 && im === 0) continue
      subtractRow(a, n, i, k, k + 1, re, im)
      subtractRow(b, columns, i, k, 0, re, im)
    }
  }
  substituteBack(a, b, n, columns)
  return true
}

function columnScales(a: Float64Array, n: number): Float64Array {
  const scales = new Float64Array(n)
  for (let i = 0; i < n; i++) {
    for (let j = 0; j < n; j++) {
      const at = 2 * (i * n + j)
      scales[j] = Math.max(scales[j]!, Math.abs(a[at]!) + Math.abs(a[at + 1]!))
    }
  }
  return scales
}

function pivotRow(a: Float64Array, n: number, k: number): { row: number; size: number } {
  let row = k
  let size = -1
  for (let i = k; i < n; i++) {
    const at = 2 * (i * n + k)
    const here = Math.abs(a[at]!) + Math.abs(a[at + 1]!)
    if (here > size) {
      size = here
      row = i
    }
  }
  return { row, size }
}

function swapRows(a: Float64Array, columns: number, i: number, k: number): void {
  for (let j = 0; j < 2 * columns; j++) {
    const kept = a[2 * i * columns + j]!
    a[2 * i * columns + j] = a[2 * k * columns + j]!
    a[2 * k * columns + j] = kept
  }
}

/** Row i minus (re + j·im) times row k, from column `from` on. */
function subtractRow(a: Float64Array, columns: number, i: number, k: number, from: number, re: number, im: number) {
  for (let j = from; j < columns; j++) {
    const to = 2 * (i * columns + j)
    const source = 2 * (k * columns + j)
    a[to] = a[to]! - re * a[source]! + im * a[source + 1]!
    a[to + 1] = a[to + 1]! - re * a[source + 1]! - im * a[source]!
  }
}

function substituteBack(a: Float64Array, b: Float64Array, n: number, columns: number): void {
  for (let k = n - 1; k >= 0; k--) {
    for (let i = k + 1; i < n; i++) {
      const at = 2 * (k * n + i)
      if (a[at] !== 0 || a[at + 1] !== 0) subtractRow(b, columns, k, i, 0, a[at]!, a[at + 1]!)
    }
    const at = 2 * (k * n + k)
    const square = a[at]! * a[at]! + a[at + 1]! * a[at + 1]!
    for (let j = 0; j < columns; j++) {
      const to = 2 * (k * columns + j)
      const re = (b[to]! * a[at]! + b[to + 1]! * a[at + 1]!) / square
      b[to + 1] = (b[to + 1]! * a[at]! - b[to]! * a[at + 1]!) / square
      b[to] = re
    }
  }
}
