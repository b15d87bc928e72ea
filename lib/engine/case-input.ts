import type {
  Ampere,
  Complex,
  Hertz,
  KilogramSquareMetre,
  NewtonMetre,
  Ohm,
  PerUnit,
  RadianPerSecond,
  Second,
  Siemens,
  Volt,
  VoltAmpere,
  Watt,
} from '../units/si'
import type { GeneratorInput } from './generator-input'
import type { ProtectionInput, ThermalData } from './protection-input'
import type { Attempt, Contactor, Disturbance, StartAfter } from './schedule-input'
import type { ChangeOver, FurtherStarter, StartCapacitor, StarterDuty } from './starter-input'

/** A node of the network; every rating elsewhere converts with its own voltage, never with this nominal. */
export interface BusInput {
  id: string
  nominal: Volt
}

/** Thevenin equivalent of the supply at its bus, with what is held before the start. */
export interface SupplyInput {
  busId: string
  /** Source impedance in ohm per phase at the supply's bus, c·U²/S_k already applied. */
  impedance: Complex<Ohm>
  /** What fixes the EMF: the open-circuit voltage, or the bus voltage before the start with running load on and starters off. */
  hold: { kind: 'bus-voltage'; voltage: Volt } | { kind: 'emf'; voltage: Volt }
  /** Plant motors whose contribution the stated level contains; it is taken out before the run. Empty when it contains none. */
  motorsInLevel: readonly { busId: string; circuit: MachineModel }[]
  /** A generator in place of the network's equivalent: its own reactances stand for `impedance`, and the voltage at its bus is held. */
  generator?: GeneratorInput
}

/** Two-winding transformer: ratio U_from(1 + tap/100)/U_to, impedance in ohm on the to side, unchanged by the tap. */
export interface TransformerInput {
  id: string
  fromBusId: string
  toBusId: string
  ratio: number
  impedance: Complex<Ohm>
  /** Angle by which the vector group makes the to side lag the from side, rad; left out where unstated: it then fits the loops it is in. */
  lag?: number
  /** What a refusal calls it; its id where left out. */
  name?: string
}

/**
 * Three-winding transformer: a star of three impedances behind ideal ratios, given by what is measured between pairs of
 * windings with the third open, in ohm at the rated voltage of the first winding, in the order 1-2, 2-3, 3-1.
 */
export interface ThreeWindingInput {
  id: string
  name?: string
  windings: readonly [ThreeWindingSide, ThreeWindingSide, ThreeWindingSide]
  impedance: readonly [Complex<Ohm>, Complex<Ohm>, Complex<Ohm>]
}

export interface ThreeWindingSide {
  busId: string
  /** Voltage of this winding at no load, on its tap, over the rated voltage of the first winding. */
  ratio: number
  /** Angle by which it lags the first winding, rad; null where unstated. The first winding's own is 0. */
  lag: number | null
}

/** Cable or line with its parallel conductors already combined; zero impedance joins its two buses. */
export interface LineInput {
  id: string
  fromBusId: string
  toBusId: string
  impedance: Complex<Ohm>
  /** Total shunt susceptance, half at either end. */
  susceptance: Siemens
}

/** Static load S(u) = S₀(z·u² + i·u + p); below the floor (in parts of its rated voltage) it turns to constant impedance. */
export interface StaticLoadInput {
  id: string
  busId: string
  power: Complex<VoltAmpere>
  ratedVoltage: Volt
  mix: { impedance: number; current: number; power: number }
  floor: PerUnit
}

export interface CapacitorInput {
  id: string
  busId: string
  susceptance: Siemens
}

/** Star-equivalent circuit of a cage induction motor in ohm per phase, rotor referred to the stator; one or two cages, the inner first. */
export interface InductionCircuit {
  stator: Complex<Ohm>
  magnetising: Ohm
  /** Core-loss resistance beside the magnetising reactance; null where losses are left out. */
  core: Ohm | null
  cages: readonly { resistance: Ohm; reactance: Ohm }[]
  /** Skin effect in the inner cage, whose values above are then those at synchronous speed; absent for shallow bars. */
  deepBar?: DeepBar
  /** How current and torque fall faster than with constant parameters at low voltage; absent for constant parameters. */
  saturation?: LeakageSaturation
  /** Typed torque in place of the circuit's, which then gives current and power factor alone. */
  torqueCurve?: TorqueCurve
}

