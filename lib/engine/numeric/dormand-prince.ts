/** Writes dy/dt at (t, y); false where the function has no value (the step is then tried shorter). */
export type Derivative = (t: number, y: Float64Array, dy: Float64Array) => boolean

/** Outcome of one step: `blocked` means that the function has no value beyond here however short the step. */
export type StepOutcome = 'accepted' | 'blocked'

export interface Integrator {
  /** Begin of the last accepted step. */
  readonly from: number
  /** End of the last accepted step, where the next one begins. */
  readonly time: number
  /** State at `time`; changed only between steps, and then `restart` follows. */
  readonly state: Float64Array
  readonly counters: { steps: number; rejected: number; evaluations: number; largestErrorRatio: number }
  /** Begins anew at t with the present state; a zero `firstStep` lets the integrator choose. False where the function has no value. */
  restart(t: number, firstStep: number): boolean
  /** The step that would be taken next. */
  readonly nextStep: number
  /** One accepted step that does not pass `until`. */
  advance(until: number): StepOutcome
  /** State anywhere in the last two accepted steps, to fourth order. */
  interpolate(t: number, into: Float64Array): void
  /** Shortens the last step so that it ends at t: the state becomes the interpolated one. `restart` follows. */
  cutAt(t: number): void
}

const a21 = 1 / 5
const [a31, a32] = [3 / 40, 9 / 40]
const [a41, a42, a43] = [44 / 45, -56 / 15, 32 / 9]
const [a51, a52, a53, a54] = [19372 / 6561, -25360 / 2187, 64448 / 6561, -212 / 729]
const [a61, a62, a63, a64, a65] = [9017 / 3168, -355 / 33, 46732 / 5247, 49 / 176, -5103 / 18656]
const [b1, b3, b4, b5, b6] = [35 / 384, 500 / 1113, 125 / 192, -2187 / 6784, 11 / 84]
const [e1, e3, e4, e5, e6, e7] = [71 / 57600, -71 / 16695, 71 / 1920, -17253 / 339200, 22 / 525, -1 / 40]
const d1 = -12715105075 / 11282082432
const d3 = 87487479700 / 32700410799
const d4 = -10690763975 / 1880347072
const d5 = 701980252875 / 199316789632
const d6 = -1453857185 / 822651844
const d7 = 69997945 / 29380423

/** Shortest step as a part of the time scale; below it a function without value counts as a wall. */
const shortest = 1e-10

/**
 * Explicit Runge-Kutta pair of orders 5 and 4 with error control and dense output of order 4.
 *
 * The local error is held below the scale of each component in the root-mean-square sense; the step follows a
 * proportional-integral controller, which also keeps it calm at the stability limit.
 * Source: J. R. Dormand, P. J. Prince, J. Comp. Appl. Math. 6 (1980) 19; dense output and controller as in
 * E. Hairer, S. P. Nørsett, G. Wanner, Solving Ordinary Differential Equations I, II.4-II.6 (coefficients from memory,
 * held by the order tests).
 *
 * @param scale error allowed in each component in one step, in its unit
 * @param longest longest step, s
 */
