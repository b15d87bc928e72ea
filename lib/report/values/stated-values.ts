import type { ValueProvenance } from '@/lib/study/document/entered'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { listedTags } from '@/lib/study/words/list-words'
import { plateSentences } from '@/lib/study/words/plate-words'
import type { Wording } from '../wording/en'
import { plantConditionFields, settingsFields, starterFields } from './condition-fields'
import { circuitFields, drivenLoadFields, motorFields } from './machine-fields'
import { busFields, capacitorFields, lineFields, loadFields, supplyFields, transformerFields } from './network-fields'
import { protectionFields } from './protection-fields'
import type { RecordField } from './record-field'

/** A value that somebody stated, or should have stated, a source for. */
export interface StatedValue {
  record: string
  field: string
  text: string
  provenance: ValueProvenance | null
}

const ofRecord = <R>(record: R, tag: string, fields: readonly RecordField<R>[]): readonly StatedValue[] =>
  fields.flatMap((field) => {
    const value = field.of(record)
    if (!value || value.provenance === undefined) return []
    return [{ record: tag, field: field.label, text: value.text, provenance: value.provenance }]
  })

/** Every value of the plant's records that has, or lacks, a source; in the order of the input data. */
export const statedValues = (document: StudyDocument, words: Wording): readonly StatedValue[] => {
  const { fields, records } = words
  const { plant, settings } = document
  const all = <R extends { tag: string }>(list: readonly R[], of: readonly RecordField<R>[]) =>
    list.flatMap((record) => ofRecord(record, record.tag, of))
  return [
    ...ofRecord(settings, records.input.kinds.settings, settingsFields(fields, document)),
    ...all(plant.buses, busFields(fields)),
    ...all(plant.supplies, supplyFields(fields, document)),
    ...all(plant.transformers, transformerFields(fields, document)),
    ...all(plant.lines, lineFields(fields, document)),
    ...all(plant.loads, loadFields(fields, document)),
    ...all(plant.capacitors, capacitorFields(fields, document)),
    ...all(plant.motors, [...motorFields(fields, document), ...circuitFields(fields), ...protectionFields(words)]),
    ...plant.drivenLoads.flatMap((load) => ofRecord(load, load.tag, drivenLoadFields(load, fields, document))),
    ...all(plant.starters, starterFields(fields)),
    ...all(plant.plantConditions, plantConditionFields(fields, document)),
  ]
}

/** What the calculation, or a reviewer, asks for and nobody has recorded: one sentence for all records that lack it. */
export const openItems = ({ plant, frequency }: StudyDocument, { records }: Wording): readonly string[] => {
  const { openItems: say } = records.assumptions
  const lacking = <R extends { tag: string }>(
    list: readonly R[],
    lacks: (record: R) => boolean,
    sentence: (tags: string) => string,
  ): readonly string[] => {
    const tags = listedTags(list.filter(lacks).map(({ tag }) => tag))
    return tags === '' ? [] : [sentence(tags)]
  }
  const { supplies, motors, starters } = plant
  return [
    ...lacking(supplies, ({ voltageFactor }) => voltageFactor.kind === 'unknown', say.voltageFactor),
    ...lacking(supplies, ({ instant }) => instant === 'unknown', say.instant),
    ...lacking(supplies, ({ plantMotorsIncluded }) => plantMotorsIncluded === 'unknown', say.motorsIncluded),
    ...lacking(supplies, ({ date }) => date === null, say.date),
    ...lacking(motors, ({ circuit }) => circuit.kind === 'estimated', say.estimated),
    ...motors.flatMap((motor) => plateSentences(motor, frequency.si)),
    ...lacking(motors, ({ lockedRotorPowerFactor }) => lockedRotorPowerFactor === null, say.lockedRotorPowerFactor),
    ...lacking(motors, ({ pullUpTorque }) => pullUpTorque === null, say.pullUp),
    ...lacking(motors, (one) => one.permissibleCold === null && one.permissibleHot === null, say.permissible),
    ...lacking(motors, ({ startsCold, startsHot }) => startsCold === null && startsHot === null, say.starts),
    ...lacking(
      starters,
      (one) => one.kind === 'autotransformer' && one.gap.si === 0 && one.middle === null,
      say.middleStep,
    ),
    ...lacking(starters, (one) => 'duty' in one && one.dutyLimits === null && one.duty.trim() === '', say.duty),
  ]
}