/**
 * Resistance and reactance of a deep-bar cage against slip: linear between synchronous speed and the values at standstill
 * (held beyond |s| = 1), or by the law of a rectangular bar with its reduced depth ξ at |s| = 1 and the part of the
 * reactance that lies in the slot.
 */
export type DeepBar =
  | { law: 'linear'; resistance: Ohm; reactance: Ohm }
  | { law: 'bar'; depth: number; slotShare: number }

/**
 * Current ∝ u^current and torque ∝ u^torque below rated voltage, in full from the slip `fullFrom` on and fading to 1 and
 * 2 at the slip `noneBelow`; above rated voltage nothing is raised.
 */
export interface LeakageSaturation {
  current: number
  torque: number
  noneBelow: number
  fullFrom: number
}

/** How a curve runs between its points: straight, or a cubic that never turns between them. */
export type Interpolation = 'linear' | 'monotone'

/** Airgap torque against speed at one voltage, for any other with its square. */
export interface TorqueCurve {
  voltage: Volt
  speeds: readonly RadianPerSecond[]
  torques: readonly NewtonMetre[]
  interpolation: Interpolation
}

/** Machine known by its curves alone: torque ∝ U², current ∝ U, power factor unchanged; from standstill to synchronous speed. */
export interface TabulatedMachine extends TorqueCurve {
  currents: readonly Ampere[]
  powerFactors: readonly number[]
}

export type MachineModel = InductionCircuit | TabulatedMachine

export const isTabulated = (model: MachineModel): model is TabulatedMachine => 'powerFactors' in model

/** The circuit of a machine that has one. Throws a RangeError for a tabulated machine: asking is a bug. */
export function circuitOf(model: MachineModel): InductionCircuit {
  if (isTabulated(model)) throw new RangeError('a tabulated machine has no circuit')
  return model
}

/** Torque of a driven load at the motor shaft against speed; it opposes motion only, unless it is active. */
export type LoadCurve =
  | {
      kind: 'power'
      /** Torque at zero speed of the curve, T₀. */
      constant: NewtonMetre
      /** Torque at the rated speed, T_r. */
      atRated: NewtonMetre
      ratedSpeed: RadianPerSecond
      exponent: number
      /** Straight line from this torque at standstill to the curve at `until`; null where there is none. */
      breakaway: { torque: NewtonMetre; until: RadianPerSecond } | null
    }
  | {
      kind: 'points'
      speeds: readonly RadianPerSecond[]
      torques: readonly NewtonMetre[]
      /** May drive the shaft (inclined conveyor, back-spinning pump): torques hold with their sign, also at speeds below zero. */
      active?: boolean
    }
  | {
      /** Pump against a static head: as if closed up to where the check valve opens, from there by points. */
      kind: 'check-valve'
      /** Torque at zero speed of the closed curve, and at rated speed with the valve shut. */
      friction: NewtonMetre
      shut: NewtonMetre
      ratedSpeed: RadianPerSecond
      breakaway: { torque: NewtonMetre; until: RadianPerSecond } | null
      opensAt: RadianPerSecond
      /** Above `opensAt`, rising; straight lines from the closed curve on. */
      speeds: readonly RadianPerSecond[]
      torques: readonly NewtonMetre[]
    }

export type Starter =
  | { kind: 'direct' }
  | {
      kind: 'autotransformer'
      tap: PerUnit
      /** Own impedance, ohm per phase on the line side, in series before the ideal ratio; zero where ideal. */
      impedance: Complex<Ohm>
      changeOver: ChangeOver
      /** Time without voltage between tap and line; 0 for a closed transition. */
      gap: Second
      /**
       * Middle step of a closed transition, star point open and the series part of the winding left in the line: its
       * ohms per phase and its length. Without it the step is taken as instantaneous.
       */
      middle?: { impedance: Complex<Ohm>; time: Second } | null
    }
  | {
      kind: 'star-delta'
      changeOver: ChangeOver
      gap: Second
      /** Closed transition: resistors in series with the windings in delta for this time, ohm each. */
      transition?: { resistance: Ohm; time: Second } | null
    }
  | FurtherStarter

export type StarterKind = Starter['kind']

