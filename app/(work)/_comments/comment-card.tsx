'use client'

import { useState } from 'react'
import { answered, type Outcome } from '@/app/_action/outcome'
import type { CommentLine, CommentsView } from '@/lib/study/review-view'
import { Button } from '@/lib/ui/button'
import { Labelled } from '@/lib/ui/labelled'
import { Moment } from '@/lib/ui/moment'
import { Notice } from '@/lib/ui/notice'
import * as actions from './actions'
import { classWords, entryWords, stateWords } from './comment-words'

interface CommentCardProps {
  revisionId: string
  comment: CommentLine
  may: CommentsView['may']
  /** The page that shows the case which the comment is about, where this one shows another. */
  hrefOf: (anchor: string) => string
  onChanged: () => void
}

const looks = { open: 'text-close', answered: 'text-accent', closed: 'text-meets' } as const

/** One comment: what it is about, what was said, and what the person may do with it. */
export function CommentCard({ revisionId, comment, may, hrefOf, onChanged }: CommentCardProps) {
  const { commentId, number, kind, state, about, valueThen, valueNow, orphaned, carriedFrom } = comment
  const changed = !orphaned && valueThen !== null && valueNow !== valueThen
  return (
    <li id={`comment-${number}`} className="scroll-mt-4 border-b border-hair px-3 py-2 last:border-b-0">
      <article aria-labelledby={`comment-${number}-head`} className="flex flex-col gap-1.5">
        <h3 id={`comment-${number}-head`} className="m-0 flex flex-wrap items-baseline gap-x-2 text-body font-semibold">
          <span>
            {number}. {classWords[kind]}
          </span>
          <span className={looks[state]}>{stateWords[state]}</span>
          <a className="link font-normal" href={hrefOf(comment.anchor)}>
            {about}
          </a>
          {valueThen === null ? null : <span className="font-normal">{valueThen}</span>}
        </h3>
        {orphaned ? (
          <p className="m-0 text-label text-close">
            What it was about is no longer in this revision{valueThen ? `; the value was ${valueThen}` : ''}.
          </p>
        ) : null}
        {changed ? (
          <p className="m-0 text-label text-close">In this revision it reads {valueNow ?? 'nothing'}.</p>
        ) : null}
        <p className="m-0 max-w-4xl whitespace-pre-wrap">{comment.text}</p>
        <p className="m-0 text-label text-soft">
          {comment.author}, <Moment at={comment.at} />
          {carriedFrom === null ? '' : `, on revision ${carriedFrom}`}
          {comment.assignee ? `; for ${comment.assignee}` : ''}
          {comment.dueOn ? `; answer wanted by ${comment.dueOn}` : ''}
        </p>
        {comment.entries.length > 0 ? (
          <ul className="m-0 flex list-none flex-col gap-1 border-l-2 border-hair p-0 pl-3">
            {comment.entries.map((entry) => (
              <li key={entry.id}>
                <span className="font-semibold">
                  {entry.author} {entryWords[entry.kind]}
                </span>
                {entry.text ? <span className="whitespace-pre-wrap">: {entry.text}</span> : null}{' '}
                <span className="text-label text-soft">
                  <Moment at={entry.at} />
                </span>
              </li>
            ))}
          </ul>
        ) : null}
        <Answering {...{ revisionId, commentId, comment, may, onChanged }} />
      </article>
    </li>
  )
}

type Deed = 'reply' | 'accepted' | 'refused' | 'close'

const verbs: Record<Deed, string> = {
  reply: 'Send reply',
  accepted: 'Accept comment',
  refused: 'Refuse comment',
  close: 'Close comment',
}

const deedWords: Record<Deed, string> = {
  reply: 'Reply',
  accepted: 'What was done',
  refused: 'Reason',
  close: 'Reason',
}

function Answering({ revisionId, comment, may, onChanged }: Omit<CommentCardProps, 'hrefOf'>) {
  const [deed, setDeed] = useState<Deed | null>(null)
  const [text, setText] = useState('')
  const [busy, setBusy] = useState(false)
  const [refusal, setRefusal] = useState<string | null>(null)
  const { commentId, number, state } = comment
  const run = async (call: () => Promise<Outcome<unknown>>) => {
    setBusy(true)
    const outcome = await answered(call)
    setBusy(false)
    setRefusal(outcome.ok ? null : (outcome.issues[0]?.message ?? outcome.message))
    if (!outcome.ok) return
    setDeed(null)
    setText('')
    onChanged()
  }
  const send = () => {
    if (deed === null) return
    if (deed === 'reply') return run(() => actions.reply(revisionId, commentId, text))
    if (deed === 'close') return run(() => actions.close(revisionId, commentId, text))
    return run(() => actions.respond(revisionId, commentId, deed, text))
  }
  const offers: Deed[] = [
    ...(may.comment && state !== 'closed' ? (['reply'] as const) : []),
    ...(may.respond && state !== 'closed' ? (['accepted', 'refused'] as const) : []),
    ...(comment.mayClose ? (['close'] as const) : []),
  ]
  return (
    <>
      {deed === null ? (
        <div className="flex flex-wrap gap-1.5">
          {offers.map((one) => (
            <Button key={one} tone="quiet" aria-label={`${verbs[one]} ${number}`} onClick={() => setDeed(one)}>
              {one === 'reply' ? 'Reply' : verbs[one].replace(' comment', '')}
            </Button>
          ))}
          {comment.mayReopen ? (
            <Button tone="quiet" busy={busy} onClick={() => run(() => actions.reopen(revisionId, commentId))}>
              Take up again
            </Button>
          ) : null}
        </div>
      ) : (
        <div className="flex max-w-2xl flex-col gap-2">
          <Labelled
            label={deedWords[deed]}
            aside={deed === 'close' ? 'needed only for somebody else’s comment' : undefined}
          >
            {(control) => (
              <textarea
                {...control}
                className="control"
                rows={2}
                value={text}
                onChange={(event) => setText(event.target.value)}
              />
            )}
          </Labelled>
          <div className="flex gap-2">
            <Button tone="main" busy={busy} onClick={send}>
              {verbs[deed]}
            </Button>
            <Button onClick={() => setDeed(null)}>Go back</Button>
          </div>
        </div>
      )}
      {refusal ? <Notice tone="bad">{refusal}</Notice> : null}
    </>
  )
}
