import { describe, expect, it } from 'vitest'
import { canonicalBytes } from '@/lib/study/canonical-json'
import { readFrozenStudy } from '@/lib/study/read/read-frozen-study'
import { example } from '../support/examples'

describe('a study as it was frozen', () => {
  it('reads as the document that it was', () => {
    const document = example('one-motor')
    expect(readFrozenStudy(canonicalBytes(document))).toEqual(document)
  })

  it('has what later versions added at its default', () => {
    const document = example('one-motor')
    const { paper: _, leftOut: __, added: ___, ...texts } = document.texts
    expect(readFrozenStudy(canonicalBytes({ ...document, texts }))).toEqual(document)
  })

  it('that can no longer be read is a broken record', () =>
    expect(() => readFrozenStudy(canonicalBytes({ format: 'breakaway-study' }))).toThrow())
})
