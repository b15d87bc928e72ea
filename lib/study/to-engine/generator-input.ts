import type { GeneratorInput } from '../../engine/generator-input'
import { type Ohm, ohm, perUnit, second, volt, voltAmpere, watt } from '../../units/si'
import type { GeneratorLevel } from '../document/generator-level'

/** A generator in ohm from its data in parts of its rating. */
export const generatorInput = (level: GeneratorLevel, ratedVoltage: number): GeneratorInput => {
  const base = ratedVoltage ** 2 / level.rating.si
  const inOhm = ({ si }: { si: number }): Ohm => ohm(si * base)
  const axis = (one: GeneratorLevel['subtransient']) =>
    one && { reactance: inOhm(one.reactance), time: second(one.time.si) }
  const { regulator, governor } = level
  return {
    ratedPower: voltAmpere(level.rating.si),
    ratedVoltage: volt(ratedVoltage),
    resistance: level.resistance ? inOhm(level.resistance) : ohm(0),
    synchronous: inOhm(level.synchronous),
    transient: inOhm(level.transient),
    transientTime: second(level.transientTime.si),
    subtransient: axis(level.subtransient),
    quadrature: axis(level.quadrature),
    regulator: regulator && {
      gain: regulator.gain.si,
      time: second(regulator.time.si),
      reset: regulator.reset && second(regulator.reset.si),
      ceiling: perUnit(regulator.ceiling.si),
      fedFromTerminals: regulator.fedFromTerminals,
    },
    inertia: second(level.inertia.si),
    governor: governor && {
      droop: perUnit(governor.droop.si),
      time: second(governor.time.si),
      largestPower: watt(governor.power.si),
    },
  }
}
