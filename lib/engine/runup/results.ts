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
import type { MotorInput } from '../case-input'
import type {
  CaseSeries,
  HeatUsed,
  MotorResult,
  MotorSeries,
  PlaceResult,
  RunningOutcome,
  RunningResult,
  StartResult,
} from '../case-result'
import { type DutyResult, judgeDuty } from '../starters/duty'
import type { Courses, RunningCourse, StartCourse } from './course'
import type { Watch } from './extremes'
import { generatorSeries } from './generator-result'
import { generatorPlace, generators, placeOf } from './observation'
import { plotScales } from './recorder'
import { type SampleStore, sampleAt, thinSamples } from './sampler'
import type { SettledStates } from './settled'
import type { RunRecord } from './simulate'
import type { System } from './system'

const voltageAt = (watch: Watch) => ({ voltage: volt(watch.value), at: second(watch.at) })
const currentAt = (watch: Watch) => ({ current: ampere(watch.value), at: second(watch.at) })

/** Voltages of every bus. Empty when the network had no solution at the first switching-on. */
export function placeResults(
  system: System,
  courses: Courses,
  record: RunRecord,
  settled: SettledStates,
): PlaceResult[] {
  const { buses } = system.plant.input
  const before = sampleAt(record.samples, 0)
  const first = record.first ?? (courses.starts.length === 0 ? before : null)
  if (first === null) return []
  const none = courses.starts.length === 0 && record.first === null
  return buses.map((bus, b) => {
    const { deepest, highest } = courses.buses[b]!
    return {
      busId: bus.id,
      nominal: bus.nominal,
      before: volt(before[b]!),
      first: volt(first[b]!),
      deepest: none ? { voltage: volt(before[b]!), at: second(0) } : voltageAt(deepest),
      highest: voltageAt(highest),
      settledAfterStart: settled.afterStart === null ? null : volt(settled.afterStart[b]!),
      settledAfterProcess: settled.afterProcess === null ? null : volt(settled.afterProcess[b]!),
    }
  })
}

/** Results of every motor, in the order of the case. Motors that a collapse kept from being switched on are left out. */
export function motorResults(
  system: System,
  courses: Courses,
  record: RunRecord,
  settled: SettledStates,
): MotorResult[] {
  const speedOf = (motor: number): RadianPerSecond => radianPerSecond(settled.speeds[motor]!)
  const settledSpeed = (motor: number): RadianPerSecond | null =>
    settled.afterStart === null ? null : radianPerSecond(settled.afterStart[placeOf(system, motor, 'speed')]!)
  return system.plant.motors.flatMap((motor, i): MotorResult[] => {
    const start = courses.starts.find((each) => each.motor === i)
    const running = courses.running.find((each) => each.motor === i)
    const shared = { motorId: motor.id, speedAtEnd: speedOf(i) }
    if (running) return [{ ...shared, start: null, running: runningResult(running, record, settledSpeed(i)) }]
    if (!start || start.standstill === null) return []
    const earlier = courses.earlier
      .filter((each) => each.motor === i && each.standstill !== null)
      .map((each) => startResult(system, each, record, speedWhenOff(each, speedOf(i)), null))
    return [
      {
        ...shared,
        start: startResult(system, start, record, speedOf(i), settledSpeed(i)),
        ...(earlier.length > 0 && { earlierAttempts: earlier }),
        running: null,
      },
    ]
  })
}

/** Speed at which an earlier attempt ended short of the criterion. */
const speedWhenOff = ({ outcome }: StartCourse, otherwise: RadianPerSecond): RadianPerSecond =>
  outcome !== null && 'speed' in outcome ? outcome.speed : otherwise

function startResult(
  system: System,
  start: StartCourse,
  record: RunRecord,
  speedAtEnd: RadianPerSecond,
  settledSpeed: RadianPerSecond | null,
): StartResult {
  const i = start.motor
  const motor = system.plant.motors[i]!
  const at = system.integral[i]!
  const i2t = start.i2t ?? record.state[at]!
  const slipEnergy = start.slipEnergy ?? record.state[at + 1]!
  const since = (instant: number | null) => (instant === null ? null : second(instant - start.at))
  const { accelerating } = start.watches
  const hangs = start.outcome !== null && start.outcome.kind !== 'started'
  const reached = start.atCriterion === null ? speedAtEnd : start.speedCriterion
  return {
    outcome: start.outcome ?? { kind: 'timed-out', speed: radianPerSecond(record.state[i]!) },
    switchedOnAt: second(start.at),
    timeTo95: since(start.at95),
    timeToCriterion: since(start.atCriterion),
    standstill: start.standstill!,
    peakLineCurrent: currentAt(start.watches.line),
    peakMotorCurrent: currentAt(start.watches.motor),
    leastAccelerating: {
      torque: newtonMetre(accelerating.value),
      ofRated: perUnit(accelerating.value / motor.ratedTorque),
      speed: speedAt(system, record, i, accelerating.at),
    },
    lowestMotorVoltage: voltageAt(start.watches.voltage),
    i2t: ampereSquaredSecond(i2t),
    slipEnergy: joule(slipEnergy),
    kineticEnergy: joule((motor.inertia * reached ** 2) / 2),
    heatUsed: heatUsed(system, i, i2t + (start.extraAtCriterion ?? start.extraHeat), slipEnergy),
    ...deviceDuty(start, motor, record),
    settledSpeed: hangs && record.end.kind === 'settled' ? speedAtEnd : settledSpeed,
  }
}

