import fc from 'fast-check'
import type { CaseInput, LoadCurve, MotorInput, Starter } from '@/lib/engine/case-input'
import {
  ampere,
  hertz,
  kilogramSquareMetre,
  newtonMetre,
  ohm,
  perUnit,
  radianPerSecond,
  second,
  siemens,
  volt,
  voltAmpere,
  watt,
} from '@/lib/units/si'
import { synchronousSpeed } from '@/lib/units/speed'

/** Invented plants of any size for property tests: a supply, medium-voltage buses on cables, some meshed, motors and mixed loads. */

/** Even over the range and free of the denormal numbers that fast-check likes and no data sheet has. */
const real = (min: number, max: number) =>
  fc.integer({ min: 0, max: 10_000 }).map((part) => min + ((max - min) * part) / 10_000)

const loadCurve = (torque: number, synchronous: number): fc.Arbitrary<LoadCurve> =>
  fc
    .record({
      share: real(0.2, 1),
      start: real(0, 0.15),
      kind: fc.constantFrom('power', 'breakaway', 'points'),
      exponent: fc.constantFrom(0, 1, 2),
    })
    .map(({ share, start, kind, exponent }): LoadCurve => {
      const speed = 0.99 * synchronous
      const [t0, t1] = [newtonMetre(start * torque), newtonMetre(Math.max(start, share) * torque)]
      if (kind === 'points') {
        return {
          kind: 'points',
          speeds: [0, 0.1, 0.5, 0.8, 1].map((part) => radianPerSecond(part * synchronous)),
          torques: [t0, newtonMetre(0.5 * t0), newtonMetre(0.3 * t1), newtonMetre(0.6 * t1), t1],
        }
      }
      return {
        kind: 'power',
        constant: kind === 'power' ? t0 : newtonMetre(0.3 * t0),
        atRated: t1,
        ratedSpeed: radianPerSecond(speed),
        exponent,
        breakaway: kind === 'power' ? null : { torque: t0, until: radianPerSecond(0.08 * synchronous) },
      }
    })

const starter: fc.Arbitrary<Starter> = fc.oneof(
  fc.constant({ kind: 'direct' as const }),
  fc.record({ tap: real(0.5, 0.8), x: real(0, 1), part: real(0.8, 0.98), byTime: fc.boolean() }).map(
    ({ tap, x, part, byTime }): Starter => ({
      kind: 'autotransformer',
      tap: perUnit(tap),
      impedance: { re: ohm(x / 8), im: ohm(x) },
      changeOver: byTime ? { kind: 'time', at: second(10 * part) } : { kind: 'speed', at: radianPerSecond(part * 157) },
      gap: second(0),
    }),
  ),
  fc.record({ part: real(0.8, 0.97), gap: real(0, 0.1) }).map(
    ({ part, gap }): Starter => ({
      kind: 'star-delta',
      changeOver: { kind: 'time', at: second(8 * part) },
      gap: second(gap),
    }),
  ),
  fc.record({ x: real(0.05, 0.4), part: real(0.7, 0.97), resistive: fc.boolean() }).map(
    ({ x, part, resistive }): Starter => ({
      kind: resistive ? 'resistor' : 'reactor',
      impedance: { re: ohm(resistive ? x : 0.02 * x), im: ohm(resistive ? 0 : x) },
      changeOver: { kind: 'speed', at: radianPerSecond(part * 157) },
    }),
  ),
  fc.record({ from: real(0.4, 0.8), time: real(1, 10), limit: fc.option(real(150, 600)) }).map(
    ({ from, time, limit }): Starter => ({
      kind: 'soft-starter',
      ramp: { kind: 'voltage', from: perUnit(from), to: perUnit(1) },
      rampTime: second(time),
      kick: null,
      currentLimit: limit === null ? null : ampere(limit),
      bypass: null,
    }),
  ),
)

