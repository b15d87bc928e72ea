import type { ReactElement } from 'react'
import { singleLineDiagram } from '@/lib/drawing/single-line-diagram'
import { block } from '../paper/block'
import { sceneBlock, sceneScale } from '../paper/scene-pdf'
import { paragraph, typedText } from '../paper/text-block'
import { chapter, type ReportContext, subsection } from '../report-context'
import { contentHeight, contentWidth, landscape, largeLandscape, type PageFormat, small } from '../theme'
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

export interface DiagramPage {
  format: PageFormat
  content: readonly ReactElement[]
}

/** The single-line diagram on a page of its own, as large as it can be; a plant too large for full sheets gets brief ones on a larger page. */
export const diagramPage = (context: ReportContext): DiagramPage => {
  const { paper, input, words } = context
  const { system: say } = words.records
  const first = input.document.plant.supplies[0]
  const tried = [
    { format: landscape, detail: 'full' as const, least: 2.2 },
    { format: largeLandscape, detail: 'full' as const, least: 2.2 },
    { format: largeLandscape, detail: 'brief' as const, least: 0 },
  ]
  for (const { format, detail, least } of tried) {
    const scene = singleLineDiagram(input.document, { detail })
    const width = contentWidth(format)
    const title = () => subsection({ ...context, width }, 'diagram', say.diagram)
    if (!scene || !first)
      return { format: landscape, content: [title(), ...paragraph(paper, say.noDiagram, { width })] }
    const height = contentHeight(format) - captionHeight
    const scale = sceneScale(scene, width, height)
    if (scale < least) continue
    const note = paragraph(paper, say.diagramNote(first.tag), { width, ...small, ink: 'soft', below: 4 })
    const rest = Math.max(0, (height - scene.height * scale) / 3)
    const space = block(paper, { width, height: Math.min(rest, 30) + 1 }, () => undefined)
    return { format, content: [title(), ...note, space, sceneBlock(paper, scene, { width, height })] }
  }
  throw new Error('The last attempt accepts every scale.')
}
