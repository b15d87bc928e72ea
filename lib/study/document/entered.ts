import * as z from 'zod'
import { parseQuantity } from '../../quantity/parse-quantity'
import { provenanceKinds } from '../../quantity/provenance'
import type { NumberStyle, QuantityName } from '../../quantity/quantity-name'
import { quantityWording } from '../../quantity/quantity-wording'

/** Where a value came from; `source` is the document, the formula or the reason. */
export const provenance = z
  .strictObject({
    kind: z
      .enum(provenanceKinds)
      .describe(
        'test: test report; guaranteed: by the maker or the utility; typical: typical data sheet; derived: from other data; assumed: for a reason.',
      ),
    source: z.string().max(500).describe('The document, the formula (derived) or the reason (assumed).'),
  })
  .meta({ id: 'provenance', description: 'Where a value came from.' })

export type ValueProvenance = z.infer<typeof provenance>

export interface Entered<Q extends QuantityName = QuantityName> {
  /** As typed; the report prints it. */
  text: string
  /** As understood, in the SI unit of the quantity; the engine reads it. */
  si: number
  quantity: Q
  style: NumberStyle
  /** Null until the source is stated; the pre-issue checks list such values. */
  provenance: ValueProvenance | null
}

const typedText = z.string().min(1).max(60)

const describeValue = (quantity: QuantityName): string =>
  `${quantityWording[quantity].noun}, for example “${quantityWording[quantity].example}”: the text alone, or with its source.`

/**
 * A value as typed, as understood and with its source. A file written by hand may give the text alone (`"11 kV"`, read
 * in the point style and without a source), or the text and its source without the SI value.
 */
const schemaOf = <Q extends QuantityName>(quantity: Q) =>
  z
    .union([
      typedText,
      z.strictObject({
        text: typedText.describe('The value as typed, with its unit; the report prints it.'),
        si: z.number().optional().describe('The value in SI units; left out, it is read from the text.'),
        quantity: z.literal(quantity).optional(),
        style: z
          .enum(['point', 'comma'])
          .optional()
          .describe('Which sign marks the decimals in the text; left out, it is the point.'),
        provenance: provenance.nullable().optional().describe('Null or left out until the source is known.'),
      }),
    ])
    .transform((value, context): Entered<Q> => {
      const { text, si, style, provenance } = typeof value === 'string' ? { text: value } : value
      const rest = { quantity, style: style ?? 'point', provenance: provenance ?? null }
      if (si !== undefined) return { text, si, ...rest }
      const parsed = parseQuantity(text, quantity, rest.style)
      if (parsed.ok) return { text, si: parsed.si, ...rest }
      context.addIssue({ code: 'custom', message: parsed.message })
      return z.NEVER
    })
    .meta({ id: quantity, description: describeValue(quantity) })

/** One schema a quantity, so that the published schema names each kind of value once. */
const schemas = {
  voltage: schemaOf('voltage'),
  current: schemaOf('current'),
  'apparent-power': schemaOf('apparent-power'),
  'active-power': schemaOf('active-power'),
  'reactive-power': schemaOf('reactive-power'),
  impedance: schemaOf('impedance'),
  'impedance-per-length': schemaOf('impedance-per-length'),
  'susceptance-per-length': schemaOf('susceptance-per-length'),
  length: schemaOf('length'),
  ratio: schemaOf('ratio'),
  number: schemaOf('number'),
  frequency: schemaOf('frequency'),
  speed: schemaOf('speed'),
  torque: schemaOf('torque'),
  inertia: schemaOf('inertia'),
  time: schemaOf('time'),
} as const satisfies Record<QuantityName, unknown>

/** The schema of an entered value of a quantity. */
export const entered = <Q extends QuantityName>(quantity: Q): (typeof schemas)[Q] => schemas[quantity]
