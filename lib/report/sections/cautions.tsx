import { dataTable } from '../paper/data-table'
import { list, paragraph } from '../paper/text-block'
import { appendix, chapter, type ReportContext, subsection } from '../report-context'
import type { Section } from './section'

/** Cautions that the study's own data call for. */
const touched = ({ input, words }: ReportContext): readonly string[] => {
  const { cautions: say } = words
  const { plant, schedules } = input.document
  const used = new Set(schedules.flatMap(({ starts }) => starts.map(({ starter }) => starter)))
  const starters = plant.starters.filter(({ id }) => used.has(id))
  const when = (holds: boolean, sentence: string) => (holds ? [sentence] : [])
  return [
    ...when(plant.capacitors.length > 0, say.capacitors),
    ...when(
      starters.some((one) => 'gap' in one && one.gap.si > 0),
      say.openTransition,
    ),
    ...when(
      starters.some(({ kind }) => kind === 'autotransformer'),
      say.autotransformer,
    ),
    ...when(
      plant.plantConditions.some(({ running }) => running.length > 0),
      say.reacceleration,
    ),
    ...when(plant.motors.length > 0, say.repeated),
    ...when(plant.transformers.length > 0, say.transformer),
    ...when(
      plant.drivenLoads.some(({ machine }) => machine !== 'conveyor' && machine !== 'mill' && machine !== 'other'),
      say.process,
    ),
  ]
}

/** Limitations, what the report does not contain and why, cautions and the disclaimer. */
export const cautions: Section = (context) => {
  const { paper, input, words, width } = context
  const { cautions: say } = words
  const leftOut = input.document.texts.leftOut.map((part) => [say.missing.parts[part], say.missing.leftOut] as const)
  const hasFlicker = input.result.cases.some(({ flicker }) => flicker !== undefined)
  return [
    chapter(context, 'cautions', say.title),
    ...list(paper, say.disclaimer, { width }),
    subsection(context, 'cautions-touched', say.touched),
    ...list(paper, touched(context), { width }),
    subsection(context, 'missing', say.missing.title),
    ...paragraph(paper, say.missing.intro, { width }),
    dataTable(paper, {
      width,
      columns: [
        { head: say.missing.heads.part, width: 120, fixed: true },
        { head: say.missing.heads.why, width: 1 },
      ],
      rows: [...leftOut, ...say.missing.items.filter(([part]) => part !== say.missing.flicker || !hasFlicker)].map(
        ([part, why]) => [{ text: part, weight: 'semibold' as const }, why],
      ),
    }),
  ]
}

export const glossary: Section = (context) => {
  const { paper, words, width } = context
  const { glossary: say } = words.cautions
  return [
    appendix(context, 'glossary', say.title),
    dataTable(paper, {
      width,
      columns: [
        { head: say.heads.term, width: 1.1 },
        { head: say.heads.us, width: 1.1 },
        { head: say.heads.meaning, width: 2.6 },
      ],
      rows: say.rows.map(([term, us, meaning]) => [
        { text: term, weight: 'semibold' as const },
        us,
        { text: meaning, markup: true },
      ]),
    }),
  ]
}
