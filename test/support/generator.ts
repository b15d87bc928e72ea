import type { GeneratorInput } from '@/lib/engine/generator-input'
import { ohm, perUnit, second, volt, voltAmpere, watt } from '@/lib/units/si'

/** A set of 1 MVA, 400 V with reactances in parts of its rating (0.16 Ω); values of the usual size, from no data sheet. */
export function generator(changes: Partial<GeneratorInput> = {}, rating = 1e6): GeneratorInput {
  const base = 400 ** 2 / rating
  return {
    ratedPower: voltAmpere(rating),
    ratedVoltage: volt(400),
    resistance: ohm(0),
    synchronous: ohm(2.4 * base),
    transient: ohm(0.2 * base),
    transientTime: second(2.5),
    subtransient: { reactance: ohm(0.14 * base), time: second(0.02) },
    quadrature: { reactance: ohm(1.4 * base), time: second(0.1) },
    regulator: { gain: 15, time: second(0.05), reset: second(1), ceiling: perUnit(5), fedFromTerminals: false },
    inertia: second(1.2),
    governor: { droop: perUnit(0.04), time: second(0.3), largestPower: watt(0.88 * rating) },
    ...changes,
  }
}
