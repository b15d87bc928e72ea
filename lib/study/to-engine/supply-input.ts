import type { MachineModel, SupplyInput } from '../../engine/case-input'
import type { SecondSupply } from '../../engine/schedule-input'
import { type Complex, type Ohm, ohm, volt } from '../../units/si'
import type { CaseRecord } from '../document/case-records'
import type { GeneratorLevel } from '../document/generator-level'
import type { SupplyRecord } from '../document/network-records'
import { changesOf } from './case-changes'
import { generatorInput } from './generator-input'
import { impedanceByAngle } from './impedance-by-angle'

/** The voltage factor that is computed with; unknown counts as 1.00, which the assumptions list. */
export const voltageFactorOf = ({ voltageFactor }: SupplyRecord): number => {
  if (voltageFactor.kind === 'other') return voltageFactor.value.si
  return voltageFactor.kind === '1.10' ? 1.1 : 1
}

/** A generator meets the first instant behind X″_d, or X′_d where that is unknown. */
export const generatorImpedance = (level: GeneratorLevel, ratedVoltage: number): Complex<Ohm> => {
  const { resistance, transient, subtransient } = generatorInput(level, ratedVoltage)
  return { re: resistance, im: subtransient?.reactance ?? transient }
}

/**
 * Source impedance |Z| = c·U²/S_k with the angle atan(X/R), U the voltage that the level was stated at and c the
 * voltage factor that the level contains. A current I_k stands for S_k = √3·U·I_k; a stated impedance is taken as it is.
 */
const sourceImpedance = (supply: SupplyRecord, factor: number): Complex<Ohm> => {
  const { level, xOverR } = supply
  if (level.form === 'generator') return generatorImpedance(level, supply.statedAt.si)
  if (level.form === 'impedance') return { re: ohm(level.resistance.si), im: ohm(level.reactance.si) }
  if (xOverR === null) throw new RangeError(`supply ${supply.id} was not checked: it has no X/R`)
  const voltage = supply.statedAt.si
  const power = level.form === 'power' ? level.power.si : Math.sqrt(3) * voltage * level.current.si
  return impedanceByAngle((factor * voltage ** 2) / power, xOverR.si)
}

/** A supply that waits unloaded for the plant to come over to it: its stated voltage is then its open-circuit voltage. */
export const secondSupplyInput = (supply: SupplyRecord, angle: number): SecondSupply => ({
  impedance: sourceImpedance(supply, voltageFactorOf(supply)),
  emf: volt(supply.before.voltage.si),
  angle,
  ...(supply.level.form === 'generator' && { generator: generatorInput(supply.level, supply.statedAt.si) }),
})

/** The supply of a case, with what the case changes in it. */
export const supplyInput = (
  supply: SupplyRecord,
  record: CaseRecord,
  plantMotors: readonly { busId: string; circuit: MachineModel }[],
): SupplyInput => {
  const factor = changesOf(record, 'voltage-factor').at(-1)?.value.si ?? voltageFactorOf(supply)
  const changed = changesOf(record, 'voltage-before').at(-1)?.voltage.si
  const { kind, voltage } = supply.before
  const hold: SupplyInput['hold'] =
    changed === undefined && kind === 'open-circuit' && supply.level.form !== 'generator'
      ? { kind: 'emf', voltage: volt(voltage.si) }
      : { kind: 'bus-voltage', voltage: volt(changed ?? voltage.si) }
  return {
    busId: supply.bus,
    impedance: sourceImpedance(supply, factor),
    hold,
    motorsInLevel: supply.plantMotorsIncluded === 'yes' && supply.level.form !== 'generator' ? plantMotors : [],
    ...(supply.level.form === 'generator' && { generator: generatorInput(supply.level, supply.statedAt.si) }),
  }
}
