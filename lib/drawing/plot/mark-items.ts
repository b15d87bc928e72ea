import { line, mm, path, type SceneItem, text } from '../scene'
import type { LabelPlacer } from './label-placer'
import type { EventSpec, MarkerSpec } from './line-plot-spec'
import { labelSize, type PlotFrame } from './plot-frame'

const ring = (x: number, y: number, radius: number): string => {
  const r = mm(radius)
  return `M${mm(x - r)} ${mm(y)}a${r} ${r} 0 1 0 ${mm(2 * r)} 0a${r} ${r} 0 1 0 ${mm(-2 * r)} 0Z`
}

/** Upright lines at instants, each with its name beside it at the first free height. */
export const eventItems = (event: EventSpec, { x, area }: PlotFrame, placer: LabelPlacer): readonly SceneItem[] => {
  const at = x(event.at)
  if (at < area.x || at > area.x + area.width) return []
  const heights = Array.from({ length: Math.floor(area.height / 3.2) }, (_, k) => area.y + 2.6 + k * 3.2)
  const name = placer.place(
    heights.flatMap((y) => [
      text(at + 0.9, y, event.name, { size: labelSize, ink: 'soft' }),
      text(at - 0.9, y, event.name, { size: labelSize, ink: 'soft', anchor: 'end' }),
    ]),
  )
  const upright = path(
    line([
      [at, area.y],
      [at, area.y + area.height],
    ]),
    { stroke: 'soft', width: 0.16, dash: [0.8, 0.8] },
  )
  return name ? [upright, name] : [upright]
}

/** A ring at a point with its reading beside it. */
export const markerItems = (
  marker: MarkerSpec,
  { x, y, area }: PlotFrame,
  placer: LabelPlacer,
): readonly SceneItem[] => {
  const at = [x(marker.x), y(marker.y)] as const
  const outside = at[0] < area.x || at[0] > area.x + area.width || at[1] < area.y || at[1] > area.y + area.height
  if (outside) return []
  placer.avoidBox({ x: at[0] - 0.9, y: at[1] - 0.9, width: 1.8, height: 1.8 })
  const offsets = [2, 4, 6.5, 9.5, 13].flatMap((away) => [-1.6, 3.4, -4.2, 6, 0.8, 9].map((down) => ({ away, down })))
  const name = placer.place(
    offsets.flatMap(({ away, down }) => [
      text(at[0] + away, at[1] + down, marker.name, { size: labelSize }),
      text(at[0] - away, at[1] + down, marker.name, { size: labelSize, anchor: 'end' }),
    ]),
  )
  const mark = path(ring(at[0], at[1], 0.7), { stroke: 'ink', width: 0.25, fill: 'sheet' })
  if (!name) return [mark]
  const toRight = name.anchor === 'start'
  const leader = line([
    [at[0] + (toRight ? 0.7 : -0.7), at[1]],
    [name.x + (toRight ? -0.4 : 0.4), name.y - 0.33 * labelSize],
  ])
  return [path(leader, { stroke: 'ink', width: 0.12 }), mark, name]
}
