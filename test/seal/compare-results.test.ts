import { describe, expect, it } from 'vitest'
import { compareResults } from '@/app/verify/compare-results'

const result = (voltage: number, extra: object = {}) => ({
  engineVersion: '1.0.0',
  cases: [
    {
      caseId: 'C01',
      outcome: { kind: 'complete' },
      places: [{ busId: 'PCC', deepest: { voltage, at: 0.5 }, settledAfterStart: null }],
      counters: { steps: 100 },
    },
  ],
  verdicts: [{ ruleId: 'L1', caseId: 'C01', word: 'meets', margin: 0.004 }],
  ...extra,
})

describe('a recomputed study against the results in the report', () => {
  it('agrees when it differs by less than is printed, whatever the solver counted', () => {
    const here = result(30_123.4561 + 1e-8)
    here.cases[0]!.counters.steps = 101
    expect(compareResults(result(30_123.4561), here)).toMatchObject({ differing: 0, differences: [] })
    expect(compareResults(result(30_123.4561), result(30_123.4563)).differing).toBe(0)
    expect(compareResults(result(1), result(1)).compared).toBe(10)
  })

  it('names the value that comes out differently, with both', () => {
    const { differing, differences } = compareResults(result(30_123.4), result(30_126.4))
    expect(differing).toBe(1)
    expect(differences[0]).toEqual({
      where: 'cases, C01, places, PCC, deepest, voltage',
      attached: '30\u2009123.4',
      here: '30\u2009126.4',
    })
  })

  it('finds a verdict that flipped, a case that is missing, and a value that is there on one side only', () => {
    const flipped = { ...result(1), verdicts: [{ ruleId: 'L1', caseId: 'C01', word: 'fails', margin: 0.004 }] }
    expect(compareResults(result(1), flipped).differences).toEqual([
      { where: 'verdicts, C01, L1, word', attached: 'meets', here: 'fails' },
    ])
    expect(compareResults(result(1), { ...result(1), cases: [] }).differences).toEqual([
      { where: 'cases, C01', attached: 'several values', here: 'none' },
    ])
    expect(compareResults(result(1), result(1, { overall: 'meets' })).differences[0]?.attached).toBe('none')
  })

  it('takes what JSON cannot write for what it writes instead', () => {
    expect(compareResults({ margin: null }, { margin: Number.POSITIVE_INFINITY }).differing).toBe(0)
    expect(compareResults({ a: null }, {}).differing).toBe(0)
  })

  it('shows at most fifty differences and counts them all', () => {
    const many = (value: number) => ({ values: Array(80).fill(value) })
    const { differing, differences } = compareResults(many(1), many(2))
    expect([differing, differences.length]).toEqual([80, 50])
  })

  it('says which engine computed each', () => {
    expect(compareResults(result(1), { ...result(1), engineVersion: '1.1.0' }).engine).toEqual({
      attached: '1.0.0',
      here: '1.1.0',
    })
    expect(compareResults('nonsense', result(1))).toMatchObject({ differing: 1, engine: { attached: null } })
  })
})
