'use client'

import { useSearchParams } from 'next/navigation'
import { useMemo, useState } from 'react'
import type { NumberStyle } from '@/lib/quantity/quantity-name'
import type { RecordKind } from '@/lib/study/document/record-kinds'
import { Button } from '@/lib/ui/button'
import { EmptyState } from '@/lib/ui/empty-state'
import type { Options } from '@/lib/ui/form/field'
import { namedSources } from '@/lib/ui/form/sources'
import { recordDraft } from '@/lib/ui/form/to-draft'
import { Notice } from '@/lib/ui/notice'
import { ProvenanceLegend } from '@/lib/ui/provenance-mark'
import { describeKind } from './describe-kind'
import type { RecordActions, RecordRow } from './record-row'
import { RecordSheet } from './record-sheet'
import { RecordTable } from './record-table'
import { useRowSave } from './use-row-save'

interface RecordWorkspaceProps {
  kind: RecordKind
  rows: readonly RecordRow[]
  options: Options
  tags: Options
  style: NumberStyle
  editable: boolean
  /** Keeps the unsaved text of different people and plants apart. */
  scope: string
  /** A sentence for each record, by identity. */
  inWords?: Readonly<Record<string, string>> | undefined
  actions: RecordActions
}

const without = (values: RecordRow['values']): Record<string, unknown> => {
  const { id: _, tag, ...rest } = values
  return { ...rest, tag: typeof tag === 'string' ? `${tag} copy` : '' }
}

/** The table of one kind of record, and beside it the sheet of the record that is open. */
export function RecordWorkspace(props: RecordWorkspaceProps) {
  const { kind, rows, options, tags, style, editable, scope, actions } = props
  const description = describeKind(kind)
  const { fields, one, many } = description
  const query = useSearchParams()
  const open = query.get('record') ?? undefined
  const copied = rows.find((record) => record.id === query.get('copy')) ?? null
  // Rises when the sheet must look for its text again: another record was added, or a cell was refused.
  const [round, setRound] = useState(0)
  // Just added: its row is on the way.
  const [added, setAdded] = useState<string | null>(null)
  const show = (id: string | null, copyOf: string | null = null) => {
    const next = new URLSearchParams(query)
    next.delete('record')
    next.delete('copy')
    if (id !== null) next.set('record', id)
    if (copyOf !== null) next.set('copy', copyOf)
    window.history.replaceState(null, '', `?${next}`)
  }
  const knownSources = useMemo(
    () => [...new Set(rows.flatMap((row) => namedSources(recordDraft(fields, row.values, style))))],
    [rows, fields, style],
  )
  const keptAs = (id: string) => `${scope}/${kind}/${id}`
  const row = rows.find((record) => record.id === open) ?? null
  const onCell = useRowSave({
    fields,
    style,
    actions,
    keptAs,
    onRefused: (id) => {
      setRound((count) => count + 1)
      show(id)
    },
  })
  const adding = open === 'new' && editable

  return (
    <div className="flex flex-col gap-3">
      <div className="flex flex-wrap items-center justify-between gap-2">
        <h1 className="m-0 text-title font-semibold">{many}</h1>
        {editable ? (
          <Button tone={rows.length === 0 ? 'main' : 'plain'} onClick={() => show('new')}>
            Add {one}
          </Button>
        ) : null}
      </div>
      {open !== undefined && !row && !adding && open !== added ? (
        <Notice tone="caution">The record that was open is no longer there: somebody removed it.</Notice>
      ) : null}
      <div className="flex flex-col-reverse gap-4 xl:flex-row xl:items-start">
        <div className="flex min-w-0 flex-1 flex-col gap-2">
          {rows.length === 0 ? (
            <EmptyState title={`No ${many.toLowerCase()} yet.`}>{description.empty}</EmptyState>
          ) : (
            <RecordTable
              description={description}
              rows={rows}
              tags={tags}
              style={style}
              editable={editable}
              chosen={row?.id}
              onOpen={(id) => show(id === open ? null : id)}
              onCell={onCell}
              inWords={props.inWords}
            />
          )}
          {description.sourced && rows.length > 0 ? <ProvenanceLegend /> : null}
        </div>
        {row || adding ? (
          <div className="w-full shrink-0 xl:w-120">
            <RecordSheet
              key={`${row ? row.id : `copy-${copied?.id}`}-${round}`}
              description={description}
              row={row}
              template={copied && !row ? without(copied.values) : undefined}
              options={options}
              tags={tags}
              style={style}
              knownSources={knownSources}
              keptAs={keptAs(row ? row.id : copied ? `copy-of-${copied.id}` : 'new')}
              editable={editable}
              actions={actions}
              onClose={() => show(null)}
              onCopy={row ? () => show('new', row.id) : null}
              onSaved={(saved) => {
                if (row) return
                setAdded(saved.id)
                setRound((count) => count + 1)
                show(saved.id)
              }}
            />
          </div>
        ) : null}
      </div>
    </div>
  )
}
