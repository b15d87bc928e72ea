import {
  ampere,
  ampereSquaredSecond,
  joule,
  newtonMetre,
  perUnit,
  type RadianPerSecond,
  radianPerSecond,
  second,
  volt,
} from '../../units/si'
import type { CaseInput, MotorInput } from '../case-input'
import type { StartOutcome, StartResult } from '../case-result'
import type { DirectStartPeaks } from '../direct-start-peaks'
import { loadTorqueAt } from '../driven/load-segments'
import { placeOf } from '../runup/observation'
import { heatUsed } from '../runup/results'
import { type SampleStore, sampleAt } from '../runup/sampler'
import type { System } from '../runup/system'
import type { EnvelopeRecord } from './envelope-record'
import { creep, type FollowedStart, settledTorque, window } from './follow-start'
import type { TransientStartResult } from './transient-result'

/** The least or largest value of a column after the switching, and when. */
export function extreme(
  samples: SampleStore,
  place: number,
  sign: 1 | -1,
  after: number,
): { value: number; at: number } {
  const found = { value: Number.NaN, at: after }
  for (let i = 0; i < samples.count; i++) {
    const [t, value] = [samples.time[i]!, sampleAt(samples, i)[place]!]
    if (t <= after || sign * value >= sign * found.value) continue
    Object.assign(found, { value, at: t })
  }
  return found
}

/** Speed in the last sample. */
export const lastSpeed = (samples: SampleStore, place: number): number => sampleAt(samples, samples.count - 1)[place]!

/** The start's figures as in the tables of every case. */
export function startResult(parts: {
  input: CaseInput
  system: System
  motor: number
  steady: StartResult
  done: FollowedStart
  samples: SampleStore
  from: number
}): StartResult {
  const { input, system, motor, steady, done, samples, from } = parts
  const own = input.motors[motor]!
  const at = steady.switchedOnAt
  const [to95, toCriterion] = done.run.reached
  const line = extreme(samples, placeOf(system, motor, 'lineCurrent'), -1, at)
  const lowest = extreme(samples, placeOf(system, motor, 'motorVoltage'), 1, at)
  const current = { current: ampere(line.value), at: second(line.at) }
  const end = radianPerSecond(lastSpeed(samples, placeOf(system, motor, 'speed')))
  const criterion = input.settings.speedCriterion * own.ratedSpeed
  const { least } = done
  const started = toCriterion !== null && toCriterion !== undefined
  const outcome: StartOutcome = started
    ? { kind: 'started', at: second(toCriterion) }
    : notStarted(system, motor, done, end)
  return {
    ...steady,
    outcome,
    timeTo95: to95 === null || to95 === undefined ? null : second(to95),
    timeToCriterion: started ? second(toCriterion) : null,
    standstill: {
      ...steady.standstill,
      motorVoltage: volt(firstVoltage(samples, placeOf(system, motor, 'motorVoltage'), at)),
    },
    peakLineCurrent: current,
    peakMotorCurrent: current,
    leastAccelerating:
      least === null || outcome.kind === 'never-turned'
        ? steady.leastAccelerating
        : {
            torque: newtonMetre(least.torque),
            ofRated: perUnit(least.torque / own.ratedTorque),
            speed: radianPerSecond(least.speed),
          },
    lowestMotorVoltage: { voltage: volt(lowest.value), at: second(lowest.at) },
    i2t: ampereSquaredSecond(done.i2t),
    slipEnergy: joule(done.slipEnergy),
    kineticEnergy: joule(
      (own.inertia * (outcome.kind === 'never-turned' ? 0 : started ? Math.max(from, criterion) : end) ** 2) / 2,
    ),
    heatUsed: heatUsed(system, motor, done.i2t, done.slipEnergy),
    settledSpeed: started ? steady.settledSpeed : end,
  }
}

/** RMS voltage over the first half period after switching on. */
function firstVoltage(samples: SampleStore, place: number, at: number): number {
  const index = samples.time.subarray(0, samples.count).findIndex((t) => t > at)
  return sampleAt(samples, index)[place]!
}

/** How a start ended that did not reach the criterion. */
function notStarted(
  system: System,
  motor: number,
  { left, highest, record }: FollowedStart,
  speed: RadianPerSecond,
): StartOutcome {
  const synchronous = system.plant.synchronous[motor]!
  const own: MotorInput = system.plant.motors[motor]!
  const last = record.torque.slice(-window)
  const torque = last.reduce((sum, each) => sum + each, 0) / last.length
  const against = loadTorqueAt(system.driven[motor]!, highest < 2 * creep * synchronous ? 0 : speed)
  const lacking = newtonMetre(Math.max(0, against - torque))
  if (!(Math.abs(left) < settledTorque * own.ratedTorque)) return { kind: 'timed-out', speed }
  if (highest < 2 * creep * synchronous) return { kind: 'never-turned', missing: lacking }
  if (speed >= system.plant.breakdownSpeed[motor]!) return { kind: 'below-criterion', speed }
  return { kind: 'stalled', speed, missing: lacking }
}

/** Instantaneous peaks, of all phases; at the stated angle or the worst. */
export function peaksOf(own: MotorInput, { run }: FollowedStart, at: number, angle: number | null): DirectStartPeaks {
  const moment = ({ torque, at: t }: { torque: number; at: number }) => ({
    torque: newtonMetre(torque * own.torqueFactor),
    at: second(at + t),
  })
  const { re, im, time } = run.opening
  // At a stated angle the peak of the three phases lies within the first periods, which are kept.
  const stated = { current: 0, at: 0 }
  for (let i = 0; angle !== null && i < time.length; i++)
    for (let k = 0; k < 3; k++) {
      const turn = angle - (k * 2 * Math.PI) / 3
      const current = Math.abs(re[i]! * Math.cos(turn) - im[i]! * Math.sin(turn))
      if (current > stated.current) Object.assign(stated, { current, at: time[i]! })
    }
  const peak = angle === null ? run.peak : stated
  return {
    motorId: own.id,
    peakCurrent: { current: ampere(peak.current), at: second(at + peak.at) },
    peakTorque: moment(run.peakTorque),
    lowestTorque: moment(run.lowestTorque),
  }
}

/** Torque over whole periods: greatest and least, the first whole period left out. */
export function averagedTorque({
  torque,
  time,
}: EnvelopeRecord): Pick<TransientStartResult, 'peakTorque' | 'lowestTorque'> {
  const [most, least] = [
    { torque: Number.NEGATIVE_INFINITY, at: 0 },
    { torque: Number.POSITIVE_INFINITY, at: 0 },
  ]
  for (let i = 3; i < torque.length; i++) {
    const mean = torque[i]!
    if (mean > most.torque) Object.assign(most, { torque: mean, at: time[i]! })
    if (mean < least.torque) Object.assign(least, { torque: mean, at: time[i]! })
  }
  const moment = (one: { torque: number; at: number }) => ({ torque: newtonMetre(one.torque), at: second(one.at) })
  return { peakTorque: moment(most), lowestTorque: moment(least) }
}
