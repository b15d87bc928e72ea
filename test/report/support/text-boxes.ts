import { pdfTool } from './pdf-tool'

/** A word on a page, in points from its top left. */
export interface Word {
  page: number
  text: string
  left: number
  top: number
  right: number
  bottom: number
}

export interface Sheet {
  width: number
  height: number
  words: readonly Word[]
}

/** Every word of a PDF with its box, page by page. */
export function textBoxes(file: string): readonly Sheet[] {
  const sheets: { width: number; height: number; words: Word[] }[] = []
  for (const line of pdfTool('pdftotext', ['-bbox', file, '-']).split('\n')) {
    const page = line.match(/<page width="([\d.]+)" height="([\d.]+)"/)
    if (page) sheets.push({ width: Number(page[1]), height: Number(page[2]), words: [] })
    const word = line.match(/xMin="([-\d.]+)" yMin="([-\d.]+)" xMax="([-\d.]+)" yMax="([-\d.]+)">(.*)</)
    if (!word) continue
    const [left, top, right, bottom] = word.slice(1, 5).map(Number) as [number, number, number, number]
    sheets.at(-1)?.words.push({ page: sheets.length, text: word[5] ?? '', left, top, right, bottom })
  }
  return sheets
}

/** Pairs of words that cover one another. A box is as tall as its line, so lines may touch by a third of it. */
export function overlaps({ words }: Sheet): readonly [Word, Word][] {
  const pairs: [Word, Word][] = []
  const sorted = words.toSorted((a, b) => a.top - b.top)
  for (const [i, a] of sorted.entries())
    for (let j = i + 1; j < sorted.length; j++) {
      const b = sorted[j]!
      if (b.top >= a.bottom) break
      const across = Math.min(a.right, b.right) - Math.max(a.left, b.left)
      const down = Math.min(a.bottom, b.bottom) - b.top
      if (across > 0.6 && down > 0.35 * Math.min(a.bottom - a.top, b.bottom - b.top)) pairs.push([a, b])
    }
  return pairs
}
