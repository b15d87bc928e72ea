'use client'

import { Button } from '../button'
import type { DraftPath, ListDraft } from './draft'
import type { Field, ListField } from './field'
import { useForm, useIssue } from './form-context'
import { newIdentity } from './new-identity'
import { rowDraft, rowKey } from './to-draft'

/** Rows of one or two values, or of nothing that has a source, stand side by side. */
const isFlat = (fields: readonly Field[]): boolean => {
  const nested = fields.some(({ kind }) => kind === 'group' || kind === 'variants' || kind === 'list')
  const sourced = fields.some(({ kind }) => kind === 'quantity')
  return !nested && fields.length <= (sourced ? 2 : 4)
}

/** Rows of the same parts; short ones stand side by side. */
export function ListInput({ field, draft, path }: { field: ListField; draft: ListDraft; path: DraftPath }) {
  const { set, style, Fields } = useForm()
  const error = useIssue(path)
  const flat = isFlat(field.fields)
  const add = () => {
    const key = field.identified ? newIdentity() : rowKey()
    set(path, { ...draft, rows: [...draft.rows, { key, group: rowDraft(field.fields, undefined, style) }] })
  }
  const remove = (key: string) => set(path, { ...draft, rows: draft.rows.filter((row) => row.key !== key) })

  return (
    <fieldset className="m-0 min-w-0 border-0 p-0">
      <legend className="mb-0.5 p-0 text-label font-semibold">{field.label}</legend>
      {field.hint ? <p className="m-0 mb-1 text-label text-soft">{field.hint}</p> : null}
      {draft.rows.length === 0 ? <p className="m-0 mb-1 text-soft">none</p> : null}
      <ol className="m-0 flex list-none flex-col gap-2 p-0">
        {draft.rows.map((row, index) => (
          <li key={row.key} className="border-l-2 border-hair pl-3">
            <div className={flat ? 'grid grid-cols-1 gap-2 @sm:grid-cols-2' : 'flex flex-col gap-2'}>
              <Fields fields={field.fields} draft={row.group} path={[...path, index]} compact={flat} />
            </div>
            <Button
              tone="quiet"
              className="mt-1 px-1 text-dense"
              aria-label={`Remove ${field.item} ${index + 1}`}
              onClick={() => remove(row.key)}
            >
              Remove {field.item}
            </Button>
          </li>
        ))}
      </ol>
      <Button className="mt-1 text-dense" onClick={add}>
        Add {field.item}
      </Button>
      {error ? <p className="m-0 mt-0.5 text-label text-fails">{error}</p> : null}
    </fieldset>
  )
}
