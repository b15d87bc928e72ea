import { formatNumber } from '@/lib/quantity/format-number'
import type { CaseRecord } from '@/lib/study/document/case-records'
import type { MotorRecord } from '@/lib/study/document/machine-records'
import type { SupplyRecord, TransformerRecord } from '@/lib/study/document/network-records'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { circuitEstimator, circuitInput } from '@/lib/study/to-engine/circuit-input'
import { generatorImpedance, voltageFactorOf } from '@/lib/study/to-engine/supply-input'
import type { Complex } from '@/lib/units/si'
import type { Wording } from '../wording/en'
import { add, byRatio, magnitude, scale } from './complex'
import { standstillImpedance } from './standstill-impedance'
import { type PathStep, supplyPath } from './supply-path'

/** One impedance of the chain, in ohm referred to the supply's bus, and how it is found from the records. */
export interface HandPart {
  name: string
  how: string
  impedance: Complex
}

export interface HandCalculation {
  motor: MotorRecord
  supply: SupplyRecord
  /** Supply first, motor last. */
  parts: readonly HandPart[]
  total: Complex
  /** The sum without the supply. */
  beyond: Complex
  /** Voltage of the source in V. */
  source: number
  /** Change at the supply's bus, in parts of the voltage before. */
  change: number
  /** Voltage at the motor in parts of its rated voltage. */
  motorVoltage: number
  /** Current of the motor in A. */
  current: number
}

type Words = Wording['handCheck']

const supplyPart = (supply: SupplyRecord, words: Words): HandPart => {
  const { level, statedAt, xOverR } = supply
  const name = words.supply(supply.tag)
  if (level.form === 'generator') {
    return { name, how: words.supplyGenerator, impedance: generatorImpedance(level, statedAt.si) }
  }
  if (level.form === 'impedance' || xOverR === null) {
    const impedance =
      level.form === 'impedance'
        ? { re: level.resistance.si, im: level.reactance.si }
        : { re: Number.NaN, im: Number.NaN }
    return { name, how: words.supplyImpedance, impedance }
  }
  const power = level.form === 'power' ? level.power.si : Math.sqrt(3) * statedAt.si * level.current.si
  const levelText = level.form === 'power' ? level.power.text : `(√3 × ${statedAt.text} × ${level.current.text})`
  const factor = voltageFactorOf(supply)
  return {
    name,
    how: words.supplyLevel(formatNumber(factor, { decimals: 2 }), statedAt.text, levelText, xOverR.text),
    impedance: byRatio((factor * statedAt.si ** 2) / power, xOverR.si),
  }
}

/** The tap that stands in the plant condition of the case, else in the record. */
const tapOf = (transformer: TransformerRecord, record: CaseRecord, document: StudyDocument): number => {
  const condition = document.plant.plantConditions.find(({ id }) => id === record.plantCondition)
  return condition?.taps.find((one) => one.transformer === transformer.id)?.tap.si ?? transformer.tap.si
}

const ratioText = (ratio: number): string => formatNumber(ratio, { digits: 5 })

/** Parts of the path, each referred with the product of the ratios between it and the supply; the last ratio refers the motor. */
const pathParts = (
  path: readonly PathStep[],
  record: CaseRecord,
  document: StudyDocument,
  words: Words,
): { parts: readonly HandPart[]; ratio: number } => {
  let ratio = 1
  const parts = path.map(({ branch, forwards }): HandPart => {
    const referred = (how: string) => (Math.abs(ratio - 1) < 1e-12 ? how : words.referred(how, ratioText(ratio)))
    if (branch.kind === 'line') {
      const { tag, length, resistance, reactance, parallel } = branch.record
      const own = { re: (resistance.si * length.si) / parallel, im: (reactance.si * length.si) / parallel }
      const how = words.line(length.text, resistance.text, reactance.text, parallel)
      return { name: tag, how: referred(how), impedance: scale(own, ratio ** 2) }
    }
    const { tag, impedance, toVoltage, fromVoltage, rating, xOverR } = branch.record
    const turns = (fromVoltage.si * (1 + tapOf(branch.record, record, document))) / toVoltage.si
    const own = byRatio((impedance.si * toVoltage.si ** 2) / rating.si, xOverR.si)
    const how = words.transformer(impedance.text, toVoltage.text, rating.text, xOverR.text)
    // The impedance lies on the to side: behind the ratio when walked along, before it when walked against.
    const before = ratio
    ratio = forwards ? ratio * turns : ratio / turns
    const side = forwards ? ratio : before
    const text = Math.abs(side - 1) < 1e-12 ? how : words.referred(how, ratioText(side))
    return { name: tag, how: text, impedance: scale(own, side ** 2) }
  })
  return { parts, ratio }
}

/** The pocket-calculator check of one motor alone at standstill; null where the network is not a chain or a datum is missing. */
export const handCalculation = (
  document: StudyDocument,
  record: CaseRecord,
  motor: MotorRecord,
  words: Words,
): HandCalculation | null => {
  const supply = document.plant.supplies.find(({ id }) => id === record.supply)
  const path = supply ? supplyPath(document.plant, supply.bus, motor.bus) : null
  const circuit = circuitInput(motor, circuitEstimator(document.frequency.si))
  if (!supply || !path || !circuit.ok || circuit.circuit === null || motor.saturation !== null) return null
  const first = supplyPart(supply, words)
  const { parts: between, ratio } = pathParts(path, record, document, words)
  const own = standstillImpedance(circuit.circuit)
  const ownText = `${words.motorCircuit}: ${formatNumber(own.re, { digits: 5 })} + j ${formatNumber(own.im, { digits: 5 })}\u2009Ω`
  const last = {
    name: motor.tag,
    how: Math.abs(ratio - 1) < 1e-12 ? ownText : words.referred(ownText, ratioText(ratio)),
    impedance: scale(own, ratio ** 2),
  }
  const beyond = [...between, last].map(({ impedance }) => impedance).reduce(add)
  const total = add(first.impedance, beyond)
  const source = supply.before.voltage.si
  return {
    motor,
    supply,
    parts: [first, ...between, last],
    total,
    beyond,
    source,
    change: 1 - magnitude(beyond) / magnitude(total),
    motorVoltage: (source * magnitude(last.impedance)) / magnitude(total) / ratio / motor.ratedVoltage.si,
    current: (source / (Math.sqrt(3) * magnitude(total))) * ratio,
  }
}
