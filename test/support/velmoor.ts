import type { CaseInput, LoadCurve, MotorInput, Starter, StaticLoadInput } from '@/lib/engine/case-input'
import {
  ampere,
  type Complex,
  hertz,
  kilogramSquareMetre,
  newtonMetre,
  type Ohm,
  ohm,
  perUnit,
  second,
  siemens,
  volt,
  voltAmpere,
  watt,
} from '@/lib/units/si'
import { fromRpm } from '@/lib/units/speed'

/**
 * The invented Velmoor pumping station, typed straight from its data sheet as engine input: independent of the study
 * document, its units and its conversion, so that both can be held against each other.
 */

const ohms = (re: number, im: number): Complex<Ohm> => ({ re: ohm(re), im: ohm(im) })

/** Impedance of a size and an X/R. */
const byRatio = (size: number, xOverR: number): Complex<Ohm> => {
  const r = size / Math.hypot(1, xOverR)
  return ohms(r, r * xOverR)
}

export type VelmoorSupply = 'weakest' | 'usual' | 'strongest'

const supplies = {
  weakest: { level: 90e6, xOverR: 2.5, before: 32400 },
  usual: { level: 130e6, xOverR: 3, before: 33000 },
  strongest: { level: 180e6, xOverR: 4, before: 33600 },
}

export const valveClosed: LoadCurve = {
  kind: 'power',
  constant: newtonMetre(300),
  atRated: newtonMetre(4300),
  ratedSpeed: fromRpm(992),
  exponent: 2,
  breakaway: { torque: newtonMetre(1400), until: fromRpm(60) },
}

const openPoints = [
  [0, 1400],
  [60, 315],
  [200, 463],
  [400, 950],
  [600, 1763],
  [780, 2773],
  [850, 4550],
  [900, 6000],
  [950, 7720],
  [992, 9430],
  [1000, 9780],
] as const

export const valveOpen: LoadCurve = {
  kind: 'points',
  speeds: openPoints.map(([rpm]) => fromRpm(rpm)),
  torques: openPoints.map(([, torque]) => newtonMetre(torque)),
}

const booster = (atRated: number): LoadCurve => ({
  kind: 'power',
  constant: newtonMetre(40),
  atRated: newtonMetre(40 + atRated),
  ratedSpeed: fromRpm(1486),
  exponent: 2,
  breakaway: { torque: newtonMetre(200), until: fromRpm(100) },
})

export const boosterRunning = booster(1360)
export const boosterThrottled = booster(660)

export const direct: Starter = { kind: 'direct' }

/** The station's autotransformer on a tap: 6 % on 4000 kVA at 6.6 kV, X/R 8, transfer at the given speed. */
export const autotransformer = (tap: number, transferRpm = 980): Starter => ({
  kind: 'autotransformer',
  tap: perUnit(tap),
  impedance: byRatio((0.06 * 6600 ** 2) / 4e6, 8),
  changeOver: { kind: 'speed', at: fromRpm(transferRpm) },
  gap: second(0),
})

export const starDelta: Starter = {
  kind: 'star-delta',
  changeOver: { kind: 'speed', at: fromRpm(0.96 * 1500) },
  gap: second(0.05),
}

type Duty = MotorInput['duty']

export const running = (load: LoadCurve): Duty => ({ kind: 'running', load })

export const starting = (starter: Starter, load: LoadCurve, processLoad: LoadCurve | null = null): Duty => ({
  kind: 'starting',
  at: second(0),
  starter,
  load,
  processLoad,
})

/** Departures from the data sheet of a started pump. */
export interface PumpChanges {
  admittance?: number
  torque?: number
  inertia?: number
}

export function pump(number: 1 | 2 | 3 | 4, duty: Duty, changes: PumpChanges = {}): MotorInput {
  const base = 6600 ** 2 / 1.35e6 / (changes.admittance ?? 1)
  return {
    id: `M${number}`,
    busId: `M${number}`,
    ratedVoltage: volt(6600),
    ratedPower: watt(1.1e6),
    ratedSpeed: fromRpm(992),
    ratedTorque: newtonMetre(1.1e6 / fromRpm(992)),
    poles: 6,
    circuit: {
      stator: ohms(0.0096 * base, 0.11 * base),
      magnetising: ohm(2.89 * base),
      core: ohm(43 * base),
      cages: [
        { resistance: ohm(0.01 * base), reactance: ohm(0.198 * base) },
        { resistance: ohm(0.054 * base), reactance: ohm(0.1 * base) },
      ],
    },
    torqueFactor: perUnit(changes.torque ?? 1),
    inertia: kilogramSquareMetre(340 * (changes.inertia ?? 1)),
    duty,
    declared: {
      // The data sheet prints 651 A and 0.855; its heat figures rest on the unrounded values of the circuit.
      lockedRotorCurrent: ampere(651.39),
      lockedRotorTorque: newtonMetre(0.85489 * 10588.9),
      permissibleTime: { time: second(12), state: 'hot' },
    },
  }
}