export interface MotorInput {
  id: string
  busId: string
  ratedVoltage: Volt
  ratedPower: Watt
  ratedSpeed: RadianPerSecond
  ratedTorque: NewtonMetre
  poles: number
  circuit: MachineModel
  /** Multiplies the machine's torque only: a named corner such as −15 %, or the saturation sensitivity; 1 otherwise. */
  torqueFactor: PerUnit
  /** Motor plus everything it turns, at the motor shaft. */
  inertia: KilogramSquareMetre
  /** Motors with the same name here turn one shaft; each brings its own inertia and load. */
  shaft?: string
  duty:
    | { kind: 'running'; load: LoadCurve; contactor?: Contactor }
    | {
        kind: 'starting'
        at: Second
        starter: Starter
        /** Speed that the load gives the shaft before the start, negative when it turns backwards; 0 where left out. */
        initialSpeed?: RadianPerSecond
        /** Contactor that drops out and ends the start; it does not close again by itself. */
        contactor?: Pick<Contactor, 'dropOut' | 'delay'>
        /** The start that this one waits for; `at` is then the earliest instant. */
        after?: StartAfter
        /** Attempts before the one that counts, each switched off again. */
        attempts?: readonly Attempt[]
        /** Capacitors switched with this start. */
        capacitors?: readonly StartCapacitor[]
        /** What the starting device may be asked for; left out where nothing is known. */
        starterDuty?: StarterDuty
        /** When the protection takes the last attempt off the line, from its own switching-on; found by an earlier run. */
        tripAt?: Second
        /** Curve while starting. */
        load: LoadCurve
        /** Curve once the process is on (valve open); null where it does not change. */
        processLoad: LoadCurve | null
      }
  /** As declared at rated voltage; null where the data sheet is silent, and what depends on it is not assessed. */
  declared: {
    lockedRotorCurrent: Ampere | null
    lockedRotorTorque: NewtonMetre | null
    /** Least torque between standstill and breakdown, in parts of rated torque; absent or null where not declared. */
    pullUpTorque?: PerUnit | null
    /** Permissible locked-rotor time that the heat is judged against (hot unless the start is cold). */
    permissibleTime: { time: Second; state: 'hot' | 'cold' } | null
    /** What the maker states about heat beyond that; absent where nothing is. */
    thermal?: ThermalData
  }
  /** Relay of the feeder; absent where none is stated. */
  protection?: ProtectionInput
}

export interface RunSettings {
  /** Started when the speed reaches this part of rated speed (default 0.98) and the starting device is in its running position. */
  speedCriterion: PerUnit
  /** The start is given up at this time after the motor's switching-on (default 60 s). */
  timeLimit: Second
  /** Relative tolerance of the integration (default 1e-8). */
  tolerance: number
}

/**
 * Model of the machines. Third order: rotor fluxes of every machine, stator and network in the steady state. Fifth order:
 * the one starting machine with its stator too, switched on at the stated angle of phase a's voltage (rad), or at the
 * worst of all where that is null.
 */
export type CaseModel =
  | { kind: 'quasi-static' }
  | { kind: 'third-order' }
  | { kind: 'fifth-order'; switchingAngle: number | null }

/** One computable case, all SI; the only thing the engine needs to know. */
export interface CaseInput {
  id: string
  frequency: Hertz
  buses: readonly BusInput[]
  supply: SupplyInput
  transformers: readonly TransformerInput[]
  /** Absent where there are none. */
  threeWindings?: readonly ThreeWindingInput[]
  lines: readonly LineInput[]
  loads: readonly StaticLoadInput[]
  capacitors: readonly CapacitorInput[]
  /** Connected motors only: running before the start, or started in it. */
  motors: readonly MotorInput[]
  /** What the supply does during the run; left out where it stands still. */
  disturbance?: Disturbance
  settings: RunSettings
  /** Quasi-static where left out, but for a machine switched on near synchronous speed: fifth order. */
  model?: CaseModel
  /** Places whose flicker is wanted, and the intended starts an hour; absent where nobody asks. */
  flicker?: { busIds: readonly string[]; startsPerHour: number }
  /** Motors whose machine is estimated, each with others that meet the same plate; absent or empty for none. */
  samePlate?: readonly { motorId: string; models: readonly MachineModel[] }[]
}
