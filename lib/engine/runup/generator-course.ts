import { pieceAt } from '../driven/load-segments'
import { createIntegrator } from '../numeric/dormand-prince'
import { type Watch, watch } from './extremes'
import { generatorPlace, generators } from './observation'
import { stepScale } from './step-scale'
import type { System } from './system'

/** How the generator that supplies a plant fares. */
export interface GeneratorCourse {
  /** Place of the supply's bus in an observation. */
  readonly bus: number
  /** Voltage of the bus just after the first load step, V; null before it. */
  first: number | null
  /** Voltage of the bus with every motor held at its speed at that step, once the regulator has done what it can; null where there is none. */
  sustained: number | null
  /** Voltage that the generator holds before it is loaded, V. */
  held: number
  watches: { voltage: Watch; lowest: Watch; highest: Watch; power: Watch }
}

export function generatorCourse(system: System, before: Float64Array): GeneratorCourse | null {
  if (!generators(system)) return null
  const { buses, supply, disturbance } = system.plant.input
  const bus = buses.findIndex(({ id }) => id === supply.busId)
  const fed = supply.generator !== undefined
  const frequency = generatorPlace(system, 'frequency')
  return {
    bus,
    first: null,
    sustained: null,
    held: fed ? before[bus]! : (disturbance?.to?.emf ?? before[bus]!),
    watches: {
      voltage: watch(bus, 1, fed),
      lowest: watch(frequency, 1, fed),
      highest: watch(frequency, -1, fed),
      power: watch(generatorPlace(system, 'power'), -1, fed),
    },
  }
}

/** Longest that a regulator is waited for, s. */
const patience = 60

/**
 * Lets the supply of a plant come to rest from a state on, which is overwritten; whether it did.
 *
 * @param moving false: every speed, also that of the set, stays as it is
 */
export function settleSupply(system: System, state: Float64Array, moving: boolean): boolean {
  const supply = system.supply!
  const resting = Uint8Array.from(system.resting)
  const piece = Int32Array.from(system.piece)
  if (!moving) system.resting.fill(1)
  supply.held = !moving
  const rate = new Float64Array(system.stateLength)
  const integrator = createIntegrator(state, system.derivative, stepScale(system, 1e-7), 1)
  const follow = (): void => {
    for (let i = 0; i < piece.length; i++) system.piece[i] = pieceAt(system.driven[i]!, state[i]!)
  }
  const { ratedTorque, inertia } = system.plant
  const calm = (): boolean =>
    system.derivative(integrator.time, state, rate) &&
    supply.isCalm(rate) &&
    ratedTorque.every((torque, i) => Math.abs(rate[i]! * inertia[i]!) < 1e-4 * torque)
  follow()
  let reached = false
  if (integrator.restart(0, 0)) {
    while (!reached && integrator.time < patience && integrator.advance(patience) === 'accepted') {
      if (moving) follow()
      reached = calm()
    }
  }
  system.resting.set(resting)
  system.piece.set(piece)
  supply.held = false
  return reached
}

/** Notes what the first load step does to a generator; false where the network has no solution any more. */
export function noteGenerator(
  system: System,
  course: GeneratorCourse,
  now: Float64Array,
  state: Float64Array,
  t: number,
): boolean {
  if (!system.supply?.generator || now[course.bus] === 0 || course.first !== null) return true
  course.first = now[course.bus]!
  for (const each of Object.values<Watch>(course.watches)) each.active = true
  const held = Float64Array.from(state)
  if (settleSupply(system, held, false) && system.solveAt(held)) course.sustained = system.supply.terminal
  system.setTime(t)
  return system.solveAt(state)
}
