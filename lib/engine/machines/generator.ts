import type { Complex } from '../../units/si'
import type { GeneratorInput } from '../generator-input'

/** Numbers that a generator adds to the state of a run: E″ (re, im), E′_q, E_fd in V and the regulator's reset; P_m in W; speed in parts of rated. */
export const generatorStates = 7
export const generatorState = { re: 0, im: 1, transient: 2, excitation: 3, reset: 4, power: 5, speed: 6 } as const

/** Reactance in ohm behind which the generator meets the first instant: X″_d, or X′_d where that is unknown. */
export const firstReactance = ({ subtransient, transient }: GeneratorInput): number =>
  subtransient?.reactance ?? transient

/** What it takes to carry a load in the steady state. */
export interface GeneratorBalance {
  /** Unit vector of the quadrature axis, in the frame of the given voltage. */
  axis: Complex
  /** E″ in the rotor's frame (quadrature axis real), E′_q and E_fd, V. */
  re: number
  im: number
  transient: number
  excitation: number
  /** Power across the air gap, W. */
  power: number
}

/**
 * Steady state of a generator with line voltage V at its terminals and current J (√3·I) delivered, at rated speed.
 *
 * The quadrature axis lies along V + (r + jX_q)·J; E_fd = E″_q + (X_d − X″_d)·I_d. Source: two-axis theory in any
 * textbook on synchronous machines, without saturation.
 */
export function generatorBalance(generator: GeneratorInput, voltage: Complex, current: Complex): GeneratorBalance {
  const { resistance: r, synchronous, transient, quadrature } = generator
  const x = firstReactance(generator)
  const xq = quadrature?.reactance ?? x
  const behind = (reactance: number): Complex => ({
    re: voltage.re + r * current.re - reactance * current.im,
    im: voltage.im + r * current.im + reactance * current.re,
  })
  const along = behind(xq)
  const size = Math.hypot(along.re, along.im)
  const axis = { re: along.re / size, im: along.im / size }
  const turned = ({ re, im }: Complex): Complex => ({
    re: re * axis.re + im * axis.im,
    im: im * axis.re - re * axis.im,
  })
  const emf = turned(behind(x))
  const direct = -turned(current).im
  const excitation = emf.re + (synchronous - x) * direct
  return {
    axis,
    re: emf.re,
    im: emf.im,
    transient: excitation - (synchronous - transient) * direct,
    excitation,
    power: emf.re * turned(current).re + emf.im * turned(current).im,
  }
}

/** Set points that hold a steady state: reference voltage of the regulator in V, power reference of the governor in W. */
export interface SetPoints {
  voltage: number
  power: number
}

/**
 * Rates of a generator that delivers the current J = re + j·im (rotor's frame) at the terminal voltage V (size, V):
 *
 * T″_d0·dE″_q/dt = E′_q − E″_q − (X′_d − X″_d)·I_d with T″_d0 = T″_d·X′_d/X″_d; T″_q0·dE″_d/dt = −E″_d − (X_q − X″_d)·I_q
 * (X″_q taken as X″_d); T′_d0·dE′_q/dt = E_fd − E′_q − (X_d − X′_d)·I_d; T_e·dE_fd/dt = K(V_ref − V) + x held between 0
 * and the ceiling, minus E_fd; T_i·dx/dt = the same held value minus x (x = 0 without reset); T_g·dP_m/dt = P_ref − (n − 1)·S_r/droop held between 0 and the largest power, minus P_m;
 * 2H·S_r·dn/dt = P_m − P_e. The regulator's limit stands before the exciter's lag, so that excitation rises towards
 * the ceiling rather than at once to it, which is the cautious reading.
 *
 * @param power P_e across the air gap, W
 */
