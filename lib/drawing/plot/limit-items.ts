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
  path(levels.map(({ from, to, y }) => hatch(from, to, y, limit.forbidden)).join(''), { stroke: 'soft', width: 0.12 }),
  path(line(levels.flatMap(({ from, to, y }) => [[from, y] as const, [to, y] as const])), {
    stroke: 'ink',
    width: 0.22,
  }),
]

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
  return placer.place(candidates)
}
