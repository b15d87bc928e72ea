import { ohm, radianPerSecond, second, volt, voltAmpere } from '../../units/si'
import type { CaseInput, MotorInput } from '../case-input'
import type { CaseOutcome, CaseResult, Counters } from '../case-result'
import { stepsOf } from '../starters/position'
import { beforeStart, type NoStart, runningMotors } from './before-start'
import { type ContactorCourse, contactorCourse } from './contactor'
import type { Courses, StartCourse } from './course'
import { watch } from './extremes'
import { generatorCourse } from './generator-course'
import { generatorResult } from './generator-result'
import { notices } from './notices'
import { createObserver, motorState, observationLength, placeOf } from './observation'
import { motorOutsideItsCurves } from './outside-curves'
import { preparePlant } from './plant'
import { caseSeries, motorResults, placeResults } from './results'
import { settledStates } from './settled'
import { simulate } from './simulate'
import type { System } from './system'

const noCounters: Counters = {
  steps: 0,
  rejected: 0,
  evaluations: 0,
  networkIterations: 0,
  largestMismatch: 0,
  largestErrorRatio: 0,
}

const nothing = (input: CaseInput, outcome: CaseOutcome): CaseResult => ({
  caseId: input.id,
  model: 'quasi-static',
  outcome,
  supply: null,
  places: [],
  motors: [],
  changeOvers: [],
  notices: [],
  counters: noCounters,
  series: { time: [], busVoltage: {}, motors: {} },
})

/** Computes one case from its input to its result; every end, also one without numbers, is a value. */
export function computeCase(input: CaseInput): CaseResult {
  const prepared = preparePlant(input)
  if (!prepared.ok) return nothing(input, prepared.outcome)
  const found = beforeStart(prepared.value)
  if (!found.ok) return withoutStart(input, found)
  const before = found.value
  const { system } = before
  const observation = new Float64Array(observationLength(system))
  createObserver(system)(before.speeds, observation)
  const courses = prepareCourses(system, observation)
  const record = simulate(before, courses)
  const settled = system.steadily(() => settledStates(system, courses, record))
  const collapsed = record.end.kind === 'collapsed'
  const left = motorOutsideItsCurves(system, record.samples)
  if (left !== null) return nothing(input, left)
  return {
    caseId: input.id,
    model: system.fluxModel === null ? 'quasi-static' : 'third-order',
    outcome:
      record.end.kind === 'collapsed'
        ? { kind: 'collapsed', at: second(record.end.at), busId: record.end.busId ?? input.supply.busId }
        : { kind: 'complete' },
    supply: {
      busId: input.supply.busId,
      impedance: { re: ohm(before.source.impedance.re), im: ohm(before.source.impedance.im) },
      emf: volt(before.emf),
      powerBefore: { re: voltAmpere(before.power.re), im: voltAmpere(before.power.im) },
      powerFirst:
        record.firstPower === null
          ? null
          : { re: voltAmpere(record.firstPower.re), im: voltAmpere(record.firstPower.im) },
    },
    places: placeResults(system, courses, record, settled),
    motors: collapsed && record.first === null ? [] : motorResults(system, courses, record, settled),
    changeOvers: courses.changeOvers,
    notices: notices(before, courses, record),
    counters: { ...record.counters, networkIterations: system.solver.counters.iterations },
    series: caseSeries(system, record.samples),
    ...(courses.generator !== null && { generator: generatorResult(system, courses, record) }),
  }
}

function withoutStart(input: CaseInput, { outcome, motor }: NoStart): CaseResult {
  const result = nothing(input, outcome)
  if (!motor) return result
  const { system, index, speeds } = motor
  const observation = new Float64Array(observationLength(system))
  if (!system.solveAt(speeds)) return result
  createObserver(system)(speeds, observation)
  const state = motorState(system, observation, index)
  return {
    ...result,
    motors: [
      {
        motorId: input.motors[index]!.id,
        start: null,
        running: {
          outcome: { kind: 'no-equilibrium' },
          before: state,
          lowestVoltage: { voltage: state.motorVoltage, at: second(0) },
          lowestSpeed: { speed: state.speed, at: second(0) },
          peakCurrent: { current: state.motorCurrent, at: second(0) },
          settledSpeed: null,
        },
        speedAtEnd: radianPerSecond(speeds[index]!),
      },
    ],
  }
}

function prepareCourses(system: System, before: Float64Array): Courses {
  const { plant } = system
  const { speedCriterion } = plant.input.settings
  const starts = plant.motors.flatMap((motor, i): StartCourse[] => {
    if (motor.duty.kind !== 'starting') return []
    const { starter, capacitors, attempts, contactor, tripAt } = motor.duty
    return [
      {
        motor: i,
        starter,
        at: motor.duty.at,
        steps: stepsOf(starter),
        step: -1,
        position: 'off' as const,
        since: 0,
        switchedOn: false,
        turned: false,
        former: null,
        interval: 0,
        attempts: attempts ?? [],
        attempt: 0,
        contactor: contactor ? contactorCourse({ ...contactor, reclose: null }) : null,
        tripAt: tripAt ?? null,
        undervoltage: starter.kind === 'drive' ? starter.undervoltage : null,
        capacitors: (capacitors ?? []).map((item) => ({ item, state: 'waiting' as const })),
        runningAt: null,
        at95: null,
        atCriterion: null,
        i2t: null,
        slipEnergy: null,
        extraHeat: 0,
        i2tSeen: 0,
        extraAtCriterion: null,
        standstill: null,
        outcome: null,
        speed95: 0.95 * speedOf(motor),
        speedCriterion: speedCriterion * speedOf(motor),
        watches: {
          line: watch(placeOf(system, i, 'lineCurrent'), -1, false),
          motor: watch(placeOf(system, i, 'motorCurrent'), -1, false),
          voltage: watch(placeOf(system, i, 'motorVoltage'), 1, false),
          accelerating: watch(placeOf(system, i, 'accelerating'), 1, false),
        },
      },
    ]
  })
  for (const start of starts) {
    const { duty } = plant.motors[start.motor]!
    if (duty.kind !== 'starting' || !duty.after) continue
    const { motorId, interval } = duty.after
    start.former = starts.find(({ motor }) => plant.motors[motor]!.id === motorId) ?? null
    start.interval = interval
  }
  return {
    starts,
    earlier: [],
    running: runningMotors(plant).map((i) => ({
      motor: i,
      before: motorState(system, before, i),
      pulledOutAt: null,
      contactor: contactorOf(plant.motors[i]!),
      watches: {
        voltage: watch(placeOf(system, i, 'motorVoltage'), 1, true),
        speed: watch(placeOf(system, i, 'speed'), 1, true),
        current: watch(placeOf(system, i, 'motorCurrent'), -1, true),
      },
    })),
    buses: plant.input.buses.map((_, b) => ({ deepest: watch(b, 1, false), highest: watch(b, -1, true) })),
    changeOvers: [],
    generator: generatorCourse(system, before),
  }
}

const contactorOf = ({ duty }: MotorInput): ContactorCourse | null =>
  duty.kind === 'running' && duty.contactor ? contactorCourse(duty.contactor) : null

/** Speed that a start is measured by: rated speed, or that at the end of a drive's ramp where it is lower. */
const speedOf = ({ duty, ratedSpeed }: MotorInput): number =>
  duty.kind === 'starting' && duty.starter.kind === 'drive' && duty.starter.bypass === null
    ? Math.min(ratedSpeed, duty.starter.speed)
    : ratedSpeed
