import 'server-only'
import type { ReportComment } from '@/lib/report/report-input'
import type { Tx } from '../db'
import { commentsIn } from './visible'

const entryWords: Record<string, string> = {
  reply: 'Reply',
  accepted: 'Accepted',
  refused: 'Refused',
  closed: 'Closed',
  reopened: 'Taken up again',
}

/** The comments that stand in a revision as its report prints them. */
export async function commentSheetOf(tx: Tx, revisionId: string): Promise<ReportComment[]> {
  const rows = await tx.comment.findMany({
    where: await commentsIn(tx, revisionId),
    orderBy: { number: 'asc' },
    include: { entries: { orderBy: { position: 'asc' } } },
  })
  return rows.map((row) => ({
    number: row.number,
    about: row.anchorValue === null ? row.anchorLabel : `${row.anchorLabel}: ${row.anchorValue}`,
    kind: row.kind,
    text: row.text,
    who: row.authorName,
    at: row.at.toISOString(),
    thread: row.entries.flatMap(({ kind, text, authorName, at }) => {
      const what = entryWords[kind]
      return what ? [{ what, who: authorName, at: at.toISOString(), text }] : []
    }),
    state: row.state,
  }))
}
