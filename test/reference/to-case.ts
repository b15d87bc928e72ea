import type {
  CaseInput,
  InductionCircuit,
  LoadCurve,
  MachineModel,
  MotorInput,
  Starter,
  TabulatedMachine,
} from '@/lib/engine/case-input'
import {
  ampere,
  type Complex,
  hertz,
  kilogramSquareMetre,
  newtonMetre,
  type Ohm,
  ohm,
  perUnit,
  radianPerSecond,
  second,
  siemens,
  volt,
  voltAmpere,
  watt,
} from '@/lib/units/si'
import { fromRpm, synchronousSpeed } from '@/lib/units/speed'

/** One reference case as its file has it. */
export interface ReferenceCase {
  id: string
  title: string
  note: string
  input: ReferenceInput
  expected: readonly { quantity: string; value: number | boolean; tol_rel: number; tol_abs: number }[]
}

interface ReferenceInput {
  frequency_hz: number
  buses: readonly { id: string; nominal_kv: number }[]
  source: {
    bus: string
    short_circuit_mva: number
    short_circuit_at_kv: number
    x_over_r: number
    emf_kv?: number
    hold_source_bus_kv_before_start?: number
  }
  transformers?: readonly {
    id: string
    from: string
    to: string
    rated_mva: number
    from_kv: number
    to_kv: number
    impedance_percent: number
    x_over_r: number
    tap_percent_on_from: number
  }[]
  cables?: readonly {
    id: string
    from: string
    to: string
    r_ohm_per_km: number
    x_ohm_per_km: number
    length_km: number
    parallel: number
  }[]
  capacitors?: readonly { bus: string; mvar: number; at_kv: number }[]
  loads?: readonly {
    bus: string
    p_mw: number
    q_mvar: number
    at_kv: number
    zip: { z: number; i: number; p: number }
    constant_z_below_pu?: number
  }[]
  motors: readonly ReferenceMotor[]
}

export interface ReferenceMotor {
  id: string
  bus: string
  rated_kw: number
  rated_kv: number
  poles: number
  rated_rpm: number
  model: {
    type: string
    unit: string
    base_kva?: number
    rs?: number
    xs?: number
    xm?: number
    r1?: number
    x1?: number
    r2?: number
    x2?: number
    rr?: number
    xr?: number
    rr_running?: number
    rr_locked?: number
    xr_running?: number
    xr_locked?: number
    speed_pu?: readonly number[]
    torque_nm?: readonly number[]
    current_a?: readonly number[]
    power_factor?: readonly number[]
  }
  inertia_kgm2: number
  load?: {
    type: string
    exponent?: number
    torque_at_rated_speed_nm?: number
    rated_speed_rpm?: number
    constant_part_nm?: number
    breakaway_nm?: number
    breakaway_ends_rpm?: number
    speed_rpm?: readonly number[]
    torque_nm?: readonly number[]
  }
  start?: {
    method: string
    at_s?: number
    tap?: number
    impedance_percent?: number
    rated_kva?: number
    x_over_r?: number
    changeover?: { at_s?: number; at_speed_pu?: number }
    gap_s?: number
    ohm?: number
    initial_voltage_pu?: number
    ramp_s?: number
    current_limit_a?: number
  }
  initial?: string
}

const byRatio = (size: number, xOverR: number): Complex<Ohm> => {
  const r = size / Math.hypot(1, xOverR)
  return { re: ohm(r), im: ohm(r * xOverR) }
}

