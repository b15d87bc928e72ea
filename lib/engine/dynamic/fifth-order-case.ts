import { ampere, ohm, radianPerSecond, second, volt } from '../../units/si'
import { type CaseInput, circuitOf } from '../case-input'
import type { CaseResult, MotorResult, PlaceResult } from '../case-result'
import { beforeStart } from '../runup/before-start'
import { createObserver, observationLength, placeOf } from '../runup/observation'
import { preparePlant } from '../runup/plant'
import { caseSeries } from '../runup/results'
import { addSample, type SampleStore, sampleAt, sampleStore } from '../runup/sampler'
import { type UnfitCause, unfitFor } from './chosen-model'
import { createEnvelopeRecord, type EnvelopeRecord, firstEquivalent } from './envelope-record'
import { followStart, frictional } from './follow-start'
import { directTimeConstant, machineAlong } from './machine-along'
import { networkAlong } from './network-along'
import { averagedTorque, extreme, lastSpeed, peaksOf, startResult } from './start-figures'
import type { TransientStartResult } from './transient-result'
import { transientSeries } from './transient-series'

/**
 * Computes a case with one direct start by the fifth-order model behind the network's equivalent along the run-up.
 *
 * Voltages, currents and powers are those of half periods of the supply, the lowest phase of a voltage and the highest
 * of a current, at the stated switching angle or at the worst of all for each figure. What precedes the start, settled
 * states and the running machines' speeds are those of the quasi-static run.
 *
 * @param steady the same case by the quasi-static model
 * @returns the case's result, or why the model does not fit it
 */
export function fifthOrderCase(
  input: CaseInput,
  steady: CaseResult,
  switchingAngle: number | null,
): { ok: true; result: CaseResult } | { ok: false; cause: UnfitCause } {
  const unfit = unfitFor(input)
  if (unfit !== null) return { ok: false, cause: unfit }
  const motor = input.motors.findIndex(({ duty }) => duty.kind === 'starting')
  const steadyStart = steady.motors.find(({ motorId }) => motorId === input.motors[motor]!.id)?.start
  if (steadyStart?.outcome.kind === 'tripped') return { ok: false, cause: 'trip' }
  const plant = preparePlant(input)
  const before = plant.ok ? beforeStart(plant.value) : plant
  if (!before.ok || !steadyStart) return { ok: false, cause: 'no-start' }
  const { system, speeds } = before.value
  const observed = new Float64Array(observationLength(system))
  createObserver(system)(speeds, observed)
  const along = networkAlong(system, motor, speeds, steady)
  if (along === null) return { ok: false, cause: 'network' }

  const own = input.motors[motor]!
  const { duty } = own
  const from = duty.kind === 'starting' ? (duty.initialSpeed ?? 0) : 0
  const at = steadyStart.switchedOnAt
  const machine = machineAlong(circuitOf(own.circuit), along, input.frequency, own.poles, from)
  const load = frictional(system, motor)
  const place = placeOf(system, motor, 'speed')
  const busOfMotor = input.buses.findIndex(({ id }) => id === own.busId)
  const parts = { place, busOfMotor, at, angle: switchingAngle, factor: own.torqueFactor, load }
  const { record, note } = createEnvelopeRecord(along, parts)
  const timeConstant = directTimeConstant(machine)
  const done = followStart(system, motor, machine, load, from, record, note)

  const samples = withState(record.samples, observed, place, from, at, load)
  const places = placeResults(steady, samples, record, at)
  const start = startResult({ input, system, motor, steady: steadyStart, done, samples, from })
  const transient: TransientStartResult = {
    motorId: own.id,
    switchingAngle,
    worstAngle: -done.run.peak.towards,
    equivalent: equivalentOf(firstEquivalent(along, from)),
    firstHalfPeriod: volt(sampleAt(record.samples, 0)[busOfMotor]!),
    firstPeriod: volt(firstPeriod(record.samples, busOfMotor)),
    largestCurrent: start.peakMotorCurrent,
    direct: { current: ampere(record.direct[1] ?? 0), timeConstant: second(timeConstant) },
    ...averagedTorque(record),
  }
  const series = caseSeries(system, samples)
  return {
    ok: true,
    result: {
      ...steady,
      model: 'fifth-order',
      outcome: { kind: 'complete' },
      places,
      motors: steady.motors.map((each): MotorResult => {
        if (each.motorId === own.id)
          return { motorId: own.id, start, running: null, speedAtEnd: radianPerSecond(lastSpeed(samples, place)) }
        const bus = places.find(({ busId }) => busId === input.motors.find(({ id }) => id === each.motorId)!.busId)
        return each.running && bus ? { ...each, running: { ...each.running, lowestVoltage: bus.deepest } } : each
      }),
      counters: {
        ...steady.counters,
        steps: done.run.counters.steps,
        rejected: done.run.counters.rejected,
        evaluations: done.run.counters.evaluations,
        largestErrorRatio: done.run.counters.largestErrorRatio,
      },
      peaks: [peaksOf(own, done, at, switchingAngle)],
      transient,
      series: { ...series, transient: transientSeries(own.id, record, done, at, switchingAngle) },
    },
  }
}

/** The samples with the state before the start in front of them. */
function withState(
  samples: SampleStore,
  observed: Float64Array,
  place: number,
  from: number,
  at: number,
  load: (speed: number) => number,
): SampleStore {
  const whole = sampleStore(samples.width)
  const first = Float64Array.from(observed)
  first[place] = from
  first[place + 2] = load(from)
  first[place + 3] = -load(from)
  if (at > 0) addSample(whole, 0, first)
  addSample(whole, at, first)
  for (let i = 0; i < samples.count; i++) addSample(whole, samples.time[i]!, sampleAt(samples, i))
  return whole
}

function firstPeriod(samples: SampleStore, bus: number): number {
  const halves = Math.min(2, samples.count)
  let sum = 0
  for (let i = 0; i < halves; i++) sum += sampleAt(samples, i)[bus]! ** 2
  return Math.sqrt(sum / halves)
}

const equivalentOf = ({ emf, impedance }: ReturnType<typeof firstEquivalent>): TransientStartResult['equivalent'] => ({
  emf: volt(emf),
  impedance: { re: ohm(impedance.re), im: ohm(impedance.im) },
})

function placeResults(
  steady: CaseResult,
  samples: SampleStore,
  { highest }: EnvelopeRecord,
  at: number,
): PlaceResult[] {
  const first = samples.time.subarray(0, samples.count).findIndex((t) => t > at)
  return steady.places.map((place, b) => {
    const deepest = extreme(samples, b, 1, at)
    const top = highest[b]!.voltage > place.before ? highest[b]! : { voltage: place.before, at: 0 }
    return {
      ...place,
      first: volt(sampleAt(samples, first)[b]!),
      deepest: { voltage: volt(deepest.value), at: second(deepest.at) },
      highest: { voltage: volt(top.voltage), at: second(top.at) },
    }
  })
}
