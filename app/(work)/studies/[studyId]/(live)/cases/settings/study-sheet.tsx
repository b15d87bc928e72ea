'use client'

import type { FormEvent } from 'react'
import { compareDrafts } from '@/app/(work)/_records/compare-drafts'
import { ConflictPanel } from '@/app/(work)/_records/conflict-panel'
import { SheetState } from '@/app/(work)/_records/sheet-state'
import { useRecordSheet } from '@/app/(work)/_records/use-record-sheet'
import type { NumberStyle } from '@/lib/quantity/quantity-name'
import { Button } from '@/lib/ui/button'
import { FormView } from '@/lib/ui/form/form-view'
import { saveStudy } from './actions'
import { studyFields } from './study-fields'

interface StudySheetProps {
  studyId: string
  version: number
  values: Readonly<Record<string, unknown>>
  style: NumberStyle
  editable: boolean
  keptAs: string
}

/** Title block, settings and texts of a study. */
export function StudySheet({ studyId, version, values, style, editable, keptAs }: StudySheetProps) {
  const sheet = useRecordSheet({
    fields: studyFields,
    style,
    keptAs,
    id: studyId,
    version,
    values,
    save: (change) => saveStudy(studyId, change.version, change.values),
    onSaved: () => undefined,
  })
  const { base, merged, theirs } = sheet
  const differences = merged && theirs ? compareDrafts(studyFields, merged, theirs, {}) : []
  const takenOver =
    merged && theirs
      ? compareDrafts(studyFields, base, merged, {}).filter(({ name }) => !differences.some((one) => one.name === name))
      : []
  const submit = (event: FormEvent) => {
    event.preventDefault()
    void sheet.save()
  }
  return (
    <form onSubmit={submit} noValidate className="flex max-w-3xl flex-col gap-3 border border-hair bg-sheet p-4">
      <h1 className="m-0 text-title font-semibold">Settings and texts</h1>
      <fieldset disabled={!sheet.ready || !editable} className="m-0 min-w-0 border-0 p-0">
        <FormView
          fields={studyFields}
          draft={sheet.draft}
          style={style}
          options={{}}
          issues={sheet.issues}
          knownSources={[]}
          onChange={sheet.change}
        />
      </fieldset>
      {sheet.conflict ? (
        <ConflictPanel
          by={sheet.conflict.by}
          at={sheet.conflict.at}
          differences={differences}
          takenOver={takenOver.map(({ label }) => label)}
          busy={sheet.busy}
          onKeepMine={() => void sheet.keepMine()}
          onTakeTheirs={sheet.takeTheirs}
        />
      ) : (
        <SheetState refusal={sheet.refusal} restoredFrom={sheet.restoredFrom} onDiscard={sheet.discard} />
      )}
      {editable ? (
        <div className="flex flex-wrap gap-2">
          <Button type="submit" tone="main" busy={sheet.busy} disabled={!sheet.ready}>
            Save settings and texts
          </Button>
          {sheet.unsaved ? <Button onClick={sheet.discard}>Discard changes</Button> : null}
        </div>
      ) : (
        <p className="m-0 text-soft">Your part in this project lets you read the study, not change it.</p>
      )}
    </form>
  )
}