function deviceDuty(start: StartCourse, { duty }: MotorInput, { end }: RunRecord): { device?: DutyResult } {
  if (duty.kind !== 'starting') return {}
  const device = judgeDuty(start.starter, duty.starterDuty, (start.runningAt ?? end.at) - start.at)
  return device === null ? {} : { device }
}

/** ∫I²dt (referred to the winding) and slip energy in parts of what the permissible locked-rotor time allows, both at rated voltage and as declared. */
export function heatUsed(system: System, i: number, i2t: number, slipEnergy: number): HeatUsed {
  const { lockedRotorCurrent, lockedRotorTorque, permissibleTime } = system.plant.motors[i]!.declared
  if (permissibleTime === null) return { byCurrent: null, byRotor: null, figure: null, state: null }
  const { time, state } = permissibleTime
  const byCurrent = lockedRotorCurrent === null ? null : perUnit(i2t / (lockedRotorCurrent ** 2 * time))
  const byRotor =
    lockedRotorTorque === null ? null : perUnit(slipEnergy / (lockedRotorTorque * system.plant.synchronous[i]! * time))
  const figure = byCurrent === null || byRotor === null ? null : perUnit(Math.max(byCurrent, byRotor))
  return { byCurrent, byRotor, figure, state }
}

function runningOutcome({ pulledOutAt, contactor }: RunningCourse): RunningOutcome {
  const { droppedAt, reclosedAt } = contactor ?? { droppedAt: null, reclosedAt: null }
  if (droppedAt !== null && (reclosedAt === null || reclosedAt < droppedAt))
    return { kind: 'dropped-out', at: second(droppedAt) }
  if (pulledOutAt !== null) return { kind: 'pulled-out', at: second(pulledOutAt) }
  if (droppedAt === null || reclosedAt === null) return { kind: 'rode-through' }
  return { kind: 're-accelerated', droppedAt: second(droppedAt), reclosedAt: second(reclosedAt) }
}

function runningResult(running: RunningCourse, record: RunRecord, settledSpeed: RadianPerSecond | null): RunningResult {
  const { watches, before, motor } = running
  const none = Number.isNaN(watches.voltage.value)
  return {
    outcome: runningOutcome(running),
    before,
    lowestVoltage: none ? { voltage: before.motorVoltage, at: second(0) } : voltageAt(watches.voltage),
    lowestSpeed: none
      ? { speed: before.speed, at: second(0) }
      : { speed: radianPerSecond(watches.speed.value), at: second(watches.speed.at) },
    peakCurrent: none ? { current: before.motorCurrent, at: second(0) } : currentAt(watches.current),
    settledSpeed: settledSpeed ?? (record.end.kind === 'settled' ? radianPerSecond(record.state[motor]!) : null),
  }
}

/** Speed of a motor at an instant of the run, by a straight line between samples. */
function speedAt(system: System, { samples }: RunRecord, motor: number, t: number): RadianPerSecond {
  const place = placeOf(system, motor, 'speed')
  const { time, data, width } = samples
  let [low, high] = [0, samples.count - 1]
  while (high - low > 1) {
    const middle = (low + high) >> 1
    if (time[middle]! <= t) low = middle
    else high = middle
  }
  const span = time[high]! - time[low]!
  const part = span > 0 ? Math.min(1, Math.max(0, (t - time[low]!) / span)) : 0
  const from = data[low * width + place]!
  return radianPerSecond(from + part * (data[high * width + place]! - from))
}

const plotted = [
  'speed',
  'torque',
  'loadTorque',
  'lineCurrent',
  'motorCurrent',
  'motorVoltage',
  'active',
  'reactive',
] as const

/** The run as lines to draw: as few samples as show it truly. */
export function caseSeries(system: System, samples: SampleStore): CaseSeries {
  const { buses } = system.plant.input
  const { motors } = system.plant
  const places = motors.flatMap((_, i) => plotted.map((which) => placeOf(system, i, which)))
  if (generators(system)) places.push(generatorPlace(system, 'frequency'), generatorPlace(system, 'excitation'))
  const kept = thinSamples(samples, [...buses.keys(), ...places], plotScales(system))
  const column = (place: number): number[] => kept.map((index) => samples.data[index * samples.width + place]!)
  const motorSeries = (i: number): MotorSeries => ({
    speed: column(placeOf(system, i, 'speed')),
    torque: column(placeOf(system, i, 'torque')),
    loadTorque: column(placeOf(system, i, 'loadTorque')),
    lineCurrent: column(placeOf(system, i, 'lineCurrent')),
    motorCurrent: column(placeOf(system, i, 'motorCurrent')),
    motorVoltage: column(placeOf(system, i, 'motorVoltage')),
    activePower: column(placeOf(system, i, 'active')),
    reactivePower: column(placeOf(system, i, 'reactive')),
  })
  return {
    time: kept.map((index) => samples.time[index]!),
    busVoltage: Object.fromEntries(buses.map((bus, b) => [bus.id, column(b)])),
    motors: Object.fromEntries(motors.map((motor, i) => [motor.id, motorSeries(i)])),
    ...(generators(system) && { generator: generatorSeries(system, column) }),
  }
}
