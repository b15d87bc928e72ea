import type { CaseInput, InductionCircuit } from '@/lib/engine/case-input'
import type { CaseResult } from '@/lib/engine/case-result'
import { runCase } from '@/lib/engine/run-case'
import { type Complex, type Ohm, ohm, siemens, volt } from '@/lib/units/si'
import { motorOf, oneMotorCase } from './one-motor-case'
import { noMagnetising, singleCage } from './single-cage'

/** Impedance of that size (Ω) and X/R; Infinity leaves the resistance out. */
export const byRatio = (size: number, xOverR: number): Complex<Ohm> => {
  const angle = Math.atan(xOverR)
  return { re: ohm(Number.isFinite(xOverR) ? size * Math.cos(angle) : 0), im: ohm(size * Math.sin(angle)) }
}

/** A motor that stays locked, of that standstill impedance (Ω a phase, star) and power factor. */
export const lockedMotor = (size: number, powerFactor: number): InductionCircuit =>
  singleCage(0, 0, noMagnetising, Math.max(size * powerFactor, 1e-9 * size), size * Math.sqrt(1 - powerFactor ** 2))

interface Path {
  /** Line voltage of the source and its impedance, at bus HV. */
  sourceVoltage: number
  source: Complex<Ohm>
  /** Rated voltages and impedance on the to side, HV to LV. */
  transformer: { from: number; to: number; impedance: Complex<Ohm> }
  /** LV to the motor's terminals M. */
  cable?: Complex<Ohm>
  motor: { circuit: InductionCircuit; voltage: number }
}

/** Source, transformer, cable and a locked motor, as every hand method draws them. */
export const networkCase = (path: Path): CaseInput => {
  const { transformer, cable, motor } = path
  const at = cable ? 'M' : 'LV'
  const machine = { circuit: motor.circuit, voltage: motor.voltage, frequency: 50, poles: 4 }
  const lowVoltage = volt(transformer.to)
  return {
    ...oneMotorCase(machine),
    buses: [
      { id: 'HV', nominal: volt(path.sourceVoltage) },
      { id: 'LV', nominal: lowVoltage },
      ...(cable ? [{ id: 'M', nominal: lowVoltage }] : []),
    ],
    supply: {
      busId: 'HV',
      impedance: path.source,
      hold: { kind: 'emf', voltage: volt(path.sourceVoltage) },
      motorsInLevel: [],
    },
    transformers: [
      {
        id: 'T',
        fromBusId: 'HV',
        toBusId: 'LV',
        ratio: transformer.from / transformer.to,
        impedance: transformer.impedance,
      },
    ],
    lines: cable ? [{ id: 'C', fromBusId: 'LV', toBusId: 'M', impedance: cable, susceptance: siemens(0) }] : [],
    motors: [motorOf(machine, at)],
  }
}

/** Voltage of each bus just after switching on, in parts of nominal, and the motor's state at standstill. */
export const atSwitchingOn = (input: CaseInput) => {
  const result: CaseResult = runCase(input)
  const standstill = result.motors[0]?.start?.standstill
  if (!standstill) throw new Error(`no start: ${JSON.stringify(result.outcome)}`)
  const part = (busId: string): number => {
    const place = result.places.find((one) => one.busId === busId)
    return place ? place.first / place.nominal : Number.NaN
  }
  return { part, standstill }
}