/** The reference case as engine input. Throws for kinds of model that the engine does not cover. */
export function toCase({ id, input }: ReferenceCase): CaseInput {
  const { source } = input
  const hold = source.hold_source_bus_kv_before_start
  return {
    id,
    frequency: hertz(input.frequency_hz),
    buses: input.buses.map((bus) => ({ id: bus.id, nominal: volt(bus.nominal_kv * 1e3) })),
    supply: {
      busId: source.bus,
      impedance: byRatio(source.short_circuit_at_kv ** 2 / source.short_circuit_mva, source.x_over_r),
      hold:
        hold === undefined
          ? { kind: 'emf', voltage: volt(source.emf_kv! * 1e3) }
          : { kind: 'bus-voltage', voltage: volt(hold * 1e3) },
      motorsInLevel: [],
    },
    transformers: (input.transformers ?? []).map((transformer) => ({
      id: transformer.id,
      fromBusId: transformer.from,
      toBusId: transformer.to,
      ratio: (transformer.from_kv * (1 + transformer.tap_percent_on_from / 100)) / transformer.to_kv,
      impedance: byRatio(
        ((transformer.impedance_percent / 100) * transformer.to_kv ** 2) / transformer.rated_mva,
        transformer.x_over_r,
      ),
    })),
    lines: (input.cables ?? []).map((cable) => ({
      id: cable.id,
      fromBusId: cable.from,
      toBusId: cable.to,
      impedance: {
        re: ohm((cable.r_ohm_per_km * cable.length_km) / cable.parallel),
        im: ohm((cable.x_ohm_per_km * cable.length_km) / cable.parallel),
      },
      susceptance: siemens(0),
    })),
    loads: (input.loads ?? []).map((load, index) => ({
      id: `L${index}`,
      busId: load.bus,
      power: { re: voltAmpere(load.p_mw * 1e6), im: voltAmpere(load.q_mvar * 1e6) },
      ratedVoltage: volt(load.at_kv * 1e3),
      mix: { impedance: load.zip.z, current: load.zip.i, power: load.zip.p },
      floor: perUnit(load.constant_z_below_pu ?? 0),
    })),
    capacitors: (input.capacitors ?? []).map((capacitor, index) => ({
      id: `K${index}`,
      busId: capacitor.bus,
      susceptance: siemens(capacitor.mvar / capacitor.at_kv ** 2),
    })),
    motors: input.motors.map((motor) => toMotor(motor, input.frequency_hz)),
    settings: { speedCriterion: perUnit(0.98), timeLimit: second(60), tolerance: 1e-8 },
  }
}

function toMotor(motor: ReferenceMotor, frequency: number): MotorInput {
  const load = toCurve(motor.load)
  const ratedSpeed = fromRpm(motor.rated_rpm)
  return {
    id: motor.id,
    busId: motor.bus,
    ratedVoltage: volt(motor.rated_kv * 1e3),
    ratedPower: watt(motor.rated_kw * 1e3),
    ratedSpeed,
    ratedTorque: newtonMetre((motor.rated_kw * 1e3) / ratedSpeed),
    poles: motor.poles,
    circuit: toMachine(motor, frequency),
    torqueFactor: perUnit(1),
    inertia: kilogramSquareMetre(motor.inertia_kgm2),
    duty:
      motor.initial === 'running'
        ? { kind: 'running', load }
        : {
            kind: 'starting',
            at: second(motor.start?.at_s ?? 0),
            starter: toStarter(motor, frequency),
            load,
            processLoad: null,
          },
    declared: { lockedRotorCurrent: null, lockedRotorTorque: null, permissibleTime: null },
  }
}

function toTable({ model, rated_kv, poles }: ReferenceMotor, frequency: number): TabulatedMachine {
  const synchronous = synchronousSpeed(hertz(frequency), poles)
  return {
    voltage: volt(rated_kv * 1e3),
    speeds: model.speed_pu!.map((part) => radianPerSecond(part * synchronous)),
    torques: model.torque_nm!.map(newtonMetre),
    currents: model.current_a!.map(ampere),
    powerFactors: model.power_factor!,
    interpolation: 'linear',
  }
}

/** The machine of a reference case alone. */
export const toMachine = (motor: ReferenceMotor, frequency: number): MachineModel =>
  motor.model.type === 'table' ? toTable(motor, frequency) : toCircuit(motor)

