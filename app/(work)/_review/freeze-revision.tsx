'use client'

import { freeze } from './actions'
import { Decision } from './decision'

/** Freezes records, cases, limits, results and texts as the next revision. */
export function FreezeRevision({ studyId }: { studyId: string }) {
  return (
    <Decision
      verb="Freeze revision"
      title="Freeze a revision?"
      explain="Plant records, cases, limits, results and texts are copied as they stand now. Later changes do not touch the copy."
      text="What this revision is about"
      tone="main"
      decide={(note) => freeze(studyId, note)}
    />
  )
}
