import type { Complex } from '../../units/si'
import type { StaticLoadInput } from '../case-input'
import { conjugate, scale } from '../numeric/complex'

/**
 * The part of static loads that is not a constant admittance, one entry a load:
 * current drawn I = conj(S₀)·g(|V|²)·V with g(w) = i/(U_r·√w) + p/w, constant below the floor.
 */
export interface NonlinearLoads {
  count: number
  ids: readonly string[]
  /** Node of each load. */
  node: Int32Array
  /** conj(S₀): re, im of each load. */
  power: Float64Array
  /** i/U_r of each load. */
  current: Float64Array
  /** p of each load. */
  share: Float64Array
  /** Square of the voltage at the floor. */
  floor: Float64Array
}

/** Admittance conj(S₀)·z/U_r² of the impedance part, the same above and below the floor. */
export const impedancePart = (load: StaticLoadInput): Complex =>
  scale(conjugate(load.power), load.mix.impedance / load.ratedVoltage ** 2)

const isNonlinear = (load: StaticLoadInput): boolean =>
  (load.mix.current !== 0 || load.mix.power !== 0) && (load.power.re !== 0 || load.power.im !== 0)

/** Collects the current and power parts of the loads. */
export function nonlinearLoads(loads: readonly StaticLoadInput[], nodeOf: ReadonlyMap<string, number>): NonlinearLoads {
  const kept = loads.filter(isNonlinear)
  return {
    count: kept.length,
    ids: kept.map((load) => load.id),
    node: Int32Array.from(kept, (load) => nodeOf.get(load.busId)!),
    power: Float64Array.from(kept.flatMap((load) => [load.power.re, -load.power.im])),
    current: Float64Array.from(kept, (load) => load.mix.current / load.ratedVoltage),
    share: Float64Array.from(kept, (load) => load.mix.power),
    floor: Float64Array.from(kept, (load) => (load.floor * load.ratedVoltage) ** 2),
  }
}
