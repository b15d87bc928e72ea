import { expect, test } from 'vitest'
import { needsListing, provenanceKinds, provenanceMark } from '@/lib/quantity/provenance'

test('every kind of source has a mark of its own and a word', () => {
  const marks = provenanceKinds.map((kind) => provenanceMark[kind].mark)
  expect(marks).toEqual(['■', '▣', '▤', 'ƒ', '?'])
  expect(new Set(provenanceKinds.map((kind) => provenanceMark[kind].word)).size).toBe(provenanceKinds.length)
})

test('derived and assumed values list themselves, measured and guaranteed ones do not', () => {
  expect(provenanceKinds.filter(needsListing)).toEqual(['derived', 'assumed'])
})
