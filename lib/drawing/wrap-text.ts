import { textWidth } from './text-width'

type Weight = 'regular' | 'semibold'

/** A word too long for the line in pieces that fit. */
const pieces = (word: string, fits: (text: string) => boolean): string[] => {
  if (fits(word)) return [word]
  const out: string[] = []
  let piece = ''
  for (const character of word) {
    if (piece !== '' && !fits(piece + character)) {
      out.push(piece)
      piece = ''
    }
    piece += character
  }
  return piece === '' ? out : [...out, piece]
}

/** Text broken at spaces into lines no wider than `width`; a longer word is broken where it must be. Line breaks typed by the author stay. */
export const wrapText = (text: string, width: number, size: number, weight: Weight = 'regular'): readonly string[] => {
  const fits = (line: string) => textWidth(line, size, weight) <= width
  return text.split('\n').flatMap((paragraph) => {
    const lines: string[] = []
    let line: string | null = null
    for (const word of paragraph.split(' ').flatMap((one) => pieces(one, fits))) {
      const longer: string = line === null ? word : `${line} ${word}`
      if (line !== null && !fits(longer)) {
        lines.push(line)
        line = word
      } else line = longer
    }
    return [...lines, line ?? '']
  })
}
