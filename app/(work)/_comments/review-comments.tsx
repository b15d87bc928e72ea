'use client'

import { useRouter } from 'next/navigation'
import { useEffect, useMemo, useState } from 'react'
import type { CommentsView } from '@/lib/study/review-view'
import { type CommentClass, type CommentState, commentClasses, commentStates } from '@/lib/study/review-words'
import { EmptyState } from '@/lib/ui/empty-state'
import { markRead } from './actions'
import { CommentCard } from './comment-card'
import { CommentForm, type PlaceGroup } from './comment-form'
import { classWords, stateWords } from './comment-words'
import { HoldUps } from './hold-ups'
import { useComments } from './use-comments'
import { useMarks } from './use-pointing'

interface ReviewCommentsProps {
  given: CommentsView
  /** Where the comments are asked for anew. */
  href: string
  /** Address of the revision's page. */
  page: string
  groups: readonly PlaceGroup[]
}

const caseOf = (anchor: string): string | null =>
  /^(?:case|series)\/([^/]+)/.exec(anchor)?.[1] ?? /^limit\/[^/]+\/case\/(.+)$/.exec(anchor)?.[1] ?? null

/** Address at which what an anchor names is on the page. */
const addressOf = (page: string, anchor: string): string => {
  const caseId = anchor.startsWith('limit/') ? null : caseOf(anchor)
  return `${page}?${caseId ? `case=${encodeURIComponent(caseId)}&` : ''}at=${encodeURIComponent(anchor)}`
}

/** The review of a revision: what holds up its closing, the comments, a form for another one; all of it follows what others do. */
export function ReviewComments({ given, href, page, groups }: ReviewCommentsProps) {
  const router = useRouter()
  const { view, look } = useComments(given, href)
  const [state, setState] = useState<CommentState | 'all'>('all')
  const [kind, setKind] = useState<CommentClass | 'all'>('all')
  const { revisionId, comments, holdUps, people, may } = view
  const numbers = useMemo(() => {
    const of = new Map<string, string>()
    for (const { anchor, number } of comments) {
      const place = anchor.startsWith('series/') ? (anchor.split('@')[0] ?? anchor) : anchor
      of.set(place, of.has(place) ? `${of.get(place)}, ${number}` : String(number))
    }
    return of
  }, [comments])
  useMarks(numbers)
  useEffect(() => {
    void markRead(revisionId).catch(() => {})
  }, [revisionId])
  const changed = () => {
    void look()
    router.refresh()
  }
  const shown = comments.filter(
    (one) => (state === 'all' || one.state === state) && (kind === 'all' || one.kind === kind),
  )
  return (
    <>
      <HoldUps revisionId={revisionId} holdUps={holdUps} mayWaive={may.waive} onChanged={changed} />
      <section id="comments" aria-labelledby="comments-head" className="flex scroll-mt-4 flex-col gap-2">
        <div className="flex flex-wrap items-end justify-between gap-2">
          <h2 id="comments-head" className="m-0 text-title font-semibold">
            Comments{comments.length > 0 ? ` (${comments.length})` : ''}
          </h2>
          {comments.length > 0 ? (
            <div className="flex flex-wrap items-end gap-2">
              <Filter
                label="State"
                value={state}
                words={commentStates.map((one) => [one, stateWords[one]])}
                onChange={setState}
              />
              <Filter
                label="Kind"
                value={kind}
                words={commentClasses.map((one) => [one, classWords[one]])}
                onChange={setKind}
              />
              <a className="link" href={`${href}/sheet`}>
                Comment sheet as CSV
              </a>
            </div>
          ) : null}
        </div>
        <p role="status" aria-live="polite" className="sr-only">
          {comments.length} comments, {comments.filter((one) => one.state === 'open').length} without an answer
        </p>
        {comments.length === 0 ? (
          <EmptyState title="No comment on this revision.">
            {may.comment
              ? 'Point at a value, or choose what you comment on in the form below.'
              : 'Comments are made while a revision is in check or in review.'}
          </EmptyState>
        ) : shown.length === 0 ? (
          <p className="m-0 text-soft">No comment of this kind and state.</p>
        ) : (
          <ol className="m-0 list-none border border-hair bg-sheet p-0">
            {shown.map((comment) => (
              <CommentCard
                key={comment.commentId}
                revisionId={revisionId}
                comment={comment}
                may={may}
                hrefOf={(anchor) => addressOf(page, anchor)}
                onChanged={changed}
              />
            ))}
          </ol>
        )}
        {may.comment ? <CommentForm revisionId={revisionId} people={people} groups={groups} onMade={changed} /> : null}
      </section>
    </>
  )
}

interface FilterProps<Word extends string> {
  label: string
  value: Word | 'all'
  words: readonly (readonly [Word, string])[]
  onChange: (value: Word | 'all') => void
}

function Filter<Word extends string>({ label, value, words, onChange }: FilterProps<Word>) {
  return (
    <label className="flex items-center gap-1.5 text-label">
      {label}
      <select
        className="control"
        value={value}
        onChange={(event) => onChange(words.find(([word]) => word === event.target.value)?.[0] ?? 'all')}
      >
        <option value="all">all</option>
        {words.map(([word, text]) => (
          <option key={word} value={word}>
            {text}
          </option>
        ))}
      </select>
    </label>
  )
}