export function generatorRates(
  generator: GeneratorInput,
  set: SetPoints,
  state: Float64Array,
  at: number,
  re: number,
  im: number,
  voltage: number,
  power: number,
  rate: Float64Array,
): void {
  const { synchronous, transient, subtransient, quadrature, regulator, governor } = generator
  const direct = -im
  const field = (state[at + 3]! - state[at + 2]! - (synchronous - transient) * direct) / generator.transientTime
  rate[at + 2] = field
  if (subtransient === null) rate[at] = field
  else {
    const time = (subtransient.time * transient) / subtransient.reactance
    rate[at] = (state[at + 2]! - state[at]! - (transient - subtransient.reactance) * direct) / time
  }
  const x = subtransient === null ? transient : subtransient.reactance
  rate[at + 1] = quadrature === null ? 0 : (-state[at + 1]! - (quadrature.reactance - x) * re) / quadrature.time
  rate[at + 3] = 0
  rate[at + 4] = 0
  if (regulator !== null) {
    const { gain, time, reset } = regulator
    const asked = gain * (set.voltage - voltage) + (reset === null ? 0 : state[at + 4]!)
    const given = Math.max(0, Math.min(ceilingOf(generator, voltage), asked))
    rate[at + 3] = (given - state[at + 3]!) / time
    if (reset !== null) rate[at + 4] = (given - state[at + 4]!) / reset
  }
  rate[at + 5] = 0
  rate[at + 6] = 0
  if (governor === null) return
  const wanted = set.power - ((state[at + 6]! - 1) * generator.ratedPower) / governor.droop
  rate[at + 5] = (Math.max(0, Math.min(governor.largestPower, wanted)) - state[at + 5]!) / governor.time
  rate[at + 6] = (state[at + 5]! - power) / (2 * generator.inertia * generator.ratedPower)
}

/** Largest excitation in V at a terminal voltage; without a regulator there is none. */
export const ceilingOf = ({ regulator, ratedVoltage }: GeneratorInput, voltage: number): number =>
  regulator === null
    ? Number.POSITIVE_INFINITY
    : regulator.ceiling * (regulator.fedFromTerminals ? Math.min(voltage, ratedVoltage) : ratedVoltage)

/** Error allowed in a step in the states of a generator, from that allowed in parts of rated. */
export function scaleGenerator(
  { ratedVoltage, ratedPower }: GeneratorInput,
  scale: Float64Array,
  at: number,
  tolerance: number,
): void {
  scale.fill(tolerance * ratedVoltage, at, at + generatorState.power)
  scale[at + generatorState.power] = tolerance * ratedPower
  scale[at + generatorState.speed] = tolerance
}

const positive = (value: number): boolean => Number.isFinite(value) && value > 0

/** What no generator can be, as the end of a sentence; null where all is well. */
export function generatorProblem(generator: GeneratorInput): string | null {
  const { ratedPower, ratedVoltage, resistance, synchronous, transient, transientTime, inertia } = generator
  const { subtransient, quadrature, regulator, governor } = generator
  if (![ratedPower, ratedVoltage, synchronous, transient, transientTime, inertia].every(positive))
    return 'needs ratings, reactances, a time constant and an inertia above zero.'
  if (!(resistance >= 0 && Number.isFinite(resistance))) return 'needs a resistance of zero or more.'
  if (transient > synchronous) return 'needs a transient reactance that is not above the synchronous one.'
  if (subtransient && !(positive(subtransient.reactance) && positive(subtransient.time)))
    return 'needs a sub-transient reactance and time constant above zero.'
  if (subtransient && subtransient.reactance > transient)
    return 'needs a sub-transient reactance that is not above the transient one.'
  if (quadrature && !(positive(quadrature.reactance) && positive(quadrature.time)))
    return 'needs a quadrature reactance and time constant above zero.'
  if (regulator && ![regulator.gain, regulator.time, regulator.ceiling].every(positive))
    return 'needs a regulator with gain, time constant and ceiling above zero.'
  if (regulator && regulator.reset !== null && !positive(regulator.reset)) return 'needs a reset time above zero.'
  if (governor && ![governor.droop, governor.time, governor.largestPower].every(positive))
    return 'needs a governor with droop, time constant and largest power above zero.'
  return null
}
