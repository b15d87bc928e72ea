import type { StudyDocument } from '@/lib/study/document/study-document'
import { formulaBlock } from '../formula/formula-block'
import { list, paragraph } from '../paper/text-block'
import { chapter, subsection } from '../report-context'
import type { Section } from './section'

/** Whether a generator supplies the plant or a transfer is studied, which have a method of their own. */
const hasGenerator = ({ plant, schedules }: StudyDocument): boolean =>
  plant.supplies.some(({ level }) => level.form === 'generator') || schedules.some(({ disturbance }) => disturbance?.to)

/** The method in words and formulas. */
export const method: Section = (context) => {
  const { paper, input, words, width } = context
  const { method: say } = words
  const { settings } = input.document
  return [
    chapter(context, 'method', say.title),
    ...paragraph(paper, say.intro, { width }),
    ...[...say.parts, ...words.protection.method]
      .filter(({ id }) => id !== 'method-generator' || hasGenerator(input.document))
      .flatMap(({ id, title, content }) => [
        subsection(context, id, title),
        ...content.flatMap((part) =>
          typeof part === 'string' ? paragraph(paper, part, { width }) : [formulaBlock(paper, part.tex, width)],
        ),
      ]),
    subsection(context, say.control.id, say.control.title),
    ...paragraph(paper, say.control.criterion(settings.speedCriterion.text, settings.timeLimit.text), { width }),
    ...paragraph(paper, say.control.accuracy, { width }),
    subsection(context, say.excluded.id, say.excluded.title),
    ...list(paper, say.excluded.items, { width }),
  ]
}
