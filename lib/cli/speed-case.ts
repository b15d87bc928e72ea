import type { CaseInput, MotorInput } from '../engine/case-input'
import {
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
} from '../units/si'
import { fromRpm } from '../units/speed'

const ohms = (re: number, im: number): Complex<Ohm> => ({ re: ohm(re), im: ohm(im) })

const byRatio = (size: number, xOverR: number): Complex<Ohm> => {
  const r = size / Math.hypot(1, xOverR)
  return ohms(r, r * xOverR)
}

/** A 1500 kW pump motor of four poles with a double cage, started or running, scaled in power. */
export function benchMotor(id: string, busId: string, share: number, running: boolean): MotorInput {
  const base = 6600 ** 2 / (1.75e6 * share)
  const ratedSpeed = fromRpm(1487)
  const load = {
    kind: 'power' as const,
    constant: newtonMetre(200 * share),
    atRated: newtonMetre(8600 * share),
    ratedSpeed,
    exponent: 2,
    breakaway: null,
  }
  return {
    id,
    busId,
    ratedVoltage: volt(6600),
    ratedPower: watt(1.5e6 * share),
    ratedSpeed,
    ratedTorque: newtonMetre((1.5e6 * share) / ratedSpeed),
    poles: 4,
    circuit: {
      stator: ohms(0.01 * base, 0.1 * base),
      magnetising: ohm(3.5 * base),
      core: null,
      cages: [
        { resistance: ohm(0.01 * base), reactance: ohm(0.16 * base) },
        { resistance: ohm(0.055 * base), reactance: ohm(0.095 * base) },
      ],
    },
    torqueFactor: perUnit(1),
    inertia: kilogramSquareMetre(220 * share),
    duty: running
      ? { kind: 'running', load }
      : { kind: 'starting', at: second(0), starter: { kind: 'direct' }, load, processLoad: null },
    declared: { lockedRotorCurrent: null, lockedRotorTorque: null, permissibleTime: null },
  }
}

/**
 * The case on which run-ups are timed: supply, transformer, cable, one starting double-cage motor beside a constant-power
 * load; 5.752078 s to 98 % of rated speed.
 *
 * @param runningMotors motors of a quarter of the size that run beside the load at MV
 */
export function speedCase(runningMotors = 0): CaseInput {
  return {
    id: runningMotors === 0 ? 'speed' : `speed-${runningMotors}`,
    frequency: hertz(50),
    buses: [
      { id: 'PCC', nominal: volt(11000) },
      { id: 'MV', nominal: volt(6600) },
      { id: 'M', nominal: volt(6600) },
    ],
    supply: {
      busId: 'PCC',
      impedance: byRatio(11000 ** 2 / 90e6, 9),
      hold: { kind: 'emf', voltage: volt(11000) },
      motorsInLevel: [],
    },
    transformers: [
      { id: 'T', fromBusId: 'PCC', toBusId: 'MV', ratio: 11 / 6.6, impedance: byRatio((0.07 * 6600 ** 2) / 6e6, 13) },
    ],
    lines: [
      { id: 'C', fromBusId: 'MV', toBusId: 'M', impedance: ohms(0.15 * 0.4, 0.1 * 0.4), susceptance: siemens(0) },
    ],
    loads: [
      {
        id: 'L',
        busId: 'MV',
        power: { re: voltAmpere(2e6), im: voltAmpere(0.9e6) },
        ratedVoltage: volt(6600),
        mix: { impedance: 0, current: 0, power: 1 },
        floor: perUnit(0),
      },
    ],
    capacitors: [],
    motors: [
      benchMotor('M', 'M', 1, false),
      ...Array.from({ length: runningMotors }, (_, i) => benchMotor(`R${i + 1}`, 'MV', 0.25, true)),
    ],
    settings: { speedCriterion: perUnit(0.98), timeLimit: second(60), tolerance: 1e-8 },
  }
}
