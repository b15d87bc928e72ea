import { describeKind } from '@/app/(work)/_records/describe-kind'
import type { Moved } from '@/lib/server/revisions/view'
import type { RecordKind } from '@/lib/study/document/record-kinds'
import { recordSchemas } from '@/lib/study/document/record-kinds'
import { DataTable } from '@/lib/ui/data-table'
import { Moment } from '@/lib/ui/moment'

const isKind = (kind: string): kind is RecordKind => Object.hasOwn(recordSchemas, kind)

const noun = (kind: string): string => (isKind(kind) ? describeKind(kind).one : kind)

/** Live records that are no longer as they were frozen. */
export function MovedSince({ moved }: { moved: readonly Moved[] }) {
  if (moved.length === 0) return null
  return (
    <section aria-labelledby="moved">
      <h2 id="moved" className="m-0 mb-1 text-title font-semibold">
        Changed since the freeze
      </h2>
      <DataTable
        caption="Live records that are not as they were frozen"
        rows={moved}
        rowId={({ kind, id }) => `${kind} ${id}`}
        columns={[
          { id: 'tag', label: 'Record', cell: ({ kind, tag }) => `${noun(kind)} ${tag}` },
          { id: 'change', label: 'Change', cell: ({ change }) => change },
          { id: 'by', label: 'By', cell: ({ by }) => by ?? '–' },
          { id: 'at', label: 'At', cell: ({ at }) => (at ? <Moment at={at} /> : '–') },
        ]}
      />
    </section>
  )
}
