import { stateWords } from '@/app/_words/state-words'
import type { StudyView } from '@/lib/server/studies/view'
import { Moment } from '@/lib/ui/moment'
import type { TitleCell } from './title-block'

/** The block of a study in work: the newest revision, and how fresh the results are. */
export const studyTitleCells = ({ head, revisions, run }: StudyView): readonly TitleCell[] => {
  const newest = revisions[0]
  const computed = run.result && run.finishedAt ? <Moment at={run.finishedAt} /> : 'not yet'
  return [
    { label: 'Document', value: head.documentNumber },
    { label: 'Title', value: head.title, wide: true },
    { label: 'Revision', value: newest ? newest.number : 'none yet' },
    { label: 'State', value: newest ? stateWords[newest.state] : 'in work' },
    { label: 'Purpose', value: newest?.purpose ?? 'not set' },
    { label: 'Last computed', value: run.stale ? <>{computed}, records changed since</> : computed },
  ]
}
