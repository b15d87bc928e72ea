import { formatNumber } from '@/lib/quantity/format-number'

export interface TableCurve {
  /** Name with unit and reference. */
  head: string
  values: readonly number[]
  decimals: number
}

export interface SampledTable {
  heads: readonly string[]
  rows: readonly { key: string; cells: readonly string[] }[]
}

const mostRows = 60

/**
 * Curves over one axis as a table of at most sixty rows, evenly taken; the two rows on either side of a switching are
 * both kept, and so is where each curve is lowest and highest.
 */
export const sampledTable = (axis: TableCurve, curves: readonly TableCurve[]): SampledTable => {
  const count = axis.values.length
  const step = Math.max(1, Math.ceil(count / mostRows))
  const wanted = new Set<number>()
  for (let i = 0; i < count; i += step) wanted.add(i)
  if (count > 0) wanted.add(count - 1)
  axis.values.forEach((value, i) => {
    if (i > 0 && value === axis.values[i - 1]) wanted.add(i - 1).add(i)
  })
  for (const { values } of curves) {
    wanted.add(extreme(values, (a, b) => a < b)).add(extreme(values, (a, b) => a > b))
  }
  return {
    heads: [axis, ...curves].map(({ head }) => head),
    rows: [...wanted]
      .filter((i) => i >= 0 && i < count)
      .sort((a, b) => a - b)
      .map((i) => ({
        key: String(i),
        cells: [axis, ...curves].map(({ values, decimals }) => formatNumber(values[i] ?? Number.NaN, { decimals })),
      })),
  }
}

const extreme = (values: readonly number[], better: (a: number, b: number) => boolean): number =>
  values.reduce((best, value, i) => (better(value, values[best] ?? value) ? i : best), 0)
