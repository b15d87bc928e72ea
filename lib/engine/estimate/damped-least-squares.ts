import { solveReal } from '../numeric/real-lu'

export interface LeastSquaresProblem {
  /** Residuals at x; every call returns the same number of them. */
  residuals(x: Float64Array): readonly number[]
  low: Float64Array
  high: Float64Array
  /** Part of the cost that a step must gain to be followed by another (default 1e-12). */
  leastGain?: number
}

export interface LeastSquaresResult {
  x: Float64Array
  /** Sum of squares at x. */
  cost: number
  evaluations: number
}

const sumOfSquares = (values: readonly number[]): number => values.reduce((sum, value) => sum + value * value, 0)

/**
 * Least sum of squares in a box by damped normal equations (Levenberg-Marquardt) with central differences of 1e-5.
 * A component at its bound is held there while the slope pushes outwards. Ends when a step gains less than `leastGain`
 * of the cost, after 60 steps, or when no damping finds a descent; the result is then the best point met.
 */
export const dampedLeastSquares = (problem: LeastSquaresProblem, start: Float64Array): LeastSquaresResult => {
  const n = start.length
  const leastGain = problem.leastGain ?? 1e-12
  const x = Float64Array.from(start)
  let residuals = problem.residuals(x)
  let cost = sumOfSquares(residuals)
  let evaluations = 1
  let damping = 1e-3
  const trial = new Float64Array(n)
  const normal = new Float64Array(n * n)
  const damped = new Float64Array(n * n)
  const slope = new Float64Array(n)
  const step = new Float64Array(n)
  const jacobian = Array.from({ length: n }, () => new Float64Array(residuals.length))
  const difference = 1e-5

  const differentiate = () => {
    trial.set(x)
    for (let j = 0; j < n; j++) {
      trial[j] = x[j]! + difference
      const above = problem.residuals(trial)
      trial[j] = x[j]! - difference
      const below = problem.residuals(trial)
      trial[j] = x[j]!
      const column = jacobian[j]!
      for (let i = 0; i < column.length; i++) column[i] = (above[i]! - below[i]!) / (2 * difference)
      evaluations += 2
    }
    for (let j = 0; j < n; j++) {
      let sum = 0
      for (let i = 0; i < residuals.length; i++) sum += jacobian[j]![i]! * residuals[i]!
      slope[j] = sum
      for (let k = 0; k <= j; k++) {
        let product = 0
        for (let i = 0; i < residuals.length; i++) product += jacobian[j]![i]! * jacobian[k]![i]!
        normal[j * n + k] = product
        normal[k * n + j] = product
      }
    }
    for (let j = 0; j < n; j++) {
      const outwards = (x[j]! <= problem.low[j]! && slope[j]! > 0) || (x[j]! >= problem.high[j]! && slope[j]! < 0)
      if (!outwards) continue
      for (let k = 0; k < n; k++) {
        normal[j * n + k] = 0
        normal[k * n + j] = 0
      }
      normal[j * n + j] = 1
      slope[j] = 0
    }
  }

  /** Solves with the present damping and puts the clamped point into `trial`; false where the system is singular. */
  const tryStep = (): boolean => {
    damped.set(normal)
    for (let j = 0; j < n; j++) {
      damped[j * n + j] = normal[j * n + j]! * (1 + damping) + 1e-14
      step[j] = -slope[j]!
    }
    if (!solveReal(damped, step, n)) return false
    for (let j = 0; j < n; j++) {
      const length = Math.min(1, Math.max(-1, step[j]!))
      trial[j] = Math.min(problem.high[j]!, Math.max(problem.low[j]!, x[j]! + length))
    }
    return true
  }

  for (let round = 0; round < 60; round++) {
    differentiate()
    let gained = false
    while (damping < 1e8) {
      const solved = tryStep()
      const there = solved ? problem.residuals(trial) : []
      evaluations++
      const costThere = solved ? sumOfSquares(there) : Number.POSITIVE_INFINITY
      if (costThere < cost) {
        gained = cost - costThere > leastGain * cost
        x.set(trial)
        residuals = there
        cost = costThere
        damping = Math.max(damping / 8, 1e-12)
        break
      }
      damping *= 4
    }
    if (!gained) break
  }
  return { x, cost, evaluations }
}
