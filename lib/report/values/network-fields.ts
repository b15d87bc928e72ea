import type { Entered } from '@/lib/study/document/entered'
import type { GeneratorLevel } from '@/lib/study/document/generator-level'
import type {
  BusRecord,
  CapacitorRecord,
  LineRecord,
  LoadRecord,
  SupplyRecord,
  TransformerRecord,
} from '@/lib/study/document/network-records'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { busTag } from '@/lib/study/words/tags'
import type { Wording } from '../wording/en'
import { type FieldValue, ofEntered, ofWords, type RecordField } from './record-field'

type Words = Wording['fields']

export const busFields = (words: Words): readonly RecordField<BusRecord>[] => [
  { label: words.name, of: (bus) => ofWords(bus.name) },
  { label: words.nominal, of: (bus) => ofEntered(bus.nominal) },
]

const levelOf = ({ level }: SupplyRecord): FieldValue | null => {
  if (level.form === 'power') return ofEntered(level.power)
  if (level.form === 'current') return ofEntered(level.current)
  if (level.form === 'generator') return ofEntered(level.rating)
  const { resistance, reactance } = level
  return { text: `${resistance.text} + j ${reactance.text}`, provenance: reactance.provenance }
}

const factorOf = ({ voltageFactor }: SupplyRecord, words: Words): FieldValue | null => {
  if (voltageFactor.kind === 'other') return ofEntered(voltageFactor.value)
  return ofWords(voltageFactor.kind === 'unknown' ? words.values.unknown : voltageFactor.kind)
}

/** The data sheet of a generator; empty for a supply of the network. */
const generatorFields = (words: Words): readonly RecordField<SupplyRecord>[] => {
  const say = words.generator
  const field = (
    label: string,
    of: (level: GeneratorLevel) => Entered | null | undefined,
  ): RecordField<SupplyRecord> => ({
    label,
    of: ({ level }) => (level.form === 'generator' ? ofEntered(of(level) ?? null) : null),
  })
  return [
    field(say.resistance, (one) => one.resistance),
    field(say.synchronous, (one) => one.synchronous),
    field(say.transient, (one) => one.transient),
    field(say.transientTime, (one) => one.transientTime),
    field(say.subtransient, (one) => one.subtransient?.reactance),
    field(say.subtransientTime, (one) => one.subtransient?.time),
    field(say.quadrature, (one) => one.quadrature?.reactance),
    field(say.quadratureTime, (one) => one.quadrature?.time),
    field(say.gain, (one) => one.regulator?.gain),
    field(say.regulatorTime, (one) => one.regulator?.time),
    field(say.reset, (one) => one.regulator?.reset),
    field(say.ceiling, (one) => one.regulator?.ceiling),
    {
      label: say.exciter,
      of: ({ level }) =>
        level.form === 'generator' && level.regulator
          ? ofWords(level.regulator.fedFromTerminals ? say.fromTerminals : say.independent)
          : null,
    },
    field(say.inertia, (one) => one.inertia),
    field(say.droop, (one) => one.governor?.droop),
    field(say.governorTime, (one) => one.governor?.time),
    field(say.largestPower, (one) => one.governor?.power),
  ]
}

export const supplyFields = (words: Words, document: StudyDocument): readonly RecordField<SupplyRecord>[] => [
  { label: words.meaning, of: (supply) => ofWords(supply.meaning) },
  { label: words.bus, of: (supply) => ofWords(busTag(document, supply.bus)) },
  { label: words.level, of: levelOf },
  ...generatorFields(words),
  { label: words.statedAt, of: (supply) => ofEntered(supply.statedAt) },
  { label: words.voltageFactor, of: (supply) => factorOf(supply, words) },
  { label: words.levelInstant, of: (supply) => ofWords(words.values[supply.instant]) },
  { label: words.motorsIncluded, of: (supply) => ofWords(words.values[supply.plantMotorsIncluded]) },
  { label: words.xOverR, of: (supply) => ofEntered(supply.xOverR) },
  {
    label: words.before,
    of: ({ before }) => (before.kind === 'bus-voltage' ? ofEntered(before.voltage) : null),
  },
  {
    label: words.openCircuit,
    of: ({ before }) => (before.kind === 'open-circuit' ? ofEntered(before.voltage) : null),
  },
  { label: words.date, of: (supply) => ofWords(supply.date ?? '') },
  { label: words.letter, of: (supply) => ofWords(supply.letter) },
]

export const transformerFields = (words: Words, document: StudyDocument): readonly RecordField<TransformerRecord>[] => [
  { label: words.from, of: (one) => ofWords(busTag(document, one.from)) },
  { label: words.to, of: (one) => ofWords(busTag(document, one.to)) },
  { label: words.rating, of: (one) => ofEntered(one.rating) },
  { label: words.fromVoltage, of: (one) => ofEntered(one.fromVoltage) },
  { label: words.toVoltage, of: (one) => ofEntered(one.toVoltage) },
  { label: words.impedance, of: (one) => ofEntered(one.impedance) },
  { label: words.xOverR, of: (one) => ofEntered(one.xOverR) },
  { label: words.tap, of: (one) => ofEntered(one.tap) },
  { label: words.vectorGroup, of: (one) => ofWords(one.vectorGroup) },
]

export const lineFields = (words: Words, document: StudyDocument): readonly RecordField<LineRecord>[] => [
  { label: words.kind, of: (one) => ofWords(words.values[one.kind]) },
  { label: words.from, of: (one) => ofWords(busTag(document, one.from)) },
  { label: words.to, of: (one) => ofWords(busTag(document, one.to)) },
  { label: words.length, of: (one) => ofEntered(one.length) },
  { label: words.resistance, of: (one) => ofEntered(one.resistance) },
  { label: words.reactance, of: (one) => ofEntered(one.reactance) },
  { label: words.susceptance, of: (one) => ofEntered(one.susceptance) },
  { label: words.parallel, of: (one) => ofWords(String(one.parallel)) },
]

const share = (value: number): string => String(Math.round(value * 1e6) / 1e6)

export const loadFields = (words: Words, document: StudyDocument): readonly RecordField<LoadRecord>[] => [
  { label: words.bus, of: (one) => ofWords(busTag(document, one.bus)) },
  { label: words.active, of: (one) => ofEntered(one.active) },
  { label: words.reactive, of: (one) => ofEntered(one.reactive) },
  { label: words.ratedVoltage, of: (one) => ofEntered(one.ratedVoltage) },
  {
    label: words.mix,
    of: ({ mix }) => ofWords([mix.impedance, mix.current, mix.power].map(share).join(' / ')),
  },
  { label: words.floor, of: (one) => ofEntered(one.floor) },
]

export const capacitorFields = (words: Words, document: StudyDocument): readonly RecordField<CapacitorRecord>[] => [
  { label: words.bus, of: (one) => ofWords(busTag(document, one.bus)) },
  { label: words.capacity, of: (one) => ofEntered(one.rating) },
  { label: words.ratedVoltage, of: (one) => ofEntered(one.ratedVoltage) },
]