export function boosterMotor(duty: Duty): MotorInput {
  const base = 400 ** 2 / 3e5
  return {
    id: 'B1',
    busId: 'B1',
    ratedVoltage: volt(400),
    ratedPower: watt(250e3),
    ratedSpeed: fromRpm(1486),
    ratedTorque: newtonMetre(250e3 / fromRpm(1486)),
    poles: 4,
    circuit: {
      stator: ohms(0.0065 * base, 0.085 * base),
      magnetising: ohm(2.9 * base),
      core: ohm(39.6 * base),
      cages: [
        { resistance: ohm(0.0114 * base), reactance: ohm(0.155 * base) },
        { resistance: ohm(0.08 * base), reactance: ohm(0.0655 * base) },
      ],
    },
    torqueFactor: perUnit(1),
    inertia: kilogramSquareMetre(7),
    duty,
    declared: {
      lockedRotorCurrent: ampere(2946),
      lockedRotorTorque: newtonMetre(1.905 * 1607),
      permissibleTime: { time: second(12), state: 'hot' },
    },
  }
}

const staticLoad = (id: string, busId: string, p: number, q: number, kv: number): StaticLoadInput => ({
  id,
  busId,
  power: { re: voltAmpere(p * 1e6), im: voltAmpere(q * 1e6) },
  ratedVoltage: volt(kv * 1e3),
  mix: { impedance: 0.4, current: 0.2, power: 0.4 },
  floor: perUnit(0.7),
})

/** Departures of the network from the data sheet. */
export interface NetworkChanges {
  /** Voltage at the PCC before the start, V. */
  before?: number
  /** Short-circuit level, VA. */
  level?: number
  /** u_k of T1, %. */
  t1?: number
  capacitor?: boolean
}

export function velmoorCase(
  id: string,
  supply: VelmoorSupply,
  motors: readonly MotorInput[],
  changes: NetworkChanges = {},
): CaseInput {
  const { level, xOverR, before } = supplies[supply]
  const cableOhms = (km: number) => ohms(0.246 * km, 0.105 * km)
  return {
    id,
    frequency: hertz(50),
    buses: [
      { id: 'PCC', nominal: volt(33000) },
      { id: 'S33', nominal: volt(33000) },
      { id: 'MV', nominal: volt(6600) },
      ...[1, 2, 3, 4].map((n) => ({ id: `M${n}`, nominal: volt(6600) })),
      { id: 'LV', nominal: volt(400) },
      { id: 'B1', nominal: volt(400) },
    ],
    supply: {
      busId: 'PCC',
      impedance: byRatio(33000 ** 2 / (changes.level ?? level), xOverR),
      hold: { kind: 'bus-voltage', voltage: volt(changes.before ?? before) },
      motorsInLevel: [],
    },
    transformers: [
      {
        id: 'T1',
        fromBusId: 'S33',
        toBusId: 'MV',
        ratio: 33 / 6.9,
        impedance: byRatio(((changes.t1 ?? 8) / 100) * (6900 ** 2 / 8e6), 14),
      },
      { id: 'T2', fromBusId: 'MV', toBusId: 'LV', ratio: 6.6 / 0.4, impedance: byRatio(0.05 * (400 ** 2 / 800e3), 5) },
    ],
    lines: [
      { id: 'L1', fromBusId: 'PCC', toBusId: 'S33', impedance: ohms(0.27 * 0.8, 0.36 * 0.8), susceptance: siemens(0) },
      ...[0.12, 0.15, 0.18, 0.21].map((km, index) => ({
        id: `C${index + 1}`,
        fromBusId: 'MV',
        toBusId: `M${index + 1}`,
        impedance: cableOhms(km),
        susceptance: siemens(0),
      })),
      {
        id: 'CB',
        fromBusId: 'LV',
        toBusId: 'B1',
        impedance: ohms((0.158 * 0.06) / 2, (0.075 * 0.06) / 2),
        susceptance: siemens(0),
      },
    ],
    loads: [staticLoad('A1', 'MV', 0.3, 0.18, 6.6), staticLoad('A2', 'LV', 0.15, 0.08, 0.4)],
    capacitors: changes.capacitor === false ? [] : [{ id: 'K1', busId: 'MV', susceptance: siemens(1.2e6 / 7200 ** 2) }],
    motors,
    settings: { speedCriterion: perUnit(0.98), timeLimit: second(60), tolerance: 1e-8 },
  }
}

