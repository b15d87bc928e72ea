import { type ScaleLinear, type ScaleLogarithmic, scaleLinear, scaleLog } from 'd3-scale'
import { formatNumber } from '@/lib/quantity/format-number'
import type { Box } from '../box'
import { line, path, type SceneItem, text } from '../scene'
import { textWidth } from '../text-width'
import type { AxisSpec, LinePlotSpec } from './line-plot-spec'

export const tickSize = 2.4
export const labelSize = 2.5

type Scale = ScaleLinear<number, number> | ScaleLogarithmic<number, number>

export interface PlotFrame {
  width: number
  height: number
  area: Box
  x: Scale
  y: Scale
  grid: readonly SceneItem[]
  axes: readonly SceneItem[]
}

/** Decimal places that tell neighbouring ticks apart. */
const places = (ticks: readonly number[]): number => {
  const step = Math.abs((ticks[1] ?? 1) - (ticks[0] ?? 0))
  return Math.max(0, -Math.floor(Math.log10(step) + 1e-9))
}

const scaleOf = ({ domain, log }: AxisSpec): Scale => (log ? scaleLog(domain, [0, 1]) : scaleLinear(domain, [0, 1]))

/** The numbers 1, 2 and 5 of each decade, as short as they can be written. */
const logTicks = ({ domain: [from, to] }: AxisSpec) => {
  const decades = Array.from(
    { length: Math.ceil(Math.log10(to)) - Math.floor(Math.log10(from)) + 1 },
    (_, k) => Math.floor(Math.log10(from)) + k,
  )
  return decades
    .flatMap((decade) =>
      [1, 2, 5].map((digit) => ({
        value: digit * 10 ** decade,
        label: formatNumber(digit * 10 ** decade, { decimals: Math.max(0, -decade) }),
      })),
    )
    .filter(({ value }) => value >= from * (1 - 1e-9) && value <= to * (1 + 1e-9))
}

const ticksOf = (scale: Scale, axis: AxisSpec) => {
  if (axis.log) return logTicks(axis)
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
    ...spec.series.filter((one) => !one.unnamed).map((one) => textWidth(one.name, labelSize, 'semibold')),
    ...(spec.endMarks ?? []).map((one) => textWidth(one.name, labelSize)),
  )
  const yScale = scaleOf(spec.y)
  const yTicks = ticksOf(yScale, spec.y)
  const left = Math.max(6, ...yTicks.map((tick) => textWidth(tick.label, tickSize))) + 2.2
  const area = { x: left, y: 5.2, width: width - left - (names > 0 ? names + 4.6 : 2.5), height: height - 5.2 - 8.2 }
  const x = scaleOf(spec.x).range([area.x, area.x + area.width])
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
