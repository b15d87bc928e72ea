'use client'

import { useRouter } from 'next/navigation'
import { type FormEvent, useId } from 'react'
import { answered } from '@/app/_action/outcome'
import type { NumberStyle } from '@/lib/quantity/quantity-name'
import { Button } from '@/lib/ui/button'
import { Confirm } from '@/lib/ui/confirm'
import type { Options } from '@/lib/ui/form/field'
import { FormView } from '@/lib/ui/form/form-view'
import { Moment } from '@/lib/ui/moment'
import { ScrollRegion } from '@/lib/ui/scroll-region'
import { compareDrafts } from './compare-drafts'
import { ConflictPanel } from './conflict-panel'
import type { KindDescription } from './kind-description'
import type { RecordActions, RecordRow, SavedRecord } from './record-row'
import { SheetState } from './sheet-state'
import { SourceForAll } from './source-for-all'
import { useRecordSheet } from './use-record-sheet'

interface RecordSheetProps {
  description: KindDescription
  /** Null for a new record. */
  row: RecordRow | null
  /** What a new record starts with. */
  template?: Readonly<Record<string, unknown>> | undefined
  options: Options
  tags: Options
  style: NumberStyle
  knownSources: readonly string[]
  keptAs: string
  editable: boolean
  actions: RecordActions
  onClose: () => void
  onCopy: (() => void) | null
  onSaved: (record: SavedRecord) => void
}

/** One record in full, beside the table. */
export function RecordSheet(props: RecordSheetProps) {
  const { description, row, template, options, tags, style, knownSources, keptAs, editable, actions, onSaved } = props
  const { fields, one } = description
  const heading = useId()
  const router = useRouter()
  const sheet = useRecordSheet({
    fields,
    style,
    keptAs,
    id: row?.id ?? null,
    version: row?.version ?? 0,
    values: row?.values ?? template,
    save: actions.save,
    onSaved,
  })
  const { base, merged, theirs } = sheet
  const differences = merged && theirs ? compareDrafts(fields, merged, theirs, tags) : []
  const takenOver =
    merged && theirs
      ? compareDrafts(fields, base, merged, tags).filter(({ name }) => !differences.some((one) => one.name === name))
      : []
  const submit = (event: FormEvent) => {
    event.preventDefault()
    void sheet.save()
  }
  const remove = async () => {
    if (!row) return null
    const outcome = await answered(() => actions.remove({ id: row.id, version: row.version }))
    if (!outcome.ok) return outcome.message
    sheet.discard()
    props.onClose()
    router.refresh()
    return null
  }
  const tag = typeof row?.values.tag === 'string' ? row.values.tag : null

  return (
    <section
      aria-labelledby={heading}
      className="flex flex-col border border-rule bg-sheet xl:sticky xl:top-3 xl:max-h-[calc(100dvh-12rem)]"
    >
      <header className="flex items-baseline justify-between gap-2 border-b border-hair px-3 py-1.5">
        <h2 id={heading} className="m-0 text-body font-semibold">
          {tag ? `${one[0]?.toUpperCase()}${one.slice(1)} ${tag}` : `New ${one}`}
        </h2>
        <Button tone="quiet" className="text-dense" onClick={props.onClose}>
          Close sheet
        </Button>
      </header>
      <form onSubmit={submit} noValidate className="flex min-h-0 flex-col">
        <ScrollRegion label={`Fields of the ${one}`} className="min-h-0 p-3 xl:overflow-y-auto">
          <fieldset disabled={!sheet.ready || !editable} className="m-0 min-w-0 border-0 p-0">
            <FormView
              fields={fields}
              draft={sheet.draft}
              style={style}
              options={options}
              issues={sheet.issues}
              knownSources={knownSources}
              onChange={sheet.change}
            >
              {editable ? (
                <SourceForAll draft={sheet.draft} onChange={(draft) => sheet.change(draft, sheet.issues)} />
              ) : null}
            </FormView>
          </fieldset>
        </ScrollRegion>
        <div className="flex shrink-0 flex-col gap-2 border-t border-hair p-3 xl:max-h-[45dvh] xl:overflow-y-auto">
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
            <div className="flex flex-wrap items-center gap-2">
              <Button type="submit" tone="main" busy={sheet.busy} disabled={!sheet.ready}>
                {row ? `Save ${one}` : `Add ${one}`}
              </Button>
              {sheet.unsaved && row ? <Button onClick={sheet.discard}>Discard changes</Button> : null}
              {row && props.onCopy ? <Button onClick={props.onCopy}>Copy {one}</Button> : null}
              {row ? (
                <Confirm
                  trigger={`Remove ${one}`}
                  tone="danger"
                  title={`Remove ${tag ?? one}?`}
                  confirm={`Remove ${one}`}
                  onConfirm={remove}
                >
                  The record leaves the live plant. Frozen revisions keep their copy of it.
                </Confirm>
              ) : null}
            </div>
          ) : (
            <p className="m-0 text-soft">Your part in this project lets you read records, not change them.</p>
          )}
          {row ? (
            <p className="m-0 text-label text-soft">
              Last saved by {row.changedBy}, <Moment at={row.changedAt} />
              {sheet.unsaved ? '; text above is not saved yet' : ''}
            </p>
          ) : null}
        </div>
      </form>
    </section>
  )
}