/** Three pumps and the booster run, the fourth pump starts. */
export const lastPump = (starter: Starter, load: LoadCurve = valveClosed, changes: PumpChanges = {}): MotorInput[] => [
  pump(1, running(valveOpen)),
  pump(2, running(valveOpen)),
  pump(3, running(valveOpen)),
  pump(4, starting(starter, load, valveOpen), changes),
  boosterMotor(running(boosterRunning)),
]

/** The booster runs, the first pump starts. */
export const firstPump = (starter: Starter): MotorInput[] => [
  pump(1, starting(starter, valveClosed, valveOpen)),
  boosterMotor(running(boosterRunning)),
]

/** Three pumps run, the booster starts. */
export const boosterStart = (starter: Starter): MotorInput[] => [
  pump(1, running(valveOpen)),
  pump(2, running(valveOpen)),
  pump(3, running(valveOpen)),
  boosterMotor(starting(starter, boosterThrottled, boosterRunning)),
]

/** All four pumps start at once, the booster runs. */
export const allPumps = (starter: Starter): MotorInput[] => [
  ...([1, 2, 3, 4] as const).map((n) => pump(n, starting(starter, valveClosed, valveOpen))),
  boosterMotor(running(boosterRunning)),
]

/** The cases C1 to C25 of the data sheet. */
export const velmoorCases: Readonly<Record<string, CaseInput>> = Object.fromEntries(
  (
    [
      ['C1', 'weakest', lastPump(direct)],
      ['C2', 'weakest', lastPump(autotransformer(0.65))],
      ['C3', 'weakest', firstPump(direct), { capacitor: false }],
      ['C4', 'weakest', firstPump(autotransformer(0.65)), { capacitor: false }],
      ['C5', 'strongest', lastPump(direct)],
      ['C6', 'strongest', lastPump(autotransformer(0.65))],
      ['C7', 'weakest', lastPump(autotransformer(0.65), valveOpen)],
      ['C8', 'weakest', lastPump(autotransformer(0.65, 950))],
      ['C9', 'weakest', lastPump(autotransformer(0.7))],
      ['C10', 'weakest', lastPump(autotransformer(0.8))],
      ['C11', 'weakest', lastPump(autotransformer(0.6))],
      ['C12', 'weakest', lastPump(autotransformer(0.55))],
      ['C13', 'weakest', lastPump(autotransformer(0.5))],
      ['C14', 'usual', lastPump(direct)],
      ['C15', 'usual', lastPump(autotransformer(0.65))],
      ['C16', 'weakest', allPumps(autotransformer(0.65)), { capacitor: false }],
      ['C17', 'weakest', boosterStart(direct)],
      ['C18', 'weakest', boosterStart(starDelta)],
      ['C19', 'weakest', lastPump(autotransformer(0.65)), { before: 31400 }],
      ['C20', 'weakest', lastPump(autotransformer(0.65), valveClosed, { admittance: 1.2 }), { t1: 8.8 }],
      [
        'C21',
        'weakest',
        lastPump(autotransformer(0.65), valveClosed, { torque: 0.85, inertia: 1.1 }),
        { t1: 8.8, before: 31400 },
      ],
      ['C22', 'weakest', lastPump(autotransformer(0.65), valveClosed, { torque: 0.88 })],
      ['C23', 'weakest', lastPump(autotransformer(0.65)), { level: 90e6 / 1.1 }],
      ['C24', 'weakest', lastPump(autotransformer(0.65)), { capacitor: false }],
      ['C25', 'weakest', lastPump(direct, valveOpen)],
    ] as const
  ).map(([id, supply, motors, changes]) => [id, velmoorCase(id, supply, motors, changes)]),
)
