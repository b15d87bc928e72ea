'use client'

import { provenanceKinds, provenanceMark } from '@/lib/quantity/provenance'
import { ProvenanceMark } from '../provenance-mark'
import type { SourceDraft } from './draft'
import { useForm } from './form-context'

const asSourceKind = (text: string) => provenanceKinds.find((kind) => kind === text) ?? ''

interface SourceInputProps {
  /** Names the value that the source belongs to, for a reader who does not see the layout. */
  of: string
  draft: SourceDraft
  onChange: (draft: SourceDraft) => void
}

/** Kind of source with its mark, and the document, formula or reason. */
export function SourceInput({ of, draft, onChange }: SourceInputProps) {
  const { sources } = useForm()
  const kind = draft.kind === '' ? null : draft.kind
  return (
    <div className="flex min-w-0 gap-1">
      <span className="flex w-4 shrink-0 items-center justify-center">
        <ProvenanceMark kind={kind} source={draft.source} />
      </span>
      <select
        aria-label={`Kind of source, ${of}`}
        className="control w-24 shrink-0 px-1 text-dense"
        value={draft.kind}
        onChange={(event) => onChange({ ...draft, kind: asSourceKind(event.target.value) })}
      >
        <option value="">no source</option>
        {provenanceKinds.map((one) => (
          <option key={one} value={one}>
            {provenanceMark[one].word}
          </option>
        ))}
      </select>
      <input
        aria-label={`Document or reason, ${of}`}
        title={draft.source || undefined}
        className="control min-w-0 text-dense"
        list={sources}
        autoComplete="off"
        placeholder={kind ? provenanceMark[kind].asks : 'Document or reason'}
        value={draft.source}
        onChange={(event) => onChange({ ...draft, source: event.target.value })}
      />
    </div>
  )
}
