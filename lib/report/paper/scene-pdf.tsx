import type { ReactElement } from 'react'
import type { PlacedScene } from '@/lib/drawing/pack-scenes'
import type { Scene, SceneItem } from '@/lib/drawing/scene'
import { colour, pt } from '../theme'
import { measure } from '../type/measure'
import { type Pdf, paintText } from '../type/paint-text'
import { type BlockOptions, block } from './block'
import type { Paper } from './paper'

/** Paints one item in millimetres; dashes and widths are in the scene's own unit too. */
const paintItem = (pdf: Pdf, item: SceneItem): void => {
  switch (item.kind) {
    case 'text': {
      const length = measure(item.text, item.size, item.weight)
      const before = item.anchor === 'start' ? 0 : item.anchor === 'middle' ? length / 2 : length
      paintText(pdf, item.text, item.x - before, item.y, {
        size: item.size,
        weight: item.weight,
        colour: colour(item.ink),
      })
      return
    }
    case 'rect': {
      if (item.fill) pdf.rect(item.x, item.y, item.width, item.height).fill(colour(item.fill))
      if (item.stroke)
        pdf.lineWidth(item.strokeWidth).rect(item.x, item.y, item.width, item.height).stroke(colour(item.stroke))
      return
    }
    case 'path': {
      if (item.fill) pdf.path(item.d).fill(colour(item.fill))
      if (!item.stroke) return
      pdf.lineWidth(item.width).lineJoin('round')
      if (item.dash.length > 0) pdf.dash([...item.dash])
      pdf.path(item.d).stroke(colour(item.stroke))
      if (item.dash.length > 0) pdf.undash()
    }
  }
}

/** The scale at which a scene fills the width, never larger than it was drawn. */
export const sceneScale = (scene: Scene, width: number, height = Number.POSITIVE_INFINITY): number =>
  Math.min(pt, width / scene.width, height / scene.height)

/** A scene on paper; the same items as on the screen. */
export const sceneBlock = (
  paper: Paper,
  scene: Scene,
  options: Omit<BlockOptions, 'height'> & { height?: number },
): ReactElement => {
  const scale = sceneScale(scene, options.width, options.height)
  return block(paper, { ...options, height: scene.height * scale }, (pdf) => {
    pdf.save().scale(scale)
    for (const item of scene.items) paintItem(pdf, item)
    pdf.restore()
  })
}

/** Several scenes at one scale, each at its place. */
export const scenesBlock = (
  paper: Paper,
  placed: readonly PlacedScene[],
  scale: number,
  options: BlockOptions,
): ReactElement =>
  block(paper, options, (pdf) => {
    for (const { scene, x, y } of placed) {
      pdf.save().scale(scale).translate(x, y)
      for (const item of scene.items) paintItem(pdf, item)
      pdf.restore()
    }
  })
