import { describe, expect, it } from 'vitest'
import { packScenes } from '@/lib/drawing/pack-scenes'
import type { Scene } from '@/lib/drawing/scene'

const scene = (width: number, height: number): Scene => ({ width, height, title: '', description: '', items: [] })
const placed = (scenes: readonly Scene[], width: number, height: number) =>
  packScenes(scenes, { width, height }, 10).map((sheet) => sheet.map(({ x, y }) => [x, y]))

describe('diagrams on common sheets', () => {
  it('stand side by side, then below, then on the next sheet', () => {
    const parts = Array.from({ length: 5 }, () => scene(45, 30))
    expect(placed(parts, 100, 70)).toEqual([
      [
        [0, 0],
        [55, 0],
        [0, 40],
        [55, 40],
      ],
      [[0, 0]],
    ])
  })

  it('begin the next row below the tallest of a row', () => {
    expect(placed([scene(40, 50), scene(40, 20), scene(90, 20)], 100, 100)).toEqual([
      [
        [0, 0],
        [50, 0],
        [0, 60],
      ],
    ])
  })

  it('have a sheet of their own when larger than it', () => {
    expect(placed([scene(20, 20), scene(300, 200), scene(20, 20)], 100, 70)).toEqual([[[0, 0]], [[0, 0]], [[0, 0]]])
  })

  it('never overlap', () => {
    const parts = Array.from({ length: 40 }, (_, i) => scene(15 + ((i * 37) % 50), 10 + ((i * 23) % 40)))
    for (const sheet of packScenes(parts, { width: 120, height: 90 }, 5))
      for (const [i, a] of sheet.entries())
        for (const b of sheet.slice(i + 1)) {
          const beside = a.x + a.scene.width <= b.x || b.x + b.scene.width <= a.x
          const below = a.y + a.scene.height <= b.y || b.y + b.scene.height <= a.y
          expect(beside || below).toBe(true)
        }
  })

  it('are none when there is nothing to draw', () => expect(placed([], 100, 100)).toEqual([]))
})