export function createIntegrator(
  state: Float64Array,
  derivative: Derivative,
  scale: Float64Array,
  longest: number,
): Integrator {
  const n = state.length
  const k = Array.from({ length: 7 }, () => new Float64Array(n))
  const [k1, k2, k3, k4, k5, k6, k7] = k as [
    Float64Array,
    Float64Array,
    Float64Array,
    Float64Array,
    Float64Array,
    Float64Array,
    Float64Array,
  ]
  const trial = new Float64Array(n)
  const next = new Float64Array(n)
  /** Dense output of the last step and the one before: five blocks of n numbers each. */
  let dense = new Float64Array(5 * n)
  let denseBefore = new Float64Array(5 * n)
  const span = { from: 0, length: 0, fromBefore: 0, lengthBefore: 0 }
  const counters = { steps: 0, rejected: 0, evaluations: 0, largestErrorRatio: 0 }
  let time = 0
  let step = 0
  let errorBefore = 1e-4

  const evaluate = (t: number, y: Float64Array, dy: Float64Array): boolean => {
    counters.evaluations++
    return derivative(t, y, dy)
  }

  function stages(h: number): boolean {
    for (let i = 0; i < n; i++) trial[i] = state[i]! + h * a21 * k1[i]!
    if (!evaluate(time + h / 5, trial, k2)) return false
    for (let i = 0; i < n; i++) trial[i] = state[i]! + h * (a31 * k1[i]! + a32 * k2[i]!)
    if (!evaluate(time + 0.3 * h, trial, k3)) return false
    for (let i = 0; i < n; i++) trial[i] = state[i]! + h * (a41 * k1[i]! + a42 * k2[i]! + a43 * k3[i]!)
    if (!evaluate(time + 0.8 * h, trial, k4)) return false
    for (let i = 0; i < n; i++) trial[i] = state[i]! + h * (a51 * k1[i]! + a52 * k2[i]! + a53 * k3[i]! + a54 * k4[i]!)
    if (!evaluate(time + (8 / 9) * h, trial, k5)) return false
    for (let i = 0; i < n; i++)
      trial[i] = state[i]! + h * (a61 * k1[i]! + a62 * k2[i]! + a63 * k3[i]! + a64 * k4[i]! + a65 * k5[i]!)
    if (!evaluate(time + h, trial, k6)) return false
    for (let i = 0; i < n; i++)
      next[i] = state[i]! + h * (b1 * k1[i]! + b3 * k3[i]! + b4 * k4[i]! + b5 * k5[i]! + b6 * k6[i]!)
    return evaluate(time + h, next, k7)
  }

  function errorRatio(h: number): number {
    let sum = 0
    for (let i = 0; i < n; i++) {
      const error = e1 * k1[i]! + e3 * k3[i]! + e4 * k4[i]! + e5 * k5[i]! + e6 * k6[i]! + e7 * k7[i]!
      const part = (h * error) / scale[i]!
      sum += part * part
    }
    return Math.sqrt(sum / n)
  }

  function keepDense(h: number): void {
    const recycled = denseBefore
    denseBefore = dense
    dense = recycled
    span.fromBefore = span.from
    span.lengthBefore = span.length
    span.from = time
    span.length = h
    for (let i = 0; i < n; i++) {
      const rise = next[i]! - state[i]!
      const bend = h * k1[i]! - rise
      dense[i] = state[i]!
      dense[n + i] = rise
      dense[2 * n + i] = bend
      dense[3 * n + i] = rise - h * k7[i]! - bend
      dense[4 * n + i] = h * (d1 * k1[i]! + d3 * k3[i]! + d4 * k4[i]! + d5 * k5[i]! + d6 * k6[i]! + d7 * k7[i]!)
    }
  }

  /** A first step from the size of the derivative and of its change (Hairer, II.4). */
  function chooseFirstStep(): number {
    let [size, slope] = [0, 0]
    for (let i = 0; i < n; i++) {
      size += (state[i]! / scale[i]!) ** 2
      slope += (k1[i]! / scale[i]!) ** 2
    }
    if (slope === 0) return longest / 100
    const guess = Math.min(1e-3, 0.01 * Math.sqrt(Math.max(size, 1) / slope))
    for (let i = 0; i < n; i++) trial[i] = state[i]! + guess * k1[i]!
    if (!evaluate(time + guess, trial, k2)) return guess / 100
    let bend = 0
    for (let i = 0; i < n; i++) bend += ((k2[i]! - k1[i]!) / scale[i]!) ** 2
    const steepest = Math.max(Math.sqrt(slope), Math.sqrt(bend) / guess)
    return Math.min(100 * guess, (0.01 / steepest) ** 0.2, longest)
  }

  return {
    state,
    counters,
    get from() {
      return span.from
    },
    get time() {
      return time
    },
    get nextStep() {
      return step
    },
    restart(t, firstStep) {
      time = t
      if (!evaluate(t, state, k1)) return false
      step = firstStep > 0 ? firstStep : chooseFirstStep()
      errorBefore = 1e-4
      return true
    },
    advance(until) {
      let refused = false
      for (;;) {
        const room = until - time
        // A remainder of less than a tenth of a step is taken along rather than left over.
        const h = step * 1.1 >= room ? room : step
        if (!stages(h)) {
          counters.rejected++
          step = h / 4
          refused = true
          if (step < shortest) return 'blocked'
          continue
        }
        const ratio = errorRatio(h)
        if (!(ratio <= 1)) {
          counters.rejected++
          step = h * Math.max(0.2, 0.9 * ratio ** -0.2)
          if (!(step > 0)) step = h / 5
          refused = true
          if (step < shortest) return 'blocked'
          continue
        }
        keepDense(h)
        time = h === room ? until : time + h
        state.set(next)
        k1.set(k7)
        counters.steps++
        if (ratio > counters.largestErrorRatio) counters.largestErrorRatio = ratio
        const growth = 0.9 * Math.max(ratio, 1e-10) ** -0.17 * errorBefore ** 0.04
        const grown = h * Math.min(refused ? 1 : 8, Math.max(0.2, growth))
        step = Math.min(longest, h < step ? Math.max(step, grown) : grown)
        errorBefore = Math.max(ratio, 1e-4)
        return 'accepted'
      }
    },
    interpolate(t, into) {
      const late = t >= span.from
      const block = late ? dense : denseBefore
      const length = late ? span.length : span.lengthBefore
      const part = length > 0 ? (t - (late ? span.from : span.fromBefore)) / length : 0
      const rest = 1 - part
      for (let i = 0; i < n; i++) {
        const inner = block[3 * n + i]! + rest * block[4 * n + i]!
        const middle = block[2 * n + i]! + part * inner
        into[i] = block[i]! + part * (block[n + i]! + rest * middle)
      }
    },
    cutAt(t) {
      this.interpolate(t, state)
      time = t
    },
  }
}
