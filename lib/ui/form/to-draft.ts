import { provenanceKinds } from '@/lib/quantity/provenance'
import type { NumberStyle } from '@/lib/quantity/quantity-name'
import type { Draft, GroupDraft, SourceDraft } from './draft'
import type { Field } from './field'

type Values = Readonly<Record<string, unknown>>

const isValues = (value: unknown): value is Values =>
  typeof value === 'object' && value !== null && !Array.isArray(value)

const asText = (value: unknown): string =>
  typeof value === 'string' ? value : typeof value === 'number' ? String(value) : ''

/** A number without a unit in the writer's own style. */
const asDecimal = (value: unknown, style: NumberStyle): string => {
  const text = asText(value)
  return style === 'comma' ? text.replace('.', ',') : text
}

const toSource = (value: unknown): SourceDraft => {
  const given = isValues(value) ? value : {}
  return { is: 'source', kind: provenanceKinds.find((kind) => kind === given.kind) ?? '', source: asText(given.source) }
}

const initialOf = (field: Field): string =>
  'initial' in field && typeof field.initial === 'string' ? field.initial : ''

/** Every part of every shape, so that changing one's mind about the shape loses no text. */
const toParts = (fields: readonly Field[], values: unknown, style: NumberStyle): Record<string, Draft> => {
  const given = isValues(values) ? values : undefined
  return Object.fromEntries(
    fields.map((field) => [field.name, toDraft(field, field.name === '' ? given : given?.[field.name], style)]),
  )
}

let lastKey = 0

/** A key for a row that has no identity of its own yet. */
export const rowKey = (): string => {
  lastKey += 1
  return `row-${lastKey}`
}

const toDraft = (field: Field, value: unknown, style: NumberStyle): Draft => {
  const absent = value === undefined
  switch (field.kind) {
    case 'text':
    case 'whole':
    case 'choice':
    case 'reference':
    case 'date':
      return { is: 'text', text: absent ? initialOf(field) : asText(value) }
    case 'decimal':
      return { is: 'text', text: absent ? initialOf(field) : asDecimal(value, style) }
    case 'quantity': {
      const given = isValues(value) ? value : {}
      return {
        is: 'quantity',
        text: absent ? initialOf(field) : asText(given.text),
        style: given.style === 'comma' || given.style === 'point' ? given.style : style,
        from: toSource(given.provenance),
      }
    }
    case 'source':
      return toSource(value)
    case 'flag':
      return { is: 'flag', on: typeof value === 'boolean' ? value : (field.initial ?? false) }
    case 'references':
      return {
        is: 'many',
        all: field.all !== undefined && !Array.isArray(value),
        values: Array.isArray(value) ? value.map(asText) : [],
      }
    case 'group':
      return {
        is: 'group',
        on: field.absent === undefined || isValues(value),
        choice: '',
        parts: toParts(field.fields, value, style),
      }
    case 'variants': {
      const given = isValues(value) ? asText(value[field.tag]) : ''
      const known = field.options.find((option) => option.value === given) ?? field.options[0]
      return {
        is: 'group',
        on: field.absent === undefined || isValues(value),
        choice: known?.value ?? '',
        // The shape in use last: where shapes share a name, its value stands.
        parts: Object.assign(
          {},
          ...field.options
            .filter((option) => option !== known)
            .map((option) => toParts(option.fields, undefined, style)),
          known ? toParts(known.fields, value, style) : {},
        ),
      }
    }
    case 'list':
      return {
        is: 'list',
        rows: (Array.isArray(value) ? value : []).map((row: unknown) => {
          const id = field.identified && isValues(row) ? asText(row.id) : ''
          return { key: id || rowKey(), group: rowDraft(field.fields, row, style) }
        }),
      }
  }
}

/** A row of a list; without values an empty one. */
export const rowDraft = (fields: readonly Field[], values: unknown, style: NumberStyle): GroupDraft => ({
  is: 'group',
  on: true,
  choice: '',
  parts: toParts(fields, values, style),
})

/** A record as text for the form; `values` undefined makes an empty form with each field's initial text. */
export const recordDraft = (fields: readonly Field[], values: unknown, style: NumberStyle): GroupDraft =>
  rowDraft(fields, values, style)
