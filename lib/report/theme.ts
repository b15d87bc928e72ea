import { type Ink, lightInk } from '@/lib/drawing/ink'

/** Points in a millimetre. */
export const pt = 72 / 25.4

const a4 = { width: 210 * pt, height: 297 * pt }

export interface PageFormat {
  width: number
  height: number
  left: number
  right: number
  top: number
  bottom: number
}

/** A4 with room for binding at the left; header and footer stand inside the margins at top and bottom. */
export const portrait: PageFormat = { ...a4, left: 21 * pt, right: 15 * pt, top: 25 * pt, bottom: 21 * pt }

export const landscape: PageFormat = {
  width: a4.height,
  height: a4.width,
  left: 18 * pt,
  right: 18 * pt,
  top: 23 * pt,
  bottom: 19 * pt,
}

export const largeLandscape: PageFormat = { ...landscape, width: 420 * pt, height: 297 * pt }

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
