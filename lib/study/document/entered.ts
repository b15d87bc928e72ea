import * as z from 'zod'
import { parseQuantity } from '../../quantity/parse-quantity'
import { provenanceKinds } from '../../quantity/provenance'
import type { QuantityName } from '../../quantity/quantity-name'

/** Where a value came from; `source` is the document, the formula or the reason. */
export const provenance = z.strictObject({
  kind: z.enum(provenanceKinds),
  source: z.string().max(500),
})

export type ValueProvenance = z.infer<typeof provenance>

const stored = <Q extends QuantityName>(quantity: Q) =>
  z.strictObject({
    /** As typed; the report prints it. */
    text: z.string().min(1).max(60),
    /** As understood, in the SI unit of the quantity; the engine reads it. */
    si: z.number(),
    quantity: z.literal(quantity),
    style: z.enum(['point', 'comma']),
    /** Null until the source is stated; the pre-issue checks list such values. */
    provenance: provenance.nullable(),
  })

/**
 * A value as typed, as understood and with its source. A file written by hand may give the text alone
 * (`"11 kV"`); it is read in the point style and has no source yet.
 */
export const entered = <Q extends QuantityName>(quantity: Q) => {
  const full = stored(quantity)
  return z.union([full, z.string().min(1).max(60)]).transform((value, context): z.infer<typeof full> => {
    if (typeof value !== 'string') return value
    const parsed = parseQuantity(value, quantity, 'point')
    if (!parsed.ok) {
      context.addIssue({ code: 'custom', message: parsed.message })
      return z.NEVER
    }
    const read = { text: value, si: parsed.si, quantity, style: 'point', provenance: null }
    return full.parse(read)
  })
}

export interface Entered<Q extends QuantityName = QuantityName> {
  text: string
  si: number
  quantity: Q
  style: 'point' | 'comma'
  provenance: ValueProvenance | null
}
