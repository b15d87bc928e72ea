import { describe, expect, it } from 'vitest'
import { sampledTable } from '@/app/(work)/_results/sampled-table'

const time = Array.from({ length: 1001 }, (_, i) => i / 100)

describe('a curve as a table', () => {
  it('keeps where the curve is lowest although most samples are left out', () => {
    const dip = time.map((t) => (t === 3.17 ? 92.08 : 98))
    const { rows, heads } = sampledTable({ head: 'Time, s', values: time, decimals: 2 }, [
      { head: 'PCC, % of nominal', values: dip, decimals: 2 },
    ])
    expect(heads).toEqual(['Time, s', 'PCC, % of nominal'])
    expect(rows.length).toBeLessThan(70)
    expect(rows.map(({ cells }) => cells)).toContainEqual(['3.17', '92.08'])
  })

  it('keeps both values at the instant of a switching', () => {
    const { rows } = sampledTable({ head: 'Time, s', values: [0, 0, 1], decimals: 0 }, [
      { head: 'U', values: [100, 93, 94], decimals: 0 },
    ])
    expect(rows.map(({ cells }) => cells.join(' '))).toEqual(['0 100', '0 93', '1 94'])
  })
})
