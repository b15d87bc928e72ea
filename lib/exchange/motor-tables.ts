import type { ChangeOverResult, MotorResult, RunningResult, StartResult } from '../engine/case-result'
import type { ProtectionResult } from '../engine/protection/follow-protection'
import type { StudyDocument } from '../study/document/study-document'
import type { CaseSummary } from '../study/summary'
import { changeOverTargetWords } from '../study/words/change-over-words'
import { startOutcomeWords } from '../study/words/outcome-words'
import { caseTag, motorTag } from '../study/words/tags'
import { toRpm } from '../units/speed'
import type { Cell, Table } from './csv-text'

/** Columns as head and figure, so that neither can slip against the other. */
type Columns<T> = readonly (readonly [head: string, figure: (of: T) => Cell])[]

const percentOf = (value: number | undefined): number | null => (value === undefined ? null : 100 * value)

const startColumns: Columns<StartResult> = [
  ['outcome', ({ outcome }) => startOutcomeWords[outcome.kind]],
  ['switched on at, s', ({ switchedOnAt }) => switchedOnAt],
  ['started after, s', ({ outcome }) => (outcome.kind === 'started' ? outcome.at : null)],
  ['to 95 % of rated speed, s', ({ timeTo95 }) => timeTo95],
  ['to the speed criterion, s', ({ timeToCriterion }) => timeToCriterion],
  ['line current at standstill, A', ({ standstill }) => standstill.lineCurrent],
  ['motor current at standstill, A', ({ standstill }) => standstill.motorCurrent],
  ['motor voltage at standstill, kV', ({ standstill }) => standstill.motorVoltage / 1000],
  ['torque at standstill, N·m', ({ standstill }) => standstill.torque],
  ['active power at standstill, kW', ({ standstill }) => standstill.power.re / 1000],
  ['reactive power at standstill, kvar', ({ standstill }) => standstill.power.im / 1000],
  ['power factor at standstill', ({ standstill }) => standstill.powerFactor],
  ['largest line current, A', ({ peakLineCurrent }) => peakLineCurrent.current],
  ['largest motor current, A', ({ peakMotorCurrent }) => peakMotorCurrent.current],
  ['least accelerating torque, N·m', ({ leastAccelerating }) => leastAccelerating.torque],
  ['least accelerating torque, % of rated', ({ leastAccelerating }) => 100 * leastAccelerating.ofRated],
  ['least accelerating torque at, r/min', ({ leastAccelerating }) => toRpm(leastAccelerating.speed)],
  ['lowest motor voltage, kV', ({ lowestMotorVoltage }) => lowestMotorVoltage.voltage / 1000],
  ['integral of motor current squared, A²s', ({ i2t }) => i2t],
  ['rotor slip energy, kJ', ({ slipEnergy }) => slipEnergy / 1000],
  ['kinetic energy, kJ', ({ kineticEnergy }) => kineticEnergy / 1000],
  ['heat used by current, %', ({ heatUsed }) => heatUsed.byCurrent && 100 * heatUsed.byCurrent],
  ['heat used by rotor energy, %', ({ heatUsed }) => heatUsed.byRotor && 100 * heatUsed.byRotor],
  ['heat used, %', ({ heatUsed }) => heatUsed.figure && 100 * heatUsed.figure],
  ['against the permissible time', ({ heatUsed }) => heatUsed.state],
  ['settled speed, r/min', ({ settledSpeed }) => settledSpeed && toRpm(settledSpeed)],
  ['time on the starting device, s', ({ device }) => device?.time ?? null],
  ['heat before, % of permissible', ({ heatBalance }) => percentOf(heatBalance?.before)],
  ['heat after, % of permissible', ({ heatBalance }) => percentOf(heatBalance?.after)],
  ['starts in succession by heat, cold', ({ heatBalance }) => heatBalance?.inSuccession?.cold ?? null],
  ['starts in succession by heat, hot', ({ heatBalance }) => heatBalance?.inSuccession?.hot ?? null],
  ['standstill before the next, s', ({ heatBalance }) => heatBalance?.restBeforeNext ?? null],
  ['starts an hour by heat', ({ heatBalance }) => heatBalance?.perHour ?? null],
  ['duty of the starting device', ({ device }) => device?.verdict.replaceAll('-', ' ') ?? null],
]

