'use client'

import { useRouter } from 'next/navigation'
import { type FormEvent, useState } from 'react'
import type { Outcome } from '@/app/_action/outcome'
import { Button } from '@/lib/ui/button'
import type { Field } from '@/lib/ui/form/field'
import { FormView } from '@/lib/ui/form/form-view'
import type { SavedRecord } from '../_records/record-row'
import { SheetState } from '../_records/sheet-state'
import { useRecordSheet } from '../_records/use-record-sheet'

interface QuickFormProps {
  /** On the button that opens the form, and on the one that sends it. */
  verb: string
  fields: readonly Field[]
  keptAs: string
  save: (values: Record<string, unknown>) => Promise<Outcome<SavedRecord>>
  /** Where the new one stands, its identity in the place of `:id`. */
  goTo: string
}

/** A short form that opens in its place. */
export function QuickForm(props: QuickFormProps) {
  const [open, setOpen] = useState(false)
  return open ? (
    <OpenForm {...props} onClose={() => setOpen(false)} />
  ) : (
    <Button onClick={() => setOpen(true)}>{props.verb}</Button>
  )
}

function OpenForm({ verb, fields, keptAs, save, goTo, onClose }: QuickFormProps & { onClose: () => void }) {
  const router = useRouter()
  const sheet = useRecordSheet({
    fields,
    style: 'point',
    keptAs,
    id: null,
    version: 0,
    values: undefined,
    save: ({ values }) => save(values),
    onSaved: ({ id }) => router.push(goTo.replace(':id', id)),
  })
  const submit = (event: FormEvent) => {
    event.preventDefault()
    void sheet.save()
  }
  return (
    <form onSubmit={submit} noValidate className="flex max-w-md flex-col gap-3 border border-rule bg-sheet p-3">
      <fieldset disabled={!sheet.ready} className="m-0 min-w-0 border-0 p-0">
        <FormView
          fields={fields}
          draft={sheet.draft}
          style="point"
          options={{}}
          issues={sheet.issues}
          knownSources={[]}
          onChange={sheet.change}
        />
      </fieldset>
      <SheetState refusal={sheet.refusal} restoredFrom={sheet.restoredFrom} onDiscard={sheet.discard} />
      <div className="flex gap-2">
        <Button type="submit" tone="main" busy={sheet.busy} disabled={!sheet.ready}>
          {verb}
        </Button>
        <Button onClick={onClose}>Close form</Button>
      </div>
    </form>
  )
}
