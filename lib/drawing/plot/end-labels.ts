import type { Ink } from '../ink'
import { line, path, type SceneItem, text } from '../scene'
import { seriesStyle } from '../series-style'
import type { EndMarkSpec } from './line-plot-spec'
import { labelSize, type PlotFrame } from './plot-frame'
import type { DrawnSeries } from './series-items'
import { spreadLabels } from './spread-labels'

const gap = 3.1

interface EndLabel {
  name: string
  from: readonly [number, number]
  ink: Ink
  weight: 'regular' | 'semibold'
}

const ofSeries = ({ spec, parts }: DrawnSeries): readonly EndLabel[] => {
  const from = parts.at(-1)?.at(-1)
  return from && !spec.unnamed ? [{ name: spec.name, from, ink: seriesStyle(spec.style).ink, weight: 'semibold' }] : []
}

/** Names at the ends of the lines, moved apart where they would touch; each is tied to its line by a thin leader. */
export const endLabels = (
  series: readonly DrawnSeries[],
  marks: readonly EndMarkSpec[],
  { area, y }: PlotFrame,
): readonly SceneItem[] => {
  const right = area.x + area.width
  const levels = marks.flatMap((mark): EndLabel[] => {
    const at = y(mark.y)
    const visible = at >= area.y && at <= area.y + area.height
    return visible ? [{ name: mark.name, from: [right, at], ink: 'ink', weight: 'regular' }] : []
  })
  const labels = [...series.flatMap(ofSeries), ...levels]
  const places = spreadLabels(
    labels.map(({ from }) => from[1]),
    gap,
    area.y,
    area.y + area.height,
  )
  const ticks = levels.map(({ from }) =>
    path(
      line([
        [right - 2.4, from[1]],
        [right, from[1]],
      ]),
      { stroke: 'ink', width: 0.42 },
    ),
  )
  return [
    ...ticks,
    ...labels.flatMap(({ name, from, ink, weight }, i) => [
      path(line([from, [right + 0.6, from[1]], [right + 2.6, places[i]!], [right + 3.2, places[i]!]]), {
        stroke: ink,
        width: 0.14,
      }),
      text(right + 3.6, places[i]! + 0.33 * labelSize, name, { size: labelSize, weight, ink }),
    ]),
  ]
}
