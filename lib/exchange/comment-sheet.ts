import type { CommentClass, CommentState } from '../study/review-words'
import { csvText } from './csv-text'

/** A comment as the sheet lists it. */
export interface SheetComment {
  number: number
  kind: CommentClass
  state: CommentState
  about: string
  valueThen: string | null
  text: string
  author: string
  at: string
  assignee: string | null
  dueOn: string | null
  entries: readonly { kind: string; author: string; at: string; text: string }[]
}

const heads = ['number', 'kind', 'state', 'about', 'value', 'comment', 'by', 'at', 'for', 'wanted by', 'answers']

/** The comment sheet of a revision as comma-separated values, one line a comment, its answers in one cell. */
export const commentSheetCsv = (comments: readonly SheetComment[]): string =>
  csvText(
    {
      name: 'comment-sheet',
      heads,
      rows: comments.map((one) => [
        one.number,
        one.kind,
        one.state,
        one.about,
        one.valueThen,
        one.text,
        one.author,
        one.at,
        one.assignee,
        one.dueOn,
        one.entries.map(({ kind, author, at, text }) => `${author}, ${at}, ${kind}: ${text}`).join('\n') || null,
      ]),
    },
    true,
  )
