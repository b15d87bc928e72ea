/** Where a value comes from, the firmest first. */
export const provenanceKinds = ['test', 'guaranteed', 'typical', 'derived', 'assumed'] as const

export type ProvenanceKind = (typeof provenanceKinds)[number]

/** The mark before a value and its words in a legend; the same on the screen and in the report. */
export const provenanceMark: Record<ProvenanceKind, { mark: string; word: string; meaning: string; asks: string }> = {
  test: { mark: '■', word: 'test', meaning: 'from a test report', asks: 'Name the test report.' },
  guaranteed: { mark: '▣', word: 'guaranteed', meaning: 'guaranteed by the maker', asks: "Name the maker's document." },
  typical: { mark: '▤', word: 'typical', meaning: 'from a typical data sheet', asks: 'Name the data sheet.' },
  derived: { mark: 'ƒ', word: 'derived', meaning: 'derived from other data', asks: 'Write the formula or method.' },
  assumed: { mark: '?', word: 'assumed', meaning: 'assumed', asks: 'Write the reason.' },
}

/** Derived and assumed values list themselves in the report. */
export const needsListing = (kind: ProvenanceKind): boolean => kind === 'derived' || kind === 'assumed'
