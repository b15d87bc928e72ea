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

const aways = [4.2, 7, 10]

/** Places along a stretch for a text of this length, from the right to the left. */
const along = ({ from, to }: Level, length: number): readonly number[] => {
  const last = Math.max(from, to - length - 1)
  const count = Math.max(1, Math.floor((last - from) / 4))
  return Array.from({ length: count + 1 }, (_, k) => last - (k * (last - from)) / count + 0.6)
}

/** Places from which a leader reaches the stretch, from the right to the left. */
const around = ({ from, to }: Level, length: number): readonly number[] =>
  Array.from({ length: Math.floor((to - from + length) / 3) }, (_, k) => to - 1 - k * 3)

/**
 * The name on the line: on the allowed side where there is room, from the right to the left, else beyond the hatching or
 * before the line, else away from it with a leader.
 */
export const limitName = (
  limit: LimitSpec,
  levels: readonly Level[],
  placer: LabelPlacer,
): readonly SceneItem[] | null => {
  const length = textWidth(limit.name, labelSize)
  const allowed = limit.forbidden === 'below' ? -1 : 1
  const at = (x: number, y: number, side: number, away: number) =>
    text(x, side < 0 ? y - away - 0.22 * labelSize : y + away + 0.66 * labelSize, limit.name, { size: labelSize })
  const backwards = [...levels].reverse()
  const beside = [
    { side: allowed, away: 0.75 },
    { side: -allowed, away: hatchDepth + 0.75 },
  ].flatMap(({ side, away }) =>
    backwards.flatMap((level) => along(level, length).map((x) => at(x, level.y, side, away))),
  )
  const before = levels
    .slice(0, 1)
    .map(({ from, y }) => text(from - 1, y + 0.33 * labelSize, limit.name, { size: labelSize, anchor: 'end' }))
  const apart = aways.flatMap((away) =>
    [allowed, -allowed].flatMap((side) =>
      backwards.flatMap((level) => around(level, length).map((x) => ({ name: at(x, level.y, side, away), level }))),
    ),
  )
  const near = [...beside, ...before]
  const name = placer.place([...near, ...apart.map((one) => one.name)])
  if (!name) return null
  const level = apart.find((one) => one.name === name)?.level
  if (!level) return [name]
  const foot = Math.min(Math.max(name.x + length / 2, level.from + 0.5), level.to - 0.5)
  const edge = name.y < level.y ? name.y + 0.22 * labelSize : name.y - 0.72 * labelSize
  return [
    path(
      line([
        [foot, level.y],
        [foot, edge],
      ]),
      { stroke: 'ink', width: 0.12 },
    ),
    name,
  ]
}
