import { describe, expect, it } from 'vitest'
import type { CaseResult } from '@/lib/engine/case-result'
import { runCase } from '@/lib/engine/run-case'
import { studyRunInput } from '@/lib/study/to-engine/study-run-input'
import { example } from '../study/support/examples'

const document = example('velmoor')
const { cases } = studyRunInput(document)
const startsOf = ({ motors }: CaseResult) => motors.flatMap(({ start }) => (start ? [start] : []))

describe('the demo plant by the third-order model', () => {
  it.each(cases.map((input, i) => [document.cases[i]!.tag, input] as const))(
    '%s ends as by the quasi-static model, by up to a twelfth later, and settles at the same voltages',
    (_tag, input) => {
      const [steady, moving] = [runCase(input), runCase({ ...input, model: { kind: 'third-order' } })]
      expect(startsOf(moving).map(({ outcome }) => outcome.kind)).toEqual(
        startsOf(steady).map(({ outcome }) => outcome.kind),
      )
      startsOf(moving).forEach(({ timeToCriterion }, i) => {
        const other = startsOf(steady)[i]!.timeToCriterion
        if (timeToCriterion === null || other === null) return
        expect(timeToCriterion / other).toBeGreaterThan(1)
        expect(timeToCriterion / other).toBeLessThan(1 + 1 / 12)
      })
      moving.places.forEach((place, i) => {
        const { before, settledAfterStart } = steady.places[i]!
        expect(place.before / before).toBeCloseTo(1, 9)
        if (settledAfterStart !== null) expect(place.settledAfterStart! / settledAfterStart).toBeCloseTo(1, 6)
      })
    },
  )
})
