import type { ReactElement } from 'react'
import { packScenes } from '@/lib/drawing/pack-scenes'
import type { Scene } from '@/lib/drawing/scene'
import { singleLineSheets } from '@/lib/drawing/single-line-diagram'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { block } from '../paper/block'
import { sceneScale, scenesBlock } from '../paper/scene-pdf'
import { caption, paragraph, typedText } from '../paper/text-block'
import { chapter, type ReportContext, subsection } from '../report-context'
import { contentHeight, contentWidth, type PageFormat, type PageFormats, small } from '../theme'
import type { Section } from './section'

/** Description of the system as typed. */
export const system: Section = (context) => {
  const { paper, input, words, width } = context
  const { system: say } = words.records
  const { texts } = input.document
  return [
    chapter(context, 'system', say.title),
    ...(texts.system.trim() === ''
      ? paragraph(paper, say.noText, { width, ink: 'soft' })
      : typedText(paper, texts.system, { width })),
  ]
}

const captionHeight = 46
/** Between two parts of the diagram on one sheet, mm. */
const gap = 14
/** Type of the diagram on paper, in points in a millimetre of the scene, that is still read without effort. */
const legible = 2.2

export interface DiagramPage {
  format: PageFormat
  content: readonly ReactElement[]
}

const room = (format: PageFormat) => ({ width: contentWidth(format), height: contentHeight(format) - captionHeight })

const fits = (scenes: readonly Scene[], format: PageFormat): boolean => {
  const { width, height } = room(format)
  return scenes.every((scene) => sceneScale(scene, width, height) >= legible)
}

/** The plant on one page where it is legible there, else on as few as its boards can be parted into. */
const chosen = (
  document: StudyDocument,
  { landscape, largeLandscape }: PageFormats,
): { format: PageFormat; scenes: readonly Scene[] } => {
  for (const mostRows of [Number.POSITIVE_INFINITY, 30, 24, 19, 15, 12, 10]) {
    const full = singleLineSheets(document, { mostRows })
    for (const format of [landscape, largeLandscape]) if (fits(full, format)) return { format, scenes: full }
    const brief = singleLineSheets(document, { mostRows, detail: 'brief' })
    if (fits(brief, largeLandscape)) return { format: largeLandscape, scenes: brief }
  }
  return { format: largeLandscape, scenes: singleLineSheets(document, { mostRows: 10, detail: 'brief' }) }
}

/** The single-line diagram, a page a sheet. */
export const diagramPages = (context: ReportContext): readonly DiagramPage[] => {
  const { paper, input, words, formats } = context
  const { system: say } = words.records
  const { format, scenes } = chosen(input.document, formats)
  const { width, height } = room(format)
  const title = subsection({ ...context, width }, 'diagram', say.diagram)
  const first = input.document.plant.supplies[0]
  if (!first || scenes.length === 0)
    return [{ format: formats.landscape, content: [title, ...paragraph(paper, say.noDiagram, { width })] }]
  const scale = Math.min(...scenes.map((scene) => sceneScale(scene, width, height)))
  const sheet = { width: width / scale, height: height / scale }
  const sheets = [
    scenes.slice(0, 1).map((scene) => ({ scene, x: 0, y: 0 })),
    ...packScenes(scenes.slice(1), sheet, gap),
  ]
  return sheets.map((placed, i) => {
    const used = Math.max(...placed.map(({ scene, y }) => y + scene.height)) * scale
    const space = Math.min(30, Math.max(0, (height - used) / 3)) + 1
    return {
      format,
      content: [
        ...(i === 0 ? [title] : caption(paper, say.goesOn(i + 1, sheets.length), { width })),
        ...(i === 0 ? paragraph(paper, say.diagramNote(first.tag), { width, ...small, ink: 'soft', below: 4 }) : []),
        block(paper, { width, height: space }, () => undefined),
        scenesBlock(paper, placed, scale, { width, height: used }),
      ],
    }
  })
}
