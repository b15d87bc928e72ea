import { type ScaleLinear, scaleLinear } from 'd3-scale'
import { formatNumber } from '@/lib/quantity/format-number'
import type { Box } from '../box'
import { line, path, type SceneItem, text } from '../scene'
import { textWidth } from '../text-width'
import type { AxisSpec, LinePlotSpec } from './line-plot-spec'

export const tickSize = 2.4
export const labelSize = 2.5

export interface PlotFrame {
  width: number
  height: number
  area: Box
  x: ScaleLinear<number, number>
  y: ScaleLinear<number, number>
  grid: readonly SceneItem[]
  axes: readonly SceneItem[]
}

/** Decimal places that tell neighbouring ticks apart. */
const places = (ticks: readonly number[]): number => {
  const step = Math.abs((ticks[1] ?? 1) - (ticks[0] ?? 0))
  return Math.max(0, -Math.floor(Math.log10(step) + 1e-9))
}

const ticksOf = (scale: ScaleLinear<number, number>, axis: AxisSpec) => {
  const values = scale.ticks(axis.ticks ?? 6)
  const decimals = places(values)
  return values.map((value) => ({ value, label: formatNumber(value, { decimals }) }))
}

/** Scales, grid and axes; the room at the right is for the names at the ends of the lines. */
export const plotFrame = (spec: LinePlotSpec): PlotFrame => {
  const width = spec.width ?? 174
  const height = spec.height ?? 62
  const names = Math.max(
    0,
    ...spec.series.map((one) => textWidth(one.name, labelSize, 'semibold')),
    ...(spec.endMarks ?? []).map((one) => textWidth(one.name, labelSize)),
  )
  const yScale = scaleLinear().domain(spec.y.domain)
  const yTicks = ticksOf(yScale, spec.y)
  const left = Math.max(6, ...yTicks.map((tick) => textWidth(tick.label, tickSize))) + 2.2
  const area = { x: left, y: 5.2, width: width - left - (names > 0 ? names + 4.6 : 2.5), height: height - 5.2 - 8.2 }
  const x = scaleLinear(spec.x.domain, [area.x, area.x + area.width])
  const y = yScale.range([area.y + area.height, area.y])
  const xTicks = ticksOf(x, spec.x)
  const bottom = area.y + area.height
  const right = area.x + area.width
  const rules = [
    ...yTicks.map(({ value }) =>
      line([
        [area.x, y(value)],
        [right, y(value)],
      ]),
    ),
    ...xTicks.map(({ value }) =>
      line([
        [x(value), area.y],
        [x(value), bottom],
      ]),
    ),
  ].join('')
  return {
    width,
    height,
    area,
    x,
    y,
    grid: [path(rules, { stroke: 'grid', width: 0.14 })],
    axes: [
      path(
        line([
          [area.x, area.y],
          [area.x, bottom],
          [right, bottom],
        ]),
        { stroke: 'ink', width: 0.25 },
      ),
      ...yTicks.map(({ value, label }) =>
        text(area.x - 1.2, y(value) + 0.33 * tickSize, label, { size: tickSize, anchor: 'end', ink: 'soft' }),
      ),
      ...xTicks.map(({ value, label }) =>
        text(x(value), bottom + 3.2, label, { size: tickSize, anchor: 'middle', ink: 'soft' }),
      ),
      text(0, 2.6, spec.y.label, { size: labelSize }),
      text(right, bottom + 6.8, spec.x.label, { size: labelSize, anchor: 'end' }),
    ],
  }
}