const protectionColumns: Columns<ProtectionResult> = [
  ['started without a trip, s', ({ startedAt }) => startedAt],
  ['trip, s', ({ elements }) => least(elements.map(({ operatesAt }) => operatesAt))],
  ['least time to a trip, s', ({ tripMargin }) => tripMargin],
  ['rotor held: motor current, A', ({ lockedRotor }) => lockedRotor.current],
  ['rotor held: trip, s', ({ lockedRotor }) => lockedRotor.trip],
  ['rotor held: permissible time, s', ({ lockedRotor }) => lockedRotor.permissible],
  ['rotor held: permissible less trip, s', ({ lockedRotor }) => lockedRotor.margin],
  ['limit curve: least permissible less trip, s', ({ limitCurve }) => limitCurve?.margin ?? null],
  ['limit curve: at, A', ({ limitCurve }) => limitCurve?.current ?? null],
  ['not released for, s', ({ elements }) => least(elements.map(({ inhibitedFor }) => inhibitedFor ?? null))],
]

/** The least of the figures that are there; null where none is. */
const least = (values: readonly (number | null)[]): number | null => {
  const known = values.filter((value) => value !== null)
  return known.length === 0 ? null : Math.min(...known)
}

const runningColumns: Columns<RunningResult> = [
  ['outcome', ({ outcome }) => outcome.kind.replaceAll('-', ' ')],
  ['speed before, r/min', ({ before }) => toRpm(before.speed)],
  ['current before, A', ({ before }) => before.motorCurrent],
  ['lowest voltage, kV', ({ lowestVoltage }) => lowestVoltage.voltage / 1000],
  ['lowest voltage at, s', ({ lowestVoltage }) => lowestVoltage.at],
  ['lowest speed, r/min', ({ lowestSpeed }) => toRpm(lowestSpeed.speed)],
  ['lowest speed at, s', ({ lowestSpeed }) => lowestSpeed.at],
  ['largest current, A', ({ peakCurrent }) => peakCurrent.current],
  ['settled speed, r/min', ({ settledSpeed }) => settledSpeed && toRpm(settledSpeed)],
]

const changeOverColumns: Columns<ChangeOverResult> = [
  ['to', ({ to }) => changeOverTargetWords[to]],
  ['at, s', ({ at }) => at],
  ['speed, r/min', ({ speed }) => toRpm(speed)],
  ['line current, A', ({ state }) => state.lineCurrent],
  ['motor current, A', ({ state }) => state.motorCurrent],
  ['motor voltage, kV', ({ state }) => state.motorVoltage / 1000],
  ['torque, N·m', ({ state }) => state.torque],
  ['too early', ({ tooEarly }) => (tooEarly ? 'yes' : 'no')],
]

/** One row for each figure set, headed by its case and motor. */
const table = <T>(
  name: string,
  columns: Columns<T>,
  document: StudyDocument,
  found: readonly { caseId: string; motorId: string; of: T }[],
): Table => ({
  name,
  heads: ['case', 'motor', ...columns.map(([head]) => head)],
  rows: found.map(({ caseId, motorId, of }) => [
    caseTag(document, caseId),
    motorTag(document, motorId),
    ...columns.map(([, figure]) => figure(of)),
  ]),
})

const present = <T>(
  cases: readonly CaseSummary[],
  pick: (motor: MotorResult) => readonly T[],
): { caseId: string; motorId: string; of: T }[] =>
  cases.flatMap(({ caseId, motors }) =>
    motors.flatMap((motor) => pick(motor).map((of) => ({ caseId, motorId: motor.motorId, of }))),
  )

/** Every start of every case, each attempt in a row. */
export const startTable = (document: StudyDocument, cases: readonly CaseSummary[]): Table =>
  table(
    'starts',
    startColumns,
    document,
    present(cases, ({ start, earlierAttempts }) => [...(earlierAttempts ?? []), ...(start ? [start] : [])]),
  )

/** How the relay of each feeder takes every start that it has. */
export const protectionTable = (document: StudyDocument, cases: readonly CaseSummary[]): Table =>
  table(
    'protection',
    protectionColumns,
    document,
    present(cases, ({ start, earlierAttempts }) =>
      [...(earlierAttempts ?? []), ...(start ? [start] : [])].flatMap(({ protection }) => protection ?? []),
    ),
  )

/** Every machine that was running before a start. */
export const runningTable = (document: StudyDocument, cases: readonly CaseSummary[]): Table =>
  table(
    'running-machines',
    runningColumns,
    document,
    present(cases, ({ running }) => (running ? [running] : [])),
  )

/** State just after each starting device moved on. */
export const changeOverTable = (document: StudyDocument, cases: readonly CaseSummary[]): Table =>
  table(
    'change-overs',
    changeOverColumns,
    document,
    cases.flatMap(({ caseId, changeOvers }) => changeOvers.map((of) => ({ caseId, motorId: of.motorId, of }))),
  )
