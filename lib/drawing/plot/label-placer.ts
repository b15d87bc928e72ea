import { type Box, overlap, textBox } from '../box'
import type { TextItem } from '../scene'

type Point = readonly [number, number]

const step = 0.5
const clearance = 0.7

const densely = (points: readonly Point[]): Point[] =>
  points.flatMap((b, i) => {
    const a = points[i - 1]
    if (!a) return [b]
    const count = Math.max(1, Math.ceil(Math.hypot(b[0] - a[0], b[1] - a[1]) / step))
    return Array.from({ length: count }, (_, k): Point => {
      const t = (k + 1) / count
      return [a[0] + t * (b[0] - a[0]), a[1] + t * (b[1] - a[1])]
    })
  })

/** Finds room for labels among curves and the labels placed before. */
export class LabelPlacer {
  readonly #area: Box
  readonly #curve: Point[] = []
  readonly #taken: Box[] = []

  constructor(area: Box) {
    this.#area = area
  }

  avoidCurve(points: readonly Point[]): void {
    this.#curve.push(...densely(points))
  }

  avoidBox(box: Box): void {
    this.#taken.push(box)
  }

  /** The first candidate that touches nothing, else the one that touches least; one that would cover a label or leave the area is never taken. Null when every candidate would. */
  place(candidates: readonly TextItem[]): TextItem | null {
    let best: { item: TextItem; cost: number; room: Box } | null = null
    for (const item of candidates) {
      const tight = textBox(item)
      const room = {
        x: tight.x - clearance,
        y: tight.y - clearance,
        width: tight.width + 2 * clearance,
        height: tight.height + 2 * clearance,
      }
      if (!this.#free(room)) continue
      const cost = this.#touched(room)
      if (!best || cost < best.cost) best = { item, cost, room }
      if (cost === 0) break
    }
    if (!best) return null
    this.#taken.push(best.room)
    return best.item
  }

  #free(box: Box): boolean {
    const area = this.#area
    const within =
      box.x >= area.x &&
      box.y >= area.y &&
      box.x + box.width <= area.x + area.width &&
      box.y + box.height <= area.y + area.height
    return within && this.#taken.every((other) => overlap(box, other) === 0)
  }

  #touched(box: Box): number {
    let count = 0
    for (const [x, y] of this.#curve) {
      if (x >= box.x && x <= box.x + box.width && y >= box.y && y <= box.y + box.height) count += 1
    }
    return count
  }
}
