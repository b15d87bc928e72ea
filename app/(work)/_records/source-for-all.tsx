'use client'

import { useState } from 'react'
import { Button } from '@/lib/ui/button'
import type { GroupDraft, SourceDraft } from '@/lib/ui/form/draft'
import { SourceInput } from '@/lib/ui/form/source-input'
import { fillSources, withoutSource } from '@/lib/ui/form/sources'

const none: SourceDraft = { is: 'source', kind: '', source: '' }

/** One source for every value of the record that has none, because a data sheet usually gives them all. */
export function SourceForAll({ draft, onChange }: { draft: GroupDraft; onChange: (draft: GroupDraft) => void }) {
  const [source, setSource] = useState(none)
  const count = withoutSource(draft)
  if (count === 0) return null
  const { kind } = source
  return (
    <div className="border-t border-hair pt-2">
      <p className="m-0 mb-0.5 text-label font-semibold">
        {count === 1 ? 'One value has no source' : `${count} values have no source`}
      </p>
      <SourceInput of="all values without one" draft={source} onChange={setSource} />
      <Button
        className="mt-1 text-dense"
        disabled={kind === ''}
        onClick={() => {
          if (kind === '') return
          onChange(fillSources(draft, kind, source.source))
          setSource(none)
        }}
      >
        Give this source to {count === 1 ? 'it' : `these ${count}`}
      </Button>
    </div>
  )
}