/** A motor of 100 kW to 2 MW with the circuit of its size; plausible, not any particular machine. */
export const randomMotor = (id: string, busId: string, running: boolean, at = 0): fc.Arbitrary<MotorInput> =>
  fc
    .record({
      power: real(100e3, 2e6),
      poles: fc.constantFrom(4, 6),
      double: fc.boolean(),
      rs: real(0.006, 0.012),
      xs: real(0.08, 0.12),
      xm: real(2.5, 4),
      core: fc.option(real(30, 80)),
      r1: real(0.008, 0.014),
      x1: real(0.13, 0.2),
      r2: real(0.04, 0.08),
      x2: real(0.06, 0.11),
      inertia: real(0.4, 3),
      starter,
    })
    .chain((draw) => {
      const base = 6600 ** 2 / (1.2 * draw.power)
      const synchronous = synchronousSpeed(hertz(50), draw.poles)
      const ratedSpeed = radianPerSecond(0.99 * synchronous)
      const torque = draw.power / ratedSpeed
      return loadCurve(torque, synchronous).map(
        (load): MotorInput => ({
          id,
          busId,
          ratedVoltage: volt(6600),
          ratedPower: watt(draw.power),
          ratedSpeed,
          ratedTorque: newtonMetre(torque),
          poles: draw.poles,
          circuit: {
            stator: { re: ohm(draw.rs * base), im: ohm(draw.xs * base) },
            magnetising: ohm(draw.xm * base),
            core: draw.core === null ? null : ohm(draw.core * base),
            cages: [
              { resistance: ohm(draw.r1 * base), reactance: ohm(draw.x1 * base) },
              ...(draw.double ? [{ resistance: ohm(draw.r2 * base), reactance: ohm(draw.x2 * base) }] : []),
            ],
          },
          torqueFactor: perUnit(1),
          // Inertia constant of the drive in seconds, turned into J.
          inertia: kilogramSquareMetre((2 * draw.inertia * draw.power) / synchronous ** 2),
          duty: running
            ? { kind: 'running', load }
            : { kind: 'starting', at: second(at), starter: draw.starter, load, processLoad: null },
          declared: { lockedRotorCurrent: null, lockedRotorTorque: null, permissibleTime: null },
        }),
      )
    })

/** A plant behind a supply of the given levels, with motors running and starting. */
export const randomPlant = (level: { min: number; max: number } = { min: 20e6, max: 300e6 }): fc.Arbitrary<CaseInput> =>
  fc
    .record({
      buses: fc.integer({ min: 1, max: 5 }),
      running: fc.integer({ min: 0, max: 3 }),
      starting: fc.integer({ min: 1, max: 2 }),
    })
    .chain(({ buses, running, starting }) => {
      const names = ['S', 'MV', ...Array.from({ length: buses }, (_, i) => `B${i + 1}`)]
      const place = fc.constantFrom(...names.slice(1))
      const motors = fc.tuple(
        ...Array.from({ length: running + starting }, (_, i) =>
          place.chain((busId) => randomMotor(`M${i + 1}`, busId, i < running, i < running ? 0 : 5 * (i - running))),
        ),
      )
      return fc
        .record({
          level: real(level.min, level.max),
          xOverR: real(1.5, 15),
          hold: fc.boolean(),
          voltage: real(0.97, 1.03),
          ratio: real(0.95, 1.05),
          lengths: fc.array(real(0, 1.5), { minLength: buses, maxLength: buses }),
          ring: fc.boolean(),
          loads: fc.array(
            fc.record({
              bus: fc.constantFrom(...names),
              p: real(0, 1.5e6),
              z: real(0, 1),
              i: real(0, 1),
              floor: fc.constantFrom(0, 0.7),
            }),
            { maxLength: 3 },
          ),
          capacitor: fc.option(real(0, 1.5e6)),
          motors,
        })
        .map((draw): CaseInput => {
          const z = 33000 ** 2 / draw.level / Math.hypot(1, draw.xOverR)
          const line = (id: string, from: string, to: string, km: number) => ({
            id,
            fromBusId: from,
            toBusId: to,
            impedance: { re: ohm(0.2 * km), im: ohm(0.1 * km) },
            susceptance: siemens(1e-6 * km),
          })
          return {
            id: 'random',
            frequency: hertz(50),
            buses: names.map((id) => ({ id, nominal: volt(id === 'S' ? 33000 : 6600) })),
            supply: {
              busId: 'S',
              impedance: { re: ohm(z), im: ohm(z * draw.xOverR) },
              hold: { kind: draw.hold ? 'bus-voltage' : 'emf', voltage: volt(33000 * draw.voltage) },
              motorsInLevel: [],
            },
            transformers: [
              {
                id: 'T',
                fromBusId: 'S',
                toBusId: 'MV',
                ratio: (5 * draw.ratio * 6.6) / 6.6,
                impedance: { re: ohm(0.03), im: ohm(0.4) },
              },
            ],
            lines: [
              ...draw.lengths.map((km, i) =>
                line(`C${i + 1}`, i === 0 ? 'MV' : i % 2 === 0 ? `B${i}` : 'MV', `B${i + 1}`, km),
              ),
              ...(draw.ring && buses > 2 ? [line('ring', 'B1', `B${buses}`, 0.5)] : []),
            ],
            loads: draw.loads.map((load, i) => ({
              id: `L${i}`,
              busId: load.bus,
              power: { re: voltAmpere(load.p), im: voltAmpere(load.p / 2) },
              ratedVoltage: volt(load.bus === 'S' ? 33000 : 6600),
              mix: { impedance: load.z, current: (1 - load.z) * load.i, power: (1 - load.z) * (1 - load.i) },
              floor: perUnit(load.floor),
            })),
            capacitors:
              draw.capacitor === null
                ? []
                : [{ id: 'K', busId: 'MV', susceptance: siemens(draw.capacitor / 6600 ** 2) }],
            motors: draw.motors,
            settings: { speedCriterion: perUnit(0.98), timeLimit: second(30), tolerance: 1e-7 },
          }
        })
    })
