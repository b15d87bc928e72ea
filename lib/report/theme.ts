import { type Ink, lightInk } from '@/lib/drawing/ink'

/** Points in a millimetre. */
export const pt = 72 / 25.4

export interface PageFormat {
  width: number
  height: number
  left: number
  right: number
  top: number
  bottom: number
}

/** Upright pages with room for binding at the left, wide pages for diagrams, and the next size up for large ones. */
export interface PageFormats {
  portrait: PageFormat
  landscape: PageFormat
  largeLandscape: PageFormat
}

const inch = 72
const sizes = {
  A4: { short: 210 * pt, long: 297 * pt, longest: 420 * pt },
  Letter: { short: 8.5 * inch, long: 11 * inch, longest: 17 * inch },
}

/** The pages of a report on one kind of paper; header and footer stand inside the margins at top and bottom. */
export const pageFormats = (paper: keyof typeof sizes): PageFormats => {
  const { short, long, longest } = sizes[paper]
  const wide = { left: 18 * pt, right: 18 * pt, top: 23 * pt, bottom: 19 * pt }
  return {
    portrait: { width: short, height: long, left: 21 * pt, right: 15 * pt, top: 25 * pt, bottom: 21 * pt },
    landscape: { width: long, height: short, ...wide },
    largeLandscape: { width: longest, height: long, ...wide },
  }
}

export const contentWidth = (format: PageFormat): number => format.width - format.left - format.right
export const contentHeight = (format: PageFormat): number => format.height - format.top - format.bottom

export const colour = (ink: Ink): string => lightInk[ink]
/** Colours that only paper needs. */
export const band = '#EEF1F0'
export const zebra = '#F8F8F5'
export const watermark = '#EFE9DA'

export const body = { size: 9.5, leading: 13 }
export const small = { size: 8.3, leading: 11 }
export const dense = { size: 7.6, leading: 9.8 }
