import type { ReactElement } from 'react'
import { provenanceKinds, provenanceMark } from '@/lib/quantity/provenance'
import { dataTable } from '../paper/data-table'
import { paragraph } from '../paper/text-block'
import { chapter, type ReportContext, subsection } from '../report-context'
import { small } from '../theme'
import { loadConditionFields, plantConditionFields, settingsFields, starterFields } from '../values/condition-fields'
import { circuitFields, drivenLoadFields, motorFields } from '../values/machine-fields'
import {
  busFields,
  capacitorFields,
  lineFields,
  loadFields,
  supplyFields,
  transformerFields,
} from '../values/network-fields'
import { protectionFields } from '../values/protection-fields'
import { noRecords, recordRows, recordSheets } from './record-tables'
import type { Section } from './section'

/** Methods whose settings fit a row; with any other in the plant each method has a sheet. */
const fewSettings: readonly string[] = ['direct', 'autotransformer', 'star-delta']

const legend = ({ paper, words, width }: ReportContext) => {
  const { input } = words.records
  const marks = provenanceKinds.map((kind) => `${provenanceMark[kind].mark} ${provenanceMark[kind].meaning}`)
  const text = [...marks, `${input.noSourceMark} ${input.legendNone}`].join('     ')
  return paragraph(paper, text.replace(/ /g, '\u00a0').replace(/\u00a0{5}/g, '   '), { width, ...small, ink: 'soft' })
}

const sourceTable = ({ paper, words, width, sources }: ReportContext): readonly ReactElement[] => {
  const { input } = words.records
  if (sources.all.length === 0) return paragraph(paper, input.none, { width, ink: 'soft' })
  return [
    dataTable(paper, {
      width,
      columns: [
        { head: input.sourceHeads.number, width: 28, fixed: true, align: 'right' },
        { head: input.sourceHeads.kind, width: 78, fixed: true },
        { head: input.sourceHeads.source, width: 1 },
        { head: input.sourceHeads.count, width: 40, fixed: true, align: 'right' },
      ],
      rows: sources.all.map(({ number, kind, source, count }) => [
        String(number),
        `${provenanceMark[kind].mark} ${provenanceMark[kind].word}`,
        source,
        String(count),
      ]),
    }),
  ]
}

/** Every record with its values as typed, the mark of where each came from, and the list of sources. */
export const inputData: Section = (context) => {
  const { paper, input, words, width } = context
  const { document } = input
  const { plant, settings } = document
  const { fields } = words
  const { input: say } = words.records
  const part = (key: keyof typeof say.kinds, some: boolean, content: () => readonly ReactElement[]) => [
    subsection(context, `input-${key}`, say.kinds[key]),
    ...(some ? content() : noRecords(context)),
  ]
  const wide = {
    [fields.name]: 2,
    [fields.meaning]: 2.2,
    [fields.bus]: 0.7,
    [fields.duty]: 2.4,
    [fields.own]: 2.2,
    [fields.method]: 1.7,
    [fields.changeOver]: 1.3,
  }
  return [
    chapter(context, 'input', say.title),
    ...paragraph(paper, say.intro, { width }),
    ...legend(context),
    ...part('settings', true, () =>
      recordSheets(context, settingsFields(fields, document), [{ ...settings, tag: say.study }]),
    ),
    ...part('buses', plant.buses.length > 0, () => [recordRows(context, busFields(fields), plant.buses, wide)]),
    ...part('supplies', plant.supplies.length > 0, () =>
      recordSheets(context, supplyFields(fields, document), plant.supplies),
    ),
    ...part('transformers', plant.transformers.length > 0, () => [
      recordRows(context, transformerFields(fields, document), plant.transformers),
    ]),
    ...part('lines', plant.lines.length > 0, () => [recordRows(context, lineFields(fields, document), plant.lines)]),
    ...part('loads', plant.loads.length > 0, () => [recordRows(context, loadFields(fields, document), plant.loads)]),
    ...part('capacitors', plant.capacitors.length > 0, () => [
      recordRows(context, capacitorFields(fields, document), plant.capacitors),
    ]),
    ...part('motors', plant.motors.length > 0, () =>
      recordSheets(context, [...motorFields(fields, document), ...protectionFields(words)], plant.motors),
    ),
    ...part('circuits', plant.motors.length > 0, () => recordSheets(context, circuitFields(fields), plant.motors)),
    ...part('drivenLoads', plant.drivenLoads.length > 0, () => drivenLoads(context)),
    ...part('starters', plant.starters.length > 0, () =>
      plant.starters.every(({ kind }) => fewSettings.includes(kind))
        ? [recordRows(context, starterFields(fields), plant.starters, wide)]
        : recordSheets(context, starterFields(fields), plant.starters),
    ),
    ...part('plantConditions', plant.plantConditions.length > 0, () => [
      recordRows(context, plantConditionFields(fields, document), plant.plantConditions, { [fields.running]: 3 }),
    ]),
    ...part('loadConditions', plant.loadConditions.length > 0, () => [
      recordRows(context, loadConditionFields(fields, document), plant.loadConditions, { [fields.curves]: 5 }),
    ]),
    subsection(context, 'input-sources', say.sources),
    ...sourceTable(context),
  ]
}

/** Driven loads with the same parts and curves share a table. */
const drivenLoads = (context: ReportContext): readonly ReactElement[] => {
  const { input, words } = context
  const { document } = input
  const groups = new Map<string, typeof document.plant.drivenLoads>()
  for (const load of document.plant.drivenLoads) {
    const key = drivenLoadFields(load, words.fields, document)
      .map((field) => field.label)
      .join('\n')
    groups.set(key, [...(groups.get(key) ?? []), load])
  }
  return [...groups.values()].flatMap((loads) =>
    recordSheets(context, drivenLoadFields(loads[0]!, words.fields, document), loads),
  )
}
