import { starterPhrase } from '@/lib/study/words/starter-phrase'
import { dataTable } from '../paper/data-table'
import { paragraph } from '../paper/text-block'
import { appendix, type ReportContext } from '../report-context'
import { designMotors, startersOfMotor } from '../values/design-records'
import type { Section } from './section'

/** Rows of the log that fill what a card needs. */
const logRows = 12

const countOf = (value: number | null, { words }: ReportContext): string =>
  value === null ? words.sheets.starts.notDeclared : String(value)

/** The card beside the push-button: what is allowed, and a log to fill in. */
export const startCard: Section = (context) => {
  const { paper, input, words, width } = context
  const { document } = input
  const say = words.sheets.starts
  const motors = designMotors(document)
  const { startsPerDay, startsPerHour } = document.settings
  if (motors.length === 0) return [appendix(context, 'start-card', say.title), ...paragraph(paper, say.none, { width })]
  return [
    appendix(context, 'start-card', say.title),
    ...paragraph(paper, say.intro(startsPerDay.text, startsPerHour.text), { width }),
    dataTable(paper, {
      width,
      columns: [
        { head: say.heads.motor, width: 60, fixed: true },
        { head: say.heads.cold, width: 0.7 },
        { head: say.heads.hot, width: 0.7 },
        { head: say.heads.hour, width: 0.6 },
        { head: say.heads.method, width: 1.6 },
        { head: say.heads.duty, width: 1.4 },
      ],
      rows: motors.map((motor) => {
        const starters = startersOfMotor(document, motor.id)
        const duties = starters.flatMap((one) => ('duty' in one && one.duty !== '' ? [one.duty] : []))
        return [
          { text: motor.tag, weight: 'semibold' as const },
          countOf(motor.startsCold, context),
          countOf(motor.startsHot, context),
          countOf(motor.startsPerHour, context),
          starters.map(starterPhrase).join('; '),
          duties.length === 0 ? '–' : duties.join('; '),
        ]
      }),
    }),
    ...paragraph(paper, say.after, { width }),
    ...paragraph(paper, `**${say.log}**`, { width, below: 2, keep: 60 }),
    dataTable(paper, {
      width,
      leading: 15,
      columns: say.logHeads.map((head) => ({ head, width: 1 })),
      rows: Array.from({ length: logRows }, () => say.logHeads.map(() => '')),
    }),
  ]
}
