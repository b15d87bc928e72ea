'use client'

import { type FormEvent, useCallback, useId, useRef, useState } from 'react'
import { answered, type Refusal } from '@/app/_action/outcome'
import type { Participant } from '@/lib/study/review-view'
import { type CommentClass, commentClasses } from '@/lib/study/review-words'
import { Button } from '@/lib/ui/button'
import { Labelled } from '@/lib/ui/labelled'
import { Notice } from '@/lib/ui/notice'
import { comment } from './actions'
import { classWords } from './comment-words'
import { usePointing } from './use-pointing'

/** Places that are chosen from a list; everything else is pointed at. */
export interface PlaceGroup {
  label: string
  places: readonly { anchor: string; words: string }[]
}

interface CommentFormProps {
  revisionId: string
  people: readonly Participant[]
  groups: readonly PlaceGroup[]
  onMade: () => void
}

const classHints: Record<CommentClass, string> = {
  error: 'holds up the closing of the review until you close it',
  request: 'asks for something to be done or added',
  question: 'wants an answer',
  editorial: 'wording, layout, spelling',
}

const isCurve = (anchor: string): boolean => anchor.startsWith('series/')

/** Writes a comment on a value, a row, a check, a point of a curve or a section. */
export function CommentForm({ revisionId, people, groups, onMade }: CommentFormProps) {
  const [anchor, setAnchor] = useState('revision')
  const [pointed, setPointed] = useState<{ anchor: string; words: string } | null>(null)
  const [pointing, setPointing] = useState(false)
  const [instant, setInstant] = useState('')
  const [kind, setKind] = useState<CommentClass>('question')
  const [text, setText] = useState('')
  const [assigneeId, setAssigneeId] = useState('')
  const [dueOn, setDueOn] = useState('')
  const [busy, setBusy] = useState(false)
  const [refusal, setRefusal] = useState<Refusal | null>(null)
  const hint = useId()
  const written = useRef<HTMLTextAreaElement>(null)
  const choose = useCallback((chosen: string, words: string) => {
    setPointed({ anchor: chosen, words })
    setAnchor(chosen)
    setPointing(false)
    written.current?.focus()
  }, [])
  const giveUp = useCallback(() => setPointing(false), [])
  usePointing(pointing, choose, giveUp)

  const problem = (name: string): string | undefined => refusal?.issues.find(({ path }) => path[0] === name)?.message
  const send = async (event: FormEvent) => {
    event.preventDefault()
    setBusy(true)
    const on = isCurve(anchor) ? `${anchor}@${instant.trim().replace(',', '.')}` : anchor
    const wanted = { revisionId, anchor: on, kind, text, assigneeId: assigneeId || null, dueOn: dueOn || null }
    const outcome = await answered(() => comment(wanted))
    setBusy(false)
    setRefusal(outcome.ok ? null : outcome)
    if (!outcome.ok) return
    setText('')
    setPointed(null)
    setAnchor('revision')
    setKind('question')
    setDueOn('')
    setAssigneeId('')
    onMade()
  }

  return (
    <form
      method="post"
      onSubmit={send}
      noValidate
      aria-label="New comment"
      className="flex max-w-3xl flex-col gap-3 border border-hair bg-sheet p-3"
    >
      <div className="flex flex-wrap items-end gap-3">
        <div className="min-w-64 flex-1">
          <Labelled label="About" error={problem('anchor')}>
            {(control) => (
              <select
                {...control}
                className="control"
                value={anchor}
                onChange={(event) => setAnchor(event.target.value)}
              >
                {pointed ? <option value={pointed.anchor}>Pointed at: {pointed.words}</option> : null}
                {groups.map(({ label, places }) => (
                  <optgroup key={label} label={label}>
                    {places.map((place) => (
                      <option key={place.anchor} value={place.anchor}>
                        {place.words}
                      </option>
                    ))}
                  </optgroup>
                ))}
              </select>
            )}
          </Labelled>
        </div>
        <Button aria-pressed={pointing} aria-describedby={hint} onClick={() => setPointing(!pointing)}>
          {pointing ? 'Stop pointing' : 'Point at it'}
        </Button>
        {isCurve(anchor) ? (
          <div className="w-32">
            <Labelled label="Instant, s">
              {(control) => (
                <input
                  {...control}
                  className="control"
                  inputMode="decimal"
                  value={instant}
                  onChange={(event) => setInstant(event.target.value)}
                />
              )}
            </Labelled>
          </div>
        ) : null}
      </div>
      <p id={hint} role="status" className="m-0 text-label text-soft">
        {pointing
          ? 'Choose a value, a row or a plot on this page with a click, or with Tab and Enter. Escape stops.'
          : 'Values, rows and plots on this page are chosen by pointing at them.'}
      </p>
      <fieldset className="m-0 border-0 p-0">
        <legend className="mb-0.5 p-0 text-label font-semibold">It is</legend>
        <div className="flex flex-wrap gap-x-4 gap-y-1">
          {commentClasses.map((one) => (
            <label key={one} className="flex items-baseline gap-1.5">
              <input type="radio" name="kind" checked={kind === one} onChange={() => setKind(one)} />
              <span>
                <span className="font-semibold">{classWords[one]}</span>{' '}
                <span className="text-label text-soft">{classHints[one]}</span>
              </span>
            </label>
          ))}
        </div>
      </fieldset>
      <Labelled
        label="Comment"
        error={problem('text')}
        hint={
          people.length > 0
            ? `An @ and a name puts it into that person’s inbox, for example @${people[0]!.name}.`
            : undefined
        }
      >
        {(control) => (
          <textarea
            {...control}
            ref={written}
            className="control"
            rows={3}
            value={text}
            onChange={(event) => setText(event.target.value)}
          />
        )}
      </Labelled>
      <div className="flex flex-wrap gap-3">
        <div className="w-56">
          <Labelled label="For" aside="may stay empty">
            {(control) => (
              <select
                {...control}
                className="control"
                value={assigneeId}
                onChange={(event) => setAssigneeId(event.target.value)}
              >
                <option value="">nobody in particular</option>
                {people.map(({ userId, name }) => (
                  <option key={userId} value={userId}>
                    {name}
                  </option>
                ))}
              </select>
            )}
          </Labelled>
        </div>
        <div className="w-44">
          <Labelled label="Answer wanted by" aside="may stay empty" error={problem('dueOn')}>
            {(control) => (
              <input
                {...control}
                className="control"
                type="date"
                value={dueOn}
                onChange={(event) => setDueOn(event.target.value)}
              />
            )}
          </Labelled>
        </div>
      </div>
      {refusal && refusal.issues.length === 0 ? <Notice tone="bad">{refusal.message}</Notice> : null}
      <div>
        <Button type="submit" tone="main" busy={busy}>
          Make comment
        </Button>
      </div>
    </form>
  )
}
