import type { CaseResult, MotorState } from '@/lib/engine/case-result'
import type { Verdict } from '@/lib/engine/criteria/rule'
import type { StudyResult } from '@/lib/engine/study-run'
import {
  ampere,
  ampereSquaredSecond,
  joule,
  newtonMetre,
  ohm,
  perUnit,
  radianPerSecond,
  second,
  volt,
  voltAmpere,
} from '@/lib/units/si'
import { fromRpm } from '@/lib/units/speed'

const nominal = { pcc: 33_000, mv: 6600, m1: 6600, m2: 6600, lv: 400 } as const
type BusId = keyof typeof nominal

/** How deep each bus goes, per unit of the voltage before, at the PCC's depth of 1. */
const sharing: Record<BusId, number> = { pcc: 1, mv: 1.93, m1: 1.95, m2: 2.4, lv: 2.05 }
const before: Record<BusId, number> = { pcc: 32_400, mv: 6645, m1: 6630, m2: 6645, lv: 395.4 }

const state = (line: number, motor: number, voltage: number): MotorState => ({
  speed: radianPerSecond(0),
  lineCurrent: ampere(line),
  motorCurrent: ampere(motor),
  motorVoltage: volt(voltage),
  torque: newtonMetre(3100),
  power: { re: voltAmpere(0.4e6), im: voltAmpere(2.6e6) },
  powerFactor: 0.18,
})

/** Invented curves of a start with the shape of a real one: not computed, and never printed as a result of the engine. */
export const inventedResult = (caseId: string, depth: number, duration: number, tap: number): CaseResult => {
  const end = duration * 1.6
  const count = 600
  const time = [-0.2, 0, ...Array.from({ length: count }, (_, i) => (i * end) / (count - 1))]
  const progress = (t: number) => Math.min(1, Math.max(0, t / duration))
  const speedAt = (t: number) => 1000 * (progress(t) < 1 ? 0.985 * progress(t) ** 0.93 : 0.994)
  const sag = (t: number) => {
    if (t < 0) return 0
    const p = progress(t)
    return depth * (1 - 0.08 * Math.exp(-t / 0.1)) * (p < 1 ? 1 - 0.55 * p ** 6 : 0.22)
  }
  const bus = (id: BusId) => time.map((t, i) => before[id] * (1 - sharing[id] * (i < 2 ? 0 : sag(t))))
  const busVoltage = Object.fromEntries((Object.keys(nominal) as BusId[]).map((id) => [id, bus(id)]))
  const current = time.map((t, i) => (i < 2 ? 0 : progress(t) < 1 ? 651 * tap * (1 - 0.5 * progress(t) ** 6) : 60))
  const torque = time.map((t, i) =>
    i < 2 ? 0 : progress(t) < 1 ? 9000 * tap ** 2 * (1 + 1.1 * progress(t) ** 4) : 4300,
  )
  const load = time.map((t) => 300 + 4000 * (speedAt(t) / 992) ** 2)
  const places = (Object.keys(nominal) as BusId[]).map((id) => {
    const values = busVoltage[id]!
    const least = Math.min(...values)
    return {
      busId: id,
      nominal: volt(nominal[id]),
      before: volt(before[id]),
      first: volt(values[2]!),
      deepest: { voltage: volt(least), at: second(time[values.indexOf(least)]!) },
      highest: { voltage: volt(Math.max(...values)), at: second(0) },
      settledAfterStart: volt(values.at(-1)!),
      settledAfterProcess: volt(values.at(-1)! * 0.995),
    }
  })
  const power = time.map(() => 0.5e6)
  return {
    caseId,
    model: 'quasi-static',
    outcome: { kind: 'complete' },
    supply: {
      busId: 'pcc',
      impedance: { re: ohm(4.494), im: ohm(11.235) },
      emf: volt(33_479),
      powerBefore: { re: voltAmpere(3.8e6), im: voltAmpere(1.54e6) },
      powerFirst: { re: voltAmpere(4.2e6), im: voltAmpere(8.1e6) },
    },
    places,
    motors: [
      {
        motorId: 'm1',
        start: null,
        running: {
          outcome: { kind: 'rode-through' },
          before: { ...state(118, 118, 6630), speed: fromRpm(992), powerFactor: 0.85 },
          lowestVoltage: { voltage: volt(5600), at: second(0.3) },
          lowestSpeed: { speed: fromRpm(989.8), at: second(0.4) },
          peakCurrent: { current: ampere(140), at: second(0.3) },
          settledSpeed: fromRpm(991.5),
        },
        speedAtEnd: fromRpm(991.5),
      },
      {
        motorId: 'm2',
        start: {
          outcome: { kind: 'started', at: second(duration) },
          switchedOnAt: second(0),
          timeTo95: second(duration * 0.96),
          timeToCriterion: second(duration * 0.98),
          standstill: state(651 * tap * tap * 0.9, 651 * tap * 0.9, 6600 * tap * 0.9),
          peakLineCurrent: { current: ampere(651 * tap * tap), at: second(0) },
          peakMotorCurrent: { current: ampere(651 * tap), at: second(0) },
          leastAccelerating: { torque: newtonMetre(1694), ofRated: perUnit(0.16), speed: fromRpm(0) },
          lowestMotorVoltage: { voltage: volt(3860), at: second(0) },
          i2t: ampereSquaredSecond(1.24e6),
          slipEnergy: joule(2.45e6),
          kineticEnergy: joule(1.76e6),
          heatUsed: { byCurrent: perUnit(0.243), byRotor: perUnit(0.216), figure: perUnit(0.243), state: 'hot' },
          settledSpeed: fromRpm(994),
        },
        running: null,
        speedAtEnd: fromRpm(994),
      },
    ],
    changeOvers:
      tap < 1
        ? [
            {
              motorId: 'm2',
              at: second(duration),
              to: 'running',
              speed: fromRpm(980),
              state: { ...state(240, 240, 6500), speed: fromRpm(980) },
              busVoltages: places.map((place) => volt(place.before * 0.985)),
              tooEarly: false,
            },
          ]
        : [],
    notices: tap < 1 ? [{ kind: 'reduced-voltage-torque', motorId: 'm2', voltage: perUnit(0.585) }] : [],
    counters: {
      steps: 412,
      rejected: 7,
      evaluations: 2890,
      networkIterations: 9120,
      largestMismatch: 3.1e-12,
      largestErrorRatio: 0.93,
    },
    series: {
      time,
      busVoltage,
      motors: {
        m1: {
          speed: time.map(() => fromRpm(991)),
          torque: time.map(() => 9400),
          loadTorque: time.map(() => 9400),
          lineCurrent: time.map((t, i) => (i < 2 ? 118 : 118 + 300 * sag(t))),
          motorCurrent: time.map((t, i) => (i < 2 ? 118 : 118 + 300 * sag(t))),
          motorVoltage: busVoltage.m1!,
          activePower: power,
          reactivePower: power,
        },
        m2: {
          speed: time.map((t) => fromRpm(speedAt(t))),
          torque,
          loadTorque: load,
          lineCurrent: current.map((value, i) => (progress(time[i]!) < 1 ? value * tap : value)),
          motorCurrent: current,
          motorVoltage: time.map(() => 6600 * tap),
          activePower: power,
          reactivePower: power,
        },
      },
    },
  }
}

