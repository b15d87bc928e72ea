import { Canvas, View } from '@react-pdf/renderer'
import type { ReactElement, ReactNode } from 'react'
import { colour, contentWidth, type PageFormat, watermark } from '../theme'
import { faces } from '../type/faces'
import { measure } from '../type/measure'
import { type Pdf, paintText } from '../type/paint-text'
import type { Paper } from './paper'

/** What every page says about the report it belongs to. */
export interface ChromeWords {
  headLeft: string
  headRight: string
  footLeft: string
  /** `Page 3 of 20`. */
  page: (page: number, of: number) => string
  /** Large words under the text of a draft; null on a final report. */
  watermark: string | null
}

const size = 7.6

const between = (pdf: Pdf, left: string, right: string, y: number, width: number): void => {
  const style = { size, colour: colour('soft') }
  paintText(pdf, left, 0, y, style)
  paintText(pdf, right, width - measure(right, size), y, style)
}

const paintWatermark = (pdf: Pdf, words: string, format: PageFormat): void => {
  const big = 92
  const width = measure(words, big, 'semibold')
  const scale = Math.min(1, (0.86 * Math.hypot(format.width, format.height)) / width)
  const angle = -(Math.atan2(format.height, format.width) * 180) / Math.PI
  pdf
    .save()
    .translate(format.width / 2, format.height / 2)
    .rotate(angle)
    .scale(scale)
  pdf.font(faces().semibold.own, big)
  paintText(pdf, words, -width / 2, 0.33 * big, { size: big, weight: 'semibold', colour: watermark })
  pdf.restore()
}

/** Header, footer and watermark around the content of each page of one format. */
export const pageChrome =
  (paper: Paper, format: PageFormat, words: ChromeWords) =>
  // The number of pages is unknown while the first is laid out; the painted one is final.
  ({
    children,
    pageNumber,
    totalPages,
  }: {
    children?: ReactNode
    pageNumber?: number
    totalPages?: number
  }): ReactElement => {
    const width = contentWidth(format)
    const canvas = (top: number, left: number, w: number, h: number, paint: (pdf: Pdf) => void) => (
      <Canvas
        style={{ position: 'absolute', top, left, width: w, height: h }}
        paint={() => {
          paint(paper.pdf)
          return null
        }}
      />
    )
    return (
      <View
        style={{
          flex: 1,
          paddingTop: format.top,
          paddingBottom: format.bottom,
          paddingLeft: format.left,
          paddingRight: format.right,
        }}
      >
        {canvas(0, 0, format.width, format.height, (pdf) => {
          if (words.watermark !== null) paintWatermark(pdf, words.watermark, format)
        })}
        {canvas(format.top - 34, format.left, width, 20, (pdf) => {
          between(pdf, words.headLeft, words.headRight, 10, width)
          pdf.lineWidth(0.5).strokeColor(colour('rule')).moveTo(0, 16).lineTo(width, 16).stroke()
        })}
        <View style={{ flex: 1 }}>{children}</View>
        {canvas(format.height - format.bottom + 14, format.left, width, 20, (pdf) => {
          pdf.lineWidth(0.5).strokeColor(colour('rule')).moveTo(0, 1).lineTo(width, 1).stroke()
          between(pdf, words.footLeft, words.page(pageNumber ?? 0, totalPages ?? 999), 11, width)
        })}
      </View>
    )
  }
