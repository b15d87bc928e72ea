import { line, path, type Scene, type SceneItem } from '../scene'
import { endLabels } from './end-labels'
import { LabelPlacer } from './label-placer'
import { limitItems, limitLength, limitLevels, limitName, limitObstacles, noteItems } from './limit-items'
import type { LinePlotSpec, ShadeSpec } from './line-plot-spec'
import { eventItems, markerItems } from './mark-items'
import { type PlotFrame, plotFrame } from './plot-frame'
import { drawnSeries, seriesItems } from './series-items'

const shadeItems = (shade: ShadeSpec, { x, y, area }: PlotFrame): readonly SceneItem[] => {
  const clamped = (value: number) => Math.min(Math.max(y(value), area.y), area.y + area.height)
  const along = (values: readonly number[]) => shade.x.map((at, i) => [x(at), clamped(values[i]!)] as const)
  return [path(line([...along(shade.upper), ...along(shade.lower).reverse()], true), { fill: 'shade' })]
}

/** A plot of up to six lines over linear axes, with limits, instants and points that are worth reading off. */
export const linePlot = (spec: LinePlotSpec): Scene => {
  const frame = plotFrame(spec)
  const drawn = spec.series.map((series) => drawnSeries(series, frame))
  const levelled = (spec.limits ?? []).map((limit) => ({ limit, levels: limitLevels(limit, frame) }))
  const limits = levelled.filter(({ levels }) => levels.length > 0)
  const outside = levelled.filter(({ levels }) => levels.length === 0).map(({ limit }) => limit.name)
  const placer = new LabelPlacer(frame.area)
  for (const { parts } of drawn) for (const points of parts) placer.avoidCurve(points)
  for (const { limit, levels } of limits) for (const points of limitObstacles(limit, levels)) placer.avoidCurve(points)
  for (const { at } of spec.events ?? []) {
    placer.avoidCurve([
      [frame.x(at), frame.area.y],
      [frame.x(at), frame.area.y + frame.area.height],
    ])
  }
  // The shortest line has the fewest places for its name, so it chooses first.
  const named = limits
    .toSorted((a, b) => limitLength(a.levels) - limitLength(b.levels))
    .map(({ limit, levels }) => ({ limit, name: limitName(limit, levels, placer) }))
  const names = named.flatMap(({ name }) => name ?? [])
  const unnamed = named
    .filter(({ name }) => name === null)
    .map(({ limit }) => `unnamed for want of room: ${limit.name}`)
  const notes = [...unnamed, ...(spec.notes ?? [])]
  const markers = (spec.markers ?? []).flatMap((marker) => markerItems(marker, frame, placer))
  const events = (spec.events ?? []).flatMap((event) => eventItems(event, frame, placer))
  return {
    width: frame.width,
    height: frame.height,
    title: spec.title,
    description: spec.description,
    items: [
      ...(spec.shade ? shadeItems(spec.shade, frame) : []),
      ...frame.grid,
      ...limits.flatMap(({ limit, levels }) => limitItems(limit, levels)),
      ...events,
      ...drawn.flatMap(seriesItems),
      ...endLabels(drawn, spec.endMarks ?? [], frame),
      ...frame.axes,
      ...noteItems(outside, notes, frame),
      ...names,
      ...markers,
    ],
  }
}
