import { hertz, type PerUnit, perUnit, type Second, second, volt, watt } from '../../units/si'
import type { GeneratorResult, GeneratorSeries } from '../case-result'
import type { Courses } from './course'
import type { Watch } from './extremes'
import type { GeneratorCourse } from './generator-course'
import { generatorPlace } from './observation'
import { type SampleStore, sampleAt } from './sampler'
import type { RunRecord } from './simulate'
import type { System } from './system'

/** Room below the ceiling, in parts of rated voltage, that counts as none. */
const noRoom = 1e-3

const setOf = ({ plant }: System) => (plant.input.supply.generator ?? plant.input.disturbance?.to?.generator)!

/** How the generator of a run fared. */
export function generatorResult(system: System, courses: Courses, record: RunRecord): GeneratorResult {
  const course = courses.generator!
  const { samples, end } = record
  const last = sampleAt(samples, samples.count - 1)
  const frequency = generatorPlace(system, 'frequency')
  const limited = last[generatorPlace(system, 'room')]! < noRoom * setOf(system).ratedVoltage
  const givenUp = courses.starts.some(({ outcome }) => outcome?.kind === 'timed-out' || outcome?.kind === 'tripped')
  const reached = end.kind === 'settled' && !givenUp
  const hunts = end.kind === 'horizon' && courses.starts.every(({ outcome }) => outcome !== null)
  const extreme = (each: Watch, otherwise: number) =>
    Number.isNaN(each.value) ? { value: otherwise, at: second(0) } : { value: each.value, at: second(each.at) }
  const { voltage, lowest, highest, power } = course.watches
  const rated = system.plant.input.frequency
  const [low, slow, fast, most] = [
    extreme(voltage, course.held),
    extreme(lowest, rated),
    extreme(highest, rated),
    extreme(power, last[generatorPlace(system, 'power')]!),
  ]
  return {
    outcome: end.kind === 'collapsed' ? 'failed' : limited ? 'not-recovered' : hunts ? 'hunting' : 'recovered',
    held: volt(course.held),
    first: course.first === null ? null : volt(course.first),
    lowest: { voltage: volt(low.value), at: low.at },
    sustained: course.sustained === null ? null : volt(course.sustained),
    settled: reached ? volt(last[course.bus]!) : null,
    lowestFrequency: { frequency: hertz(slow.value), at: slow.at },
    highestFrequency: { frequency: hertz(fast.value), at: fast.at },
    settledFrequency: reached ? hertz(last[frequency]!) : null,
    largestPower: { power: watt(most.value), at: most.at },
    atCeiling: second(timeAtCeiling(system, samples)),
  }
}

/** Time between samples that both lie at the ceiling. */
function timeAtCeiling(system: System, samples: SampleStore): number {
  const { time, data, width, count } = samples
  const place = generatorPlace(system, 'room')
  const excitation = generatorPlace(system, 'excitation')
  const least = noRoom * setOf(system).ratedVoltage
  const at = (i: number): boolean => data[i * width + excitation]! > 0 && data[i * width + place]! < least
  let sum = 0
  for (let i = 1; i < count; i++) if (at(i) && at(i - 1)) sum += time[i]! - time[i - 1]!
  return sum
}

/** Largest power over what the prime mover gives, where it exceeds that; null otherwise. */
export function overload(system: System, { watches }: GeneratorCourse): { share: PerUnit; at: Second } | null {
  const { governor } = setOf(system)
  if (governor === null || !(watches.power.value > governor.largestPower)) return null
  return { share: perUnit(watches.power.value / governor.largestPower), at: second(watches.power.at) }
}

/** The generator's part of the curves. */
export const generatorSeries = (system: System, column: (place: number) => number[]): GeneratorSeries => ({
  frequency: column(generatorPlace(system, 'frequency')),
  excitation: column(generatorPlace(system, 'excitation')),
  power: column(generatorPlace(system, 'power')),
})
