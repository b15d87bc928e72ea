import type { QuantityName } from '@/lib/quantity/quantity-name'

/** One choice of a list; `within` ties it to a value of another field, as a curve to its motor. */
export interface Option {
  value: string
  label: string
  within?: string
}

interface Named {
  /** Key of the value in its record; empty where the parts stand in the record itself. */
  name: string
  label: string
  hint?: string
  /** How it reads in a line with others, `#` standing for the value; empty leaves it out there. */
  inLine?: string
}

export interface TextField extends Named {
  kind: 'text'
  optional?: true
  /** More than one makes it a box for longer text. */
  lines?: number
  /** Empty text is stored as nothing rather than as an empty text. */
  emptyIsNull?: true
  initial?: string
}

/** A whole number without a unit. */
export interface WholeField extends Named {
  kind: 'whole'
  optional?: true
  initial?: string
}

/** A plain number whose unit is said by the fields around it. */
export interface DecimalField extends Named {
  kind: 'decimal'
  optional?: true
  initial?: string
}

/** A value with its unit as typed, and where it came from. */
export interface QuantityField extends Named {
  kind: 'quantity'
  quantity: QuantityName
  optional?: true
  initial?: string
}

export interface ChoiceField extends Named {
  kind: 'choice'
  options: readonly Option[]
  initial?: string
}

/** Another record, by its identity. */
export interface ReferenceField extends Named {
  kind: 'reference'
  /** Which list of options. */
  to: string
  optional?: true
  /** Name of the field beside this one whose value narrows the options. */
  within?: string
}

/** Any number of other records, or of fixed words. */
export interface ReferencesField extends Named {
  kind: 'references'
  to: string
  options?: readonly Option[]
  /** Words for "no restriction", stored as null; without it the list itself is stored. */
  all?: string
}

export interface DateField extends Named {
  kind: 'date'
}

export interface FlagField extends Named {
  kind: 'flag'
  initial?: boolean
}

/** Kind of source and its document, for parts that have one source together. */
interface SourceField extends Named {
  kind: 'source'
}

export interface GroupField extends Named {
  kind: 'group'
  fields: readonly Field[]
  /** Words for "not given", stored as null. */
  absent?: string
}

export interface Variant extends Option {
  fields: readonly Field[]
}

/** One of several shapes, told apart by the value under `tag`. */
export interface VariantsField extends Named {
  kind: 'variants'
  tag: string
  options: readonly Variant[]
  absent?: string
}

export interface ListField extends Named {
  kind: 'list'
  fields: readonly Field[]
  /** One row in a word, for the button that adds one. */
  item: string
  /** New rows get an identity of their own under `id`. */
  identified?: true
}

export type Field =
  | TextField
  | WholeField
  | DecimalField
  | QuantityField
  | ChoiceField
  | ReferenceField
  | ReferencesField
  | DateField
  | FlagField
  | SourceField
  | GroupField
  | VariantsField
  | ListField

/** Lists of options by name. */
export type Options = Readonly<Record<string, readonly Option[]>>
