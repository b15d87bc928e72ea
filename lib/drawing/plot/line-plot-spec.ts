import type { Curve } from './decimate'

export interface AxisSpec {
  /** Quantity and unit, for example `time, s`. */
  label: string
  domain: readonly [number, number]
  /** About how many ticks (default 6). */
  ticks?: number
  /** Logarithmic, with the numbers 1, 2 and 5 of each decade; the domain lies above zero. */
  log?: true
}

export interface SeriesSpec extends Curve {
  /** Printed at the end of the line. */
  name: string
  /** Which of the six styles, counted from 0. */
  style: number
  /** Named by a marker instead of at its end. */
  unnamed?: true
}

/** A level that must not be crossed, over one or several stretches of x. */
export interface LimitSpec {
  name: string
  steps: readonly { from: number; to: number; value: number }[]
  forbidden: 'above' | 'below'
  /** False for a level to be reached, which has no forbidden side. */
  hatched?: boolean
}

/** An instant, drawn as a thin upright line. */
export interface EventSpec {
  name: string
  at: number
}

/** A point worth reading off. */
export interface MarkerSpec {
  x: number
  y: number
  name: string
}

/** A level at the right edge, after the last instant that is drawn. */
export interface EndMarkSpec {
  y: number
  name: string
}

/** The area between two curves over the same x, where `upper` lies above `lower`. */
export interface ShadeSpec {
  name: string
  x: readonly number[]
  lower: readonly number[]
  upper: readonly number[]
}

export interface LinePlotSpec {
  title: string
  description: string
  x: AxisSpec
  y: AxisSpec
  series: readonly SeriesSpec[]
  limits?: readonly LimitSpec[]
  events?: readonly EventSpec[]
  markers?: readonly MarkerSpec[]
  endMarks?: readonly EndMarkSpec[]
  shade?: ShadeSpec
  /** What was left out, said above the plot. */
  notes?: readonly string[]
  /** Size on the sheet in mm. */
  width?: number
  height?: number
}
