import type { Box } from '../box'

type Point = readonly [number, number]

/** Part of the segment a-b inside the box, by parameters along it (Liang-Barsky); null when none is. */
const inside = (a: Point, b: Point, box: Box): readonly [number, number] | null => {
  let enter = 0
  let leave = 1
  const sides = [
    [a[0] - b[0], a[0] - box.x],
    [b[0] - a[0], box.x + box.width - a[0]],
    [a[1] - b[1], a[1] - box.y],
    [b[1] - a[1], box.y + box.height - a[1]],
  ] as const
  for (const [slope, room] of sides) {
    if (slope === 0) {
      if (room < 0) return null
      continue
    }
    const at = room / slope
    if (slope < 0) enter = Math.max(enter, at)
    else leave = Math.min(leave, at)
  }
  return enter <= leave ? [enter, leave] : null
}

/** The parts of a polyline that lie inside the box, so that no figure needs a clip path. */
export const clipPolyline = (points: readonly Point[], box: Box): readonly (readonly Point[])[] => {
  const parts: Point[][] = []
  let current: Point[] | null = null
  for (let i = 1; i < points.length; i += 1) {
    const a = points[i - 1]!
    const b = points[i]!
    const range = inside(a, b, box)
    if (!range) {
      current = null
      continue
    }
    const at = (t: number): Point => [a[0] + t * (b[0] - a[0]), a[1] + t * (b[1] - a[1])]
    if (!current || range[0] > 0) {
      current = [at(range[0])]
      parts.push(current)
    }
    current.push(at(range[1]))
    if (range[1] < 1) current = null
  }
  return parts
}
