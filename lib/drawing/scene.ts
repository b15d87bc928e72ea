import type { Ink } from './ink'

/** A line or area: SVG path data in millimetres, coordinates rounded to 0.01 mm. */
export interface PathItem {
  kind: 'path'
  d: string
  stroke: Ink | null
  /** Line width in mm. */
  width: number
  /** Lengths of dash and gap in mm; empty for a solid line. */
  dash: readonly number[]
  fill: Ink | null
}

export interface RectItem {
  kind: 'rect'
  x: number
  y: number
  width: number
  height: number
  fill: Ink | null
  stroke: Ink | null
  strokeWidth: number
}

/** One line of text; `x`, `y` is the anchor on the baseline. */
export interface TextItem {
  kind: 'text'
  x: number
  y: number
  text: string
  /** Type size in mm (1 pt is 0.3528 mm). */
  size: number
  ink: Ink
  anchor: 'start' | 'middle' | 'end'
  weight: 'regular' | 'semibold'
}

export type SceneItem = PathItem | RectItem | TextItem

/** A figure made once for screen, file and paper: millimetres, origin at the top left, items painted in order. */
export interface Scene {
  width: number
  height: number
  title: string
  /** What a reader who cannot see the figure needs to know. */
  description: string
  items: readonly SceneItem[]
}

/** A coordinate rounded to 0.01 mm, so that differences in the last place of a float never reach a file. */
export const mm = (value: number): number => Math.round(value * 100) / 100 + 0

export const line = (points: readonly (readonly [number, number])[], closed = false): string =>
  points.map(([x, y], i) => `${i === 0 ? 'M' : 'L'}${mm(x)} ${mm(y)}`).join('') + (closed ? 'Z' : '')

export const path = (d: string, style: Partial<Omit<PathItem, 'kind' | 'd'>>): PathItem => ({
  kind: 'path',
  d,
  stroke: null,
  width: 0.2,
  dash: [],
  fill: null,
  ...style,
})

export const rect = (
  box: { x: number; y: number; width: number; height: number },
  style: Partial<Pick<RectItem, 'fill' | 'stroke' | 'strokeWidth'>>,
): RectItem => ({
  kind: 'rect',
  x: mm(box.x),
  y: mm(box.y),
  width: mm(box.width),
  height: mm(box.height),
  fill: null,
  stroke: null,
  strokeWidth: 0.2,
  ...style,
})

export const text = (
  x: number,
  y: number,
  words: string,
  style: Partial<Omit<TextItem, 'kind' | 'x' | 'y' | 'text'>> = {},
): TextItem => ({
  kind: 'text',
  x: mm(x),
  y: mm(y),
  text: words,
  size: 2.5,
  ink: 'ink',
  anchor: 'start',
  weight: 'regular',
  ...style,
})
