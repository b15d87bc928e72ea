import { describe, expect, it } from 'vitest'
import { describeKind } from '@/app/(work)/_records/describe-kind'
import velmoor from '@/lib/cli/examples/velmoor.json'
import { plantCollections, type RecordKind, recordSchemas } from '@/lib/study/document/record-kinds'
import { studyDocument } from '@/lib/study/document/study-document'
import { readDraft } from '@/lib/ui/form/read-draft'
import { fieldAt } from '@/lib/ui/form/show-draft'
import { recordDraft } from '@/lib/ui/form/to-draft'

const document = studyDocument.parse(velmoor)

const recordsOf = (kind: RecordKind): readonly { id: string }[] => {
  if (kind === 'schedule') return document.schedules
  if (kind === 'case') return document.cases
  return kind === 'limit' ? document.limits : document.plant[plantCollections[kind]]
}

const kinds = Object.keys(recordSchemas).filter((kind): kind is RecordKind => Object.hasOwn(recordSchemas, kind))

describe('the forms of records', () => {
  it.each(kinds)('give every record of the example back as it was: %s', (kind) => {
    const { fields } = describeKind(kind)
    const records = recordsOf(kind)
    expect(records.length).toBeGreaterThan(0)
    for (const record of records) {
      const { values, issues } = readDraft(fields, recordDraft(fields, record, 'point'), 'point')
      expect(issues).toEqual([])
      expect({ id: record.id, ...values }).toEqual(record)
    }
  })

  it.each(kinds)('ask for every field that the schema has: %s', (kind) => {
    const { fields } = describeKind(kind)
    const schema = recordSchemas[kind]
    const shapes = 'options' in schema ? schema.options.map(({ shape }) => shape) : [schema.shape]
    const asked = fields.flatMap((field) =>
      field.name !== '' || field.kind !== 'variants'
        ? [field.name]
        : [field.tag, ...field.options.flatMap((option) => option.fields.map(({ name }) => name))],
    )
    for (const shape of shapes)
      expect(asked).toEqual(expect.arrayContaining(Object.keys(shape).filter((name) => name !== 'id')))
  })

  it.each(kinds)('have a value under every column of their table, in some record: %s', (kind) => {
    const { fields, columns } = describeKind(kind)
    const drafts = recordsOf(kind).map((record) => recordDraft(fields, record, 'point'))
    for (const { path, label } of columns)
      expect(
        drafts.some((draft) => fieldAt(fields, draft, path) !== null),
        label,
      ).toBe(true)
  })

  it.each(kinds)('say what is missing when they are sent empty, each at its own field: %s', (kind) => {
    const { fields } = describeKind(kind)
    const { issues } = readDraft(fields, recordDraft(fields, undefined, 'point'), 'point')
    expect(issues.map(({ path }) => path[0])).toContain('tag')
    expect(new Set(issues.map(({ path }) => path.join('.'))).size).toBe(issues.length)
    for (const { message } of issues) expect(message).toMatch(/^[A-Z“].*\.$/)
  })
})
