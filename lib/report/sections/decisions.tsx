import { limitTag } from '@/lib/study/words/tags'
import { dataTable } from '../paper/data-table'
import { paragraph } from '../paper/text-block'
import { appendix, subsection } from '../report-context'
import { printInstant } from '../values/dates'
import type { Section } from './section'

/** Decisions on this revision, waivers and deviations. */
export const decisions: Section = (context) => {
  const { paper, input, words, width } = context
  const { decisions: say } = words.results
  const { revision, document } = input
  return [
    appendix(context, 'decisions', say.title),
    subsection(context, 'decisions-taken', say.decisions),
    ...(revision.decisions.length === 0
      ? paragraph(paper, say.noDecisions, { width })
      : [
          dataTable(paper, {
            width,
            columns: [
              { head: say.heads.what, width: 1 },
              { head: say.heads.who, width: 1 },
              { head: say.heads.at, width: 1 },
              { head: say.heads.note, width: 2 },
            ],
            rows: revision.decisions.map((one) => [one.what, one.who, printInstant(one.at, words), one.note]),
          }),
        ]),
    subsection(context, 'waivers', say.waivers),
    ...(revision.waivers.length === 0
      ? paragraph(paper, say.noWaivers, { width })
      : [
          dataTable(paper, {
            width,
            columns: [
              { head: say.waiverHeads.limit, width: 0.5 },
              { head: say.waiverHeads.what, width: 1.5 },
              { head: say.waiverHeads.reason, width: 1.7 },
              { head: say.waiverHeads.who, width: 1 },
              { head: say.waiverHeads.at, width: 1 },
            ],
            rows: revision.waivers.map((one) => [
              one.limitId === null ? '–' : limitTag(document, one.limitId),
              one.what,
              one.reason,
              one.who,
              printInstant(one.at, words),
            ]),
          }),
        ]),
    ...commentSheet(context),
  ]
}

/** Every comment with its answer, in the order of their numbers; left out where the report was made without a review. */
const commentSheet: Section = (context) => {
  const { paper, input, words, width } = context
  const { decisions: say } = words.results
  const { comments } = input.revision
  if (!comments) return []
  const signed = (who: string, at: string): string => `${who}, ${printInstant(at, words)}`
  return [
    subsection(context, 'comments', say.comments),
    ...(comments.length === 0
      ? paragraph(paper, say.noComments, { width })
      : [
          dataTable(paper, {
            width,
            columns: [
              { head: say.commentHeads.number, width: 0.3 },
              { head: say.commentHeads.about, width: 1.1 },
              { head: say.commentHeads.text, width: 1.7 },
              { head: say.commentHeads.answer, width: 1.7 },
              { head: say.commentHeads.state, width: 0.6 },
            ],
            rows: comments.map(({ number, about, kind, text, who, at, thread, state }) => [
              String(number),
              about,
              `${kind}: ${text} (${signed(who, at)})`,
              thread.map((one) => `${one.what}: ${one.text} (${signed(one.who, one.at)})`).join(' ') || '–',
              state,
            ]),
          }),
        ]),
  ]
}
