import type { LoadConditionRecord, PlantConditionRecord } from '@/lib/study/document/case-records'
import type { StarterRecord } from '@/lib/study/document/starter-record'
import type { StudyDocument, StudySettings } from '@/lib/study/document/study-document'
import { walkEntered } from '@/lib/study/walk-entered'
import { listedTags } from '@/lib/study/words/list-words'
import { loadTag, motorTag, transformerTag } from '@/lib/study/words/tags'
import type { Wording } from '../wording/en'
import { type FieldValue, ofEntered, ofWords, type RecordField } from './record-field'

type Words = Wording['fields']

export const settingsFields = (words: Words, document: StudyDocument): readonly RecordField<StudySettings>[] => [
  { label: words.frequency, of: () => ofEntered(document.frequency) },
  { label: words.speedCriterion, of: (one) => ofWords(one.speedCriterion.text) },
  { label: words.timeLimit, of: (one) => ofWords(one.timeLimit.text) },
  { label: words.thermalState, of: (one) => ofWords(words.values[one.thermalState]) },
  { label: words.closeOfLimit, of: (one) => ofWords(one.closeOfLimit.text) },
  { label: words.closeVoltage, of: (one) => ofWords(one.closeVoltage.text) },
  { label: words.startsPerDay, of: (one) => ofWords(one.startsPerDay.text) },
  { label: words.startsPerHour, of: (one) => ofWords(one.startsPerHour.text) },
]

export const starterFields = (words: Words): readonly RecordField<StarterRecord>[] => [
  { label: words.method, of: (one) => ofWords(words.values[one.kind]) },
  { label: words.ratioTap, of: (one) => (one.kind === 'autotransformer' ? ofEntered(one.tap) : null) },
  {
    label: words.own,
    of: (one) => {
      if (one.kind !== 'autotransformer') return null
      if (one.own === null) return ofWords(words.values.ideal)
      const { impedance, rating, xOverR } = one.own
      return { text: words.values.own(impedance.text, rating.text, xOverR.text), provenance: impedance.provenance }
    },
  },
  { label: words.changeOver, of: (one) => ('changeOver' in one ? ofEntered(one.changeOver.at) : null) },
  { label: words.gap, of: (one) => ('gap' in one ? ofEntered(one.gap) : null) },
  { label: words.duty, of: (one) => ('duty' in one ? ofWords(one.duty) : null) },
  {
    label: words.dutyStarts,
    of: (one) => ('dutyLimits' in one ? ofWords(one.dutyLimits?.startsPerHour?.toString() ?? '') : null),
  },
  ...Object.entries(words.starterSettings).map(([place, label]) => ({
    label,
    of: (one: StarterRecord) => settingAt(one, place),
  })),
]

/** Values of a record at one place; those of a list one after the other, with the source of the first. */
const settingAt = (record: StarterRecord, place: string): FieldValue | null => {
  const found = walkEntered(record).filter(
    ({ path }) => path.filter((key) => typeof key === 'string').join('.') === place,
  )
  const first = found[0]?.value
  return first ? { text: found.map(({ value }) => value.text).join(', '), provenance: first.provenance } : null
}

const curveName = (document: StudyDocument, motor: string, curve: string): string =>
  document.plant.drivenLoads.find((load) => load.motor === motor)?.curves.find(({ id }) => id === curve)?.name ?? curve

const capacitorTag = (document: StudyDocument, id: string): string =>
  document.plant.capacitors.find((one) => one.id === id)?.tag ?? id

export const plantConditionFields = (
  words: Words,
  document: StudyDocument,
): readonly RecordField<PlantConditionRecord>[] => [
  {
    label: words.running,
    of: ({ running }) =>
      ofWords(
        running
          .map(({ motor, curve }) => words.values.running(motorTag(document, motor), curveName(document, motor, curve)))
          .join(', ') || words.values.none,
      ),
  },
  {
    label: words.capacitors,
    of: (one) => ofWords(listedTags(one.capacitors.map((id) => capacitorTag(document, id))) || words.values.none),
  },
  {
    label: words.loadsOff,
    of: (one) => ofWords(listedTags(one.loadsOff.map((id) => loadTag(document, id))) || words.values.none),
  },
  {
    label: words.taps,
    of: ({ taps }) =>
      ofWords(
        taps
          .map(({ transformer, tap }) => words.values.tap(transformerTag(document, transformer), tap.text))
          .join(', ') || words.values.none,
      ),
  },
]

export const loadConditionFields = (
  words: Words,
  document: StudyDocument,
): readonly RecordField<LoadConditionRecord>[] => [
  {
    label: words.curves,
    of: ({ curves }) =>
      ofWords(
        curves
          .map(({ motor, starting, process }) => {
            const [tag, first] = [motorTag(document, motor), curveName(document, motor, starting)]
            return process === null || process === starting
              ? words.values.staysSame(tag, first)
              : words.values.thenProcess(tag, first, curveName(document, motor, process))
          })
          .join('; '),
      ),
  },
]
