import { describe, expect, it } from 'vitest'
import type { Field } from '@/lib/ui/form/field'
import { fillSources, namedSources, withoutSource } from '@/lib/ui/form/sources'
import { recordDraft } from '@/lib/ui/form/to-draft'

const fields: readonly Field[] = [
  { kind: 'quantity', name: 'power', label: 'Power', quantity: 'active-power' },
  { kind: 'quantity', name: 'voltage', label: 'Voltage', quantity: 'voltage' },
  { kind: 'quantity', name: 'current', label: 'Current', quantity: 'current', optional: true },
]

const plate = {
  power: {
    text: '1100 kW',
    si: 1.1e6,
    quantity: 'active-power',
    style: 'point',
    provenance: { kind: 'test', source: 'Report 7' },
  },
  voltage: { text: '6.6 kV', si: 6600, quantity: 'voltage', style: 'point', provenance: null },
  current: null,
}

describe('one source for a record', () => {
  const draft = recordDraft(fields, plate, 'point')

  it('counts typed values without a source, and no empty ones', () => {
    expect(withoutSource(draft)).toBe(1)
  })

  it('goes to the values that have none and leaves the others theirs', () => {
    const filled = fillSources(draft, 'guaranteed', 'Sheet BRM-0461')
    expect(withoutSource(filled)).toBe(0)
    expect(namedSources(filled)).toEqual(['Report 7', 'Sheet BRM-0461'])
  })
})