const verdict = (ruleId: string, caseId: string, word: Verdict['word'], value: number, limit: number): Verdict => ({
  ruleId,
  caseId,
  word,
  reason: null,
  inUse: true,
  value,
  limit,
  margin: ruleId === 'r5' || ruleId === 'r8' ? value - limit : limit - value,
  busId: ruleId === 'r8' || ruleId === 'r11' ? null : 'pcc',
  motorId: ruleId === 'r8' ? 'm1' : ruleId === 'r11' ? 'm2' : null,
  at: second(0.3),
})

const verdicts: Verdict[] = [
  verdict('r1', 'k-dol', 'fails', 0.0792, 0.04),
  verdict('r1', 'k-at', 'meets', 0.0348, 0.04),
  verdict('r4', 'k-dol', 'meets', 0.0138, 0.03),
  verdict('r4', 'k-at', 'meets', 0.0138, 0.03),
  verdict('r5', 'k-dol', 'close', 0.904, 0.9),
  verdict('r5', 'k-at', 'meets', 0.948, 0.9),
  verdict('r8', 'k-dol', 'meets', 0.848, 0.8),
  verdict('r8', 'k-at', 'meets', 0.936, 0.8),
  verdict('r11', 'k-dol', 'meets', 3.97, 20),
  verdict('r11', 'k-at', 'meets', 10.32, 20),
  verdict('r13', 'k-dol', 'meets', 1.007, 1.1),
  verdict('r13', 'k-at', 'meets', 1.007, 1.1),
]

export const reportResult: StudyResult = {
  engineVersion: '0.0.0-fixture',
  cases: [
    inventedResult('k-dol', 0.0792, 3.97, 1),
    inventedResult('k-at', 0.0348, 10.32, 0.65),
    inventedResult('k-low', 0.0351, 11.39, 0.65),
  ],
  verdicts,
  overall: { word: 'fails', governing: verdicts[0]!, counts: { meets: 10, close: 1, fails: 1, 'not-assessed': 0 } },
}
