import * as fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import {
  type Anchor,
  anchorInstants,
  parseAnchor,
  pointCurves,
  printAnchor,
  startFigures,
} from '@/lib/study/anchors/anchor'

const id = fc.stringMatching(/^[A-Za-z0-9][A-Za-z0-9_-]{0,20}$/)

const anchors: fc.Arbitrary<Anchor> = fc.oneof(
  fc.constant({ kind: 'revision' as const }),
  fc.record({ kind: fc.constant('record' as const), list: id, id, path: fc.array(id, { maxLength: 4 }) }),
  fc.record({ kind: fc.constant('verdict' as const), limitId: id, caseId: id }),
  fc.record({ kind: fc.constant('case' as const), caseId: id }),
  fc.record({
    kind: fc.constant('voltage' as const),
    caseId: id,
    busId: id,
    instant: fc.constantFrom(...anchorInstants),
  }),
  fc.record({ kind: fc.constant('start' as const), caseId: id, motorId: id, figure: fc.constantFrom(...startFigures) }),
  fc.record({
    kind: fc.constant('point' as const),
    caseId: id,
    curve: fc.constantFrom(...pointCurves),
    of: id,
    at: fc.integer({ min: 0, max: 600_000 }).map((ms) => ms / 1000),
  }),
  fc.record({ kind: fc.constant('check' as const), checkId: id }),
  fc.record({ kind: fc.constant('section' as const), key: id }),
)

describe('the text of an anchor', () => {
  test('leads back to the same anchor', () => {
    fc.assert(
      fc.property(anchors, (anchor) => {
        expect(parseAnchor(printAnchor(anchor))).toEqual(anchor)
      }),
    )
  })

  test.each(['', 'revision/', 'limit/R1', 'limit/R1/case/', 'case/C2/place/pcc', 'case/C2/place/pcc/voltage/never'])(
    '“%s” is none',
    (text) => expect(parseAnchor(text)).toBeNull(),
  )

  test.each([
    'series/C2/voltage/pcc@',
    'series/C2/voltage/pcc@-1',
    'series/C2/heat/m1@1',
    'x'.repeat(301),
    'record/motors',
  ])('“%s” is none either', (text) => expect(parseAnchor(text)).toBeNull())
})
