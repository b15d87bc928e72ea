import { type Box, overlap, textBox } from '@/lib/drawing/box'
import type { Scene, TextItem } from '@/lib/drawing/scene'

export const texts = (scene: Scene): readonly TextItem[] => scene.items.filter((item) => item.kind === 'text')

/** Pairs of texts whose rooms overlap by more than a hair. */
export const overlappingTexts = (scene: Scene): readonly string[] => {
  const all = texts(scene).map((item) => ({ item, box: textBox(item) }))
  return all.flatMap(({ item, box }, i) =>
    all
      .slice(i + 1)
      .filter((other) => overlap(box, other.box) > 0.02)
      .map((other) => `${item.text} × ${other.item.text}`),
  )
}

/** Texts that stand out of the sheet. */
export const textsOutside = (scene: Scene): readonly string[] =>
  texts(scene)
    .filter((item) => {
      const box = textBox(item)
      return (
        box.x < -0.01 ||
        box.y < -0.01 ||
        box.x + box.width > scene.width + 0.3 ||
        box.y + box.height > scene.height + 0.3
      )
    })
    .map((item) => item.text)

export interface Segment {
  x1: number
  y1: number
  x2: number
  y2: number
  width: number
}

/** Straight stretches of all stroked paths without fill. */
export const segments = (scene: Scene): readonly Segment[] =>
  scene.items.flatMap((item) => {
    if (item.kind !== 'path' || item.stroke === null || /[a-z]/.test(item.d)) return []
    const points = [...item.d.matchAll(/([ML])(-?[\d.]+) (-?[\d.]+)/g)].map(([, letter, x, y]) => ({
      letter,
      x: Number(x),
      y: Number(y),
    }))
    return points.flatMap((b, i) => {
      const a = points[i - 1]
      return a && b.letter === 'L' ? [{ x1: a.x, y1: a.y, x2: b.x, y2: b.y, width: item.width }] : []
    })
  })

/** Whether a level line runs through a box, not only along its edge. */
export const runsThrough = ({ x1, y1, x2, y2 }: Segment, box: Box): boolean => {
  const [left, right] = [Math.min(x1, x2), Math.max(x1, x2)]
  const [top, bottom] = [Math.min(y1, y2), Math.max(y1, y2)]
  const inset = 0.05
  return (
    right > box.x + inset &&
    left < box.x + box.width - inset &&
    bottom > box.y + inset &&
    top < box.y + box.height - inset
  )
}
