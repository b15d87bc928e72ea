import { describe, expect, it } from 'vitest'
import { type Draft, type GroupDraft, withDraftAt } from '@/lib/ui/form/draft'
import type { Field } from '@/lib/ui/form/field'
import { readDraft } from '@/lib/ui/form/read-draft'
import { recordDraft } from '@/lib/ui/form/to-draft'

const fields: readonly Field[] = [
  { kind: 'text', name: 'tag', label: 'Tag' },
  { kind: 'quantity', name: 'nominal', label: 'Nominal voltage', quantity: 'voltage' },
  { kind: 'quantity', name: 'current', label: 'Rated current', quantity: 'current', optional: true },
  {
    kind: 'variants',
    name: 'level',
    label: 'Level',
    tag: 'form',
    options: [
      {
        value: 'power',
        label: 'power',
        fields: [{ kind: 'quantity', name: 'power', label: 'Power', quantity: 'apparent-power' }],
      },
      {
        value: 'current',
        label: 'current',
        fields: [{ kind: 'quantity', name: 'current', label: 'Current', quantity: 'current' }],
      },
    ],
  },
  {
    kind: 'list',
    name: 'points',
    label: 'Points',
    item: 'point',
    fields: [{ kind: 'quantity', name: 'speed', label: 'Speed', quantity: 'speed' }],
  },
]

const quantity = (text: string): Draft => ({
  is: 'quantity',
  text,
  style: 'point',
  from: { is: 'source', kind: '', source: '' },
})

const typed = (changes: readonly [readonly (string | number)[], Draft][]): GroupDraft =>
  changes.reduce((draft, [path, value]) => withDraftAt(draft, path, value), recordDraft(fields, undefined, 'point'))

const bus = typed([
  [['tag'], { is: 'text', text: ' PCC ' }],
  [['nominal'], quantity('33 kV')],
  [['level', 'power'], quantity('90 MVA')],
])

describe('reading a form', () => {
  it('keeps the text as typed beside the value understood', () => {
    const { values, issues } = readDraft(fields, bus, 'point')
    expect(issues).toEqual([])
    expect(values).toEqual({
      tag: 'PCC',
      nominal: { text: '33 kV', si: 33000, quantity: 'voltage', style: 'point', provenance: null },
      current: null,
      level: {
        form: 'power',
        power: { text: '90 MVA', si: 90e6, quantity: 'apparent-power', style: 'point', provenance: null },
      },
      points: [],
    })
  })

  it('names the field that cannot be read, by its place in the record', () => {
    const draft = typed([
      [['tag'], { is: 'text', text: '' }],
      [['nominal'], quantity('33 kW')],
      [['level', 'power'], quantity('90')],
    ])
    expect(readDraft(fields, draft, 'point').issues.map(({ path }) => path)).toEqual([
      ['tag'],
      ['nominal'],
      ['level', 'power'],
    ])
  })

  it('stores the shape in use and keeps the text of the others in the form', () => {
    const draft = typed([
      [['tag'], { is: 'text', text: 'PCC' }],
      [['nominal'], quantity('33 kV')],
      [['level', 'power'], quantity('90 MVA')],
      [['level', 'current'], quantity('1.5 kA')],
    ])
    const level = draft.parts.level
    if (level?.is !== 'group') throw new Error('the level is a group')
    const changed = withDraftAt(draft, ['level'], { ...level, choice: 'current' })
    expect(readDraft(fields, changed, 'point').values.level).toMatchObject({ form: 'current', current: { si: 1500 } })
    expect(readDraft(fields, changed, 'point').values.level).not.toHaveProperty('power')
    const back = withDraftAt(changed, ['level'], level)
    expect(readDraft(fields, back, 'point').values.level).toMatchObject({ form: 'power', power: { text: '90 MVA' } })
  })

  it('reads a plain number in the style in which numbers are typed', () => {
    const decimal: readonly Field[] = [{ kind: 'decimal', name: 'r', label: 'Resistance' }]
    const draft = withDraftAt(recordDraft(decimal, undefined, 'comma'), ['r'], { is: 'text', text: '0,0096' })
    expect(readDraft(decimal, draft, 'comma').values).toEqual({ r: 0.0096 })
    expect(recordDraft(decimal, { r: 0.0096 }, 'comma').parts.r).toEqual({ is: 'text', text: '0,0096' })
  })

  it('refuses a number with something behind it instead of dropping that', () => {
    const whole: readonly Field[] = [{ kind: 'whole', name: 'poles', label: 'Poles' }]
    const read = (text: string) =>
      readDraft(whole, withDraftAt(recordDraft(whole, undefined, 'point'), ['poles'], { is: 'text', text }), 'point')
    expect(read('6').values).toEqual({ poles: 6 })
    expect(read('6 poles').issues).toHaveLength(1)
    expect(read('6.5').issues[0]?.message).toBe('Write a whole number, for example 4.')
  })
})
