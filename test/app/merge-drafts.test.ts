import { describe, expect, it } from 'vitest'
import { compareDrafts, mergeDrafts, sameDraft } from '@/app/(work)/_records/compare-drafts'
import { bus } from '@/app/(work)/_records/kinds/bus'
import { recordDraft } from '@/lib/ui/form/to-draft'

const draft = (name: string, note: string) =>
  recordDraft(
    bus.fields,
    {
      tag: 'S33',
      name,
      note,
      nominal: { text: '33 kV', si: 33000, quantity: 'voltage', style: 'point', provenance: null },
    },
    'point',
  )

describe('two changes of one record', () => {
  const base = draft('Station', '')

  it('keep what only the other person changed, beside what I changed', () => {
    const merged = mergeDrafts(base, draft('Station, HV side', ''), draft('Station', 'seen on site'))
    expect(sameDraft(merged, draft('Station, HV side', 'seen on site'))).toBe(true)
  })

  it('show both texts of a field that both changed, and mine stands in what would be saved', () => {
    const theirs = draft('Substation', '')
    const merged = mergeDrafts(base, draft('Station, HV side', ''), theirs)
    expect(compareDrafts(bus.fields, merged, theirs, {})).toEqual([
      { name: 'name', label: 'Name', mine: 'Station, HV side', theirs: 'Substation' },
    ])
  })
})
