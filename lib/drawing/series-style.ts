import type { Ink } from './ink'

export interface SeriesStyle {
  ink: Ink
  /** Dash and gap in mm; each series has its own, so that a grey print stays readable. */
  dash: readonly number[]
}

const styles: readonly SeriesStyle[] = [
  { ink: 'series-1', dash: [] },
  { ink: 'series-2', dash: [3.2, 1.2] },
  { ink: 'series-3', dash: [3.2, 0.9, 0.5, 0.9] },
  { ink: 'series-4', dash: [0.5, 0.8] },
  { ink: 'series-5', dash: [1.5, 0.9] },
  { ink: 'series-6', dash: [3.2, 0.8, 0.5, 0.8, 0.5, 0.8] },
]

/** Style of the nth series of a plot, counted from 0; a plot holds six at most. */
export const seriesStyle = (index: number): SeriesStyle => {
  const style = styles[index]
  if (!style) throw new RangeError(`A plot holds ${styles.length} series at most; series ${index + 1} was asked for.`)
  return style
}

export const mostSeries = styles.length
