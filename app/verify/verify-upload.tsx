'use client'

import { type DragEvent, useId, useState } from 'react'
import { Notice } from '@/lib/ui/notice'
import { checkFile } from './check-file'
import { VerdictView } from './verdict-view'
import type { VerifyAnswer } from './verify-answer'

type State =
  | { is: 'empty' }
  | { is: 'checking'; name: string }
  | { is: 'refused'; name: string; message: string }
  | { is: 'checked'; name: string; answer: VerifyAnswer }

/** Takes a file, by dropping or choosing, and shows what the check says of it. */
export function VerifyUpload() {
  const [state, setState] = useState<State>({ is: 'empty' })
  const [over, setOver] = useState(false)
  const input = useId()

  const take = async (file: File | undefined) => {
    if (!file) return
    const { name } = file
    setState({ is: 'checking', name })
    const outcome = await checkFile(file)
    setState(
      outcome.ok ? { is: 'checked', name, answer: outcome.answer } : { is: 'refused', name, message: outcome.message },
    )
  }
  const drop = (event: DragEvent) => {
    event.preventDefault()
    setOver(false)
    void take(event.dataTransfer.files[0])
  }

  return (
    <>
      <section
        aria-label="Report to verify"
        onDragOver={(event) => {
          event.preventDefault()
          setOver(true)
        }}
        onDragLeave={() => setOver(false)}
        onDrop={drop}
        className={`grid gap-2 border border-dashed px-4 py-6 ${over ? 'border-accent bg-tint' : 'border-rule bg-sheet'}`}
      >
        <label htmlFor={input} className="text-label font-semibold">
          Drop the PDF here, or choose it
        </label>
        <input
          id={input}
          type="file"
          accept="application/pdf,.pdf"
          className="control max-w-md"
          disabled={state.is === 'checking'}
          onChange={(event) => {
            void take(event.target.files?.[0])
            // The same file can be chosen again.
            event.target.value = ''
          }}
        />
      </section>
      <div aria-live="polite" className="grid gap-4">
        {state.is === 'checking' ? <p className="m-0 text-soft">Checking {state.name}…</p> : null}
        {state.is === 'refused' ? <Notice tone="bad">{state.message}</Notice> : null}
        {state.is === 'checked' ? (
          <VerdictView name={state.name} answer={state.answer} key={state.answer.sha256} />
        ) : null}
      </div>
    </>
  )
}