function toCircuit({ model, rated_kv }: ReferenceMotor): InductionCircuit {
  const base = model.unit === 'pu' ? (rated_kv * 1e3) ** 2 / (model.base_kva! * 1e3) : 1
  const cage = (r: number, x: number) => ({ resistance: ohm(r * base), reactance: ohm(x * base) })
  const shared = {
    stator: { re: ohm(model.rs! * base), im: ohm(model.xs! * base) },
    magnetising: ohm(model.xm! * base),
    core: null,
  }
  if (model.type === 'single_cage') return { ...shared, cages: [cage(model.rr!, model.xr!)] }
  if (model.type === 'double_cage')
    return { ...shared, cages: [cage(model.r1!, model.x1!), cage(model.r2!, model.x2!)] }
  if (model.type === 'deep_bar')
    return {
      ...shared,
      cages: [cage(model.rr_running!, model.xr_running!)],
      deepBar: { law: 'linear', ...cage(model.rr_locked!, model.xr_locked!) },
    }
  throw new Error(`no adapter for a motor model of type ${model.type}`)
}

function toCurve(load: ReferenceMotor['load']): LoadCurve {
  if (load?.type === 'table') {
    return { kind: 'points', speeds: load.speed_rpm!.map(fromRpm), torques: load.torque_nm!.map(newtonMetre) }
  }
  if (load && load.type !== 'power' && load.type !== 'power_with_breakaway')
    throw new Error(`no adapter for a load of type ${load.type}`)
  return {
    kind: 'power',
    constant: newtonMetre(load?.constant_part_nm ?? 0),
    atRated: newtonMetre(load?.torque_at_rated_speed_nm ?? 0),
    ratedSpeed: fromRpm(load?.rated_speed_rpm ?? 1000),
    exponent: load?.exponent ?? 2,
    breakaway:
      load?.breakaway_nm === undefined
        ? null
        : { torque: newtonMetre(load.breakaway_nm), until: fromRpm(load.breakaway_ends_rpm!) },
  }
}

function toStarter({ start, rated_kv, poles }: ReferenceMotor, frequency: number): Starter {
  if (start === undefined || start.method === 'dol') return { kind: 'direct' }
  if (start.method === 'soft_starter')
    return {
      kind: 'soft-starter',
      ramp: { kind: 'voltage', from: perUnit(start.initial_voltage_pu!), to: perUnit(1) },
      rampTime: second(start.ramp_s!),
      kick: null,
      currentLimit: start.current_limit_a === undefined ? null : ampere(start.current_limit_a),
      bypass: null,
    }
  const { at_s, at_speed_pu } = start.changeover ?? {}
  const changeOver =
    at_s === undefined ? { kind: 'speed' as const, at: fromRpm(0) } : { kind: 'time' as const, at: second(at_s) }
  if (changeOver.kind === 'speed') {
    const synchronous = synchronousSpeed(hertz(frequency), poles)
    changeOver.at = fromRpm((at_speed_pu! * synchronous * 30) / Math.PI)
  }
  const gap = second(start.gap_s ?? 0)
  if (start.method === 'star_delta') return { kind: 'star-delta', changeOver, gap }
  if (start.method === 'reactor' || start.method === 'resistor') {
    const [re, im] = start.method === 'reactor' ? [0, start.ohm!] : [start.ohm!, 0]
    return { kind: start.method, impedance: { re: ohm(re), im: ohm(im) }, changeOver }
  }
  if (start.method !== 'autotransformer') throw new Error(`no adapter for the starting method ${start.method}`)
  const size =
    start.impedance_percent === undefined
      ? 0
      : ((start.impedance_percent / 100) * (rated_kv * 1e3) ** 2) / (start.rated_kva! * 1e3)
  return {
    kind: 'autotransformer',
    tap: perUnit(start.tap!),
    impedance: byRatio(size, start.x_over_r ?? 1),
    changeOver,
    gap,
  }
}
