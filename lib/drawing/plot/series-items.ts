import { line, path, type SceneItem } from '../scene'
import { seriesStyle } from '../series-style'
import { clipPolyline } from './clip-polyline'
import { decimate } from './decimate'
import type { SeriesSpec } from './line-plot-spec'
import type { PlotFrame } from './plot-frame'

type Point = readonly [number, number]

/** The visible stretches of a curve in sheet coordinates. */
export interface DrawnSeries {
  spec: SeriesSpec
  parts: readonly (readonly Point[])[]
}

/** A quarter of a millimetre: finer than the line is wide. */
const columnWidth = 0.25

export const drawnSeries = (spec: SeriesSpec, frame: PlotFrame): DrawnSeries => {
  const onSheet = { x: spec.x.map((value) => frame.x(value)), y: spec.y.map((value) => frame.y(value)) }
  const rising = onSheet.x.every((value, i) => i === 0 || value >= onSheet.x[i - 1]!)
  const curve = rising ? decimate(onSheet, columnWidth) : onSheet
  const points = curve.x.map((value, i): Point => [value, curve.y[i]!])
  return { spec, parts: clipPolyline(points, frame.area) }
}

export const seriesItems = ({ spec, parts }: DrawnSeries): readonly SceneItem[] => {
  const style = seriesStyle(spec.style)
  return parts.map((points) => path(line(points), { stroke: style.ink, width: 0.42, dash: style.dash }))
}
