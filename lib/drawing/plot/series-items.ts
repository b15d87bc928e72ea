import { line, path, type SceneItem, text } from '../scene'
import { seriesStyle } from '../series-style'
import { clipPolyline } from './clip-polyline'
import { decimate } from './decimate'
import type { SeriesSpec } from './line-plot-spec'
import { labelSize, type PlotFrame } from './plot-frame'
import { spreadLabels } from './spread-labels'

type Point = readonly [number, number]

/** A quarter of a millimetre: finer than the line is wide. */
const columnWidth = 0.25
const labelGap = 3.1

/** The visible parts of a curve in sheet coordinates. */
export const seriesParts = (series: SeriesSpec, frame: PlotFrame): readonly (readonly Point[])[] => {
  const onSheet = { x: series.x.map((value) => frame.x(value)), y: series.y.map((value) => frame.y(value)) }
  const rising = onSheet.x.every((value, i) => i === 0 || value >= onSheet.x[i - 1]!)
  const curve = rising ? decimate(onSheet, columnWidth) : onSheet
  return clipPolyline(
    curve.x.map((value, i): Point => [value, curve.y[i]!]),
    frame.area,
  )
}

/** Lines with the name of each at its end; a name that had to move away is tied to its line by a thin leader. */
export const seriesItems = (
  series: readonly { spec: SeriesSpec; parts: readonly (readonly Point[])[] }[],
  frame: PlotFrame,
): readonly SceneItem[] => {
  const { area } = frame
  const shown = series.flatMap(({ spec, parts }) => {
    const end = parts.at(-1)?.at(-1)
    return end ? [{ spec, parts, end }] : []
  })
  const places = spreadLabels(
    shown.map(({ end }) => end[1]),
    labelGap,
    area.y,
    area.y + area.height,
  )
  const right = area.x + area.width
  return shown.flatMap(({ spec, parts, end }, i) => {
    const style = seriesStyle(spec.style)
    const place = places[i]!
    return [
      ...parts.map((points) => path(line(points), { stroke: style.ink, width: 0.42, dash: style.dash })),
      path(
        line([
          [Math.max(end[0], area.x), end[1]],
          [right + 0.6, end[1]],
          [right + 2.6, place],
          [right + 3.2, place],
        ]),
        { stroke: style.ink, width: 0.14 },
      ),
      text(right + 3.6, place + 0.33 * labelSize, spec.name, {
        size: labelSize,
        weight: 'semibold',
        ink: style.ink,
      }),
    ]
  })
}
