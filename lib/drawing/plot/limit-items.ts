import { line, path, type SceneItem, type TextItem, text } from '../scene'
import { textWidth } from '../text-width'
import { hatch, hatchDepth } from './hatch'
import type { LabelPlacer } from './label-placer'
import type { LimitSpec } from './line-plot-spec'
import { labelSize, type PlotFrame } from './plot-frame'

interface Level {
  from: number
  to: number
  y: number
}

/** The stretches of a limit in sheet coordinates, cut to the plot; those above or below it are left out. */
export const limitLevels = (limit: LimitSpec, { x, y, area }: PlotFrame): readonly Level[] =>
  limit.steps.flatMap((step) => {
    const level = {
      from: Math.max(x(step.from), area.x),
      to: Math.min(x(step.to), area.x + area.width),
      y: y(step.value),
    }
    const visible = level.to > level.from && level.y >= area.y && level.y <= area.y + area.height
    return visible ? [level] : []
  })

export const limitLength = (levels: readonly Level[]): number =>
  levels.reduce((sum, { from, to }) => sum + to - from, 0)

const hatching = (limit: LimitSpec, levels: readonly Level[]): readonly SceneItem[] =>
  limit.hatched === false
    ? []
    : [
        path(levels.map(({ from, to, y }) => hatch(from, to, y, limit.forbidden)).join(''), {
          stroke: 'soft',
          width: 0.12,
        }),
      ]

export const limitItems = (limit: LimitSpec, levels: readonly Level[]): readonly SceneItem[] => [
  ...hatching(limit, levels),
  path(line(levels.flatMap(({ from, to, y }) => [[from, y] as const, [to, y] as const])), {
    stroke: 'ink',
    width: 0.22,
  }),
]

/** What a label should not cover: the line itself and the hatching beside it. */
export const limitObstacles = (
  limit: LimitSpec,
  levels: readonly Level[],
): readonly (readonly [number, number])[][] => {
  const outwards = limit.forbidden === 'below' ? hatchDepth : -hatchDepth
  const depths = limit.hatched === false ? [0] : [0, outwards / 2, outwards]
  return levels.flatMap(({ from, to, y }) =>
    depths.map((depth): [number, number][] => [
      [from, y + depth],
      [to, y + depth],
    ]),
  )
}

/** What the plot does not show: limits outside its axes, and whatever else was left out. */
export const noteItems = (
  outside: readonly string[],
  notes: readonly string[],
  { area }: PlotFrame,
): readonly TextItem[] => {
  const parts = [...(outside.length > 0 ? [`outside the axes: ${outside.join('; ')}`] : []), ...notes]
  if (parts.length === 0) return []
  return [text(area.x + area.width, 2.6, parts.join('; '), { size: labelSize, anchor: 'end', ink: 'soft' })]
}

/** The name on the line: on the allowed side where there is room, from the right to the left, else beyond the hatching. */
export const limitName = (limit: LimitSpec, levels: readonly Level[], placer: LabelPlacer): TextItem | null => {
  const length = textWidth(limit.name, labelSize)
  const towards = limit.forbidden === 'below' ? -1 : 1
  const baseline = (y: number, side: number, away: number) =>
    side < 0 ? y - away - 0.22 * labelSize : y + away + 0.66 * labelSize
  const candidates = [
    { side: towards, away: 0.75 },
    { side: -towards, away: hatchDepth + 0.75 },
  ].flatMap(({ side, away }) =>
    [...levels].reverse().flatMap(({ from, to, y }) => {
      const last = Math.max(from, to - length - 1)
      const count = Math.max(1, Math.floor((last - from) / 4))
      return Array.from({ length: count + 1 }, (_, k) =>
        text(last - (k * (last - from)) / count + 0.6, baseline(y, side, away), limit.name, { size: labelSize }),
      )
    }),
  )
  const first = levels[0]
  const before = first
    ? [text(first.from - 1, first.y + 0.33 * labelSize, limit.name, { size: labelSize, anchor: 'end' })]
    : []
  return placer.place([...candidates, ...before])
}
