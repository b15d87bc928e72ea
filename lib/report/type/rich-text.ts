import type { Weight } from './faces'
import { measure } from './measure'
import { printable } from './printable'

/** A stretch of text in one style; `rise` in parts of the size. */
export interface Run {
  text: string
  weight: Weight
  scale: number
  rise: number
}

/** A run with its place from the start of the line, in points. */
export interface PlacedRun extends Run {
  x: number
}

export interface Line {
  runs: readonly PlacedRun[]
  width: number
}

const script = 0.7
const marks = /\*\*(.+?)\*\*|_\{(.+?)\}|\^\{(.+?)\}/gu

/** Plain text as one run; what people typed is never read as markup. */
export const plain = (text: string, weight: Weight = 'regular'): readonly Run[] => [
  { text: printable(text), weight, scale: 1, rise: 0 },
]

/** Wording with `**strong**`, `_{below}` and `^{above}` as runs. */
export const rich = (text: string, weight: Weight = 'regular'): readonly Run[] => {
  const clean = printable(text)
  const runs: Run[] = []
  let from = 0
  const push = (part: string, style: Partial<Run> = {}) => {
    if (part !== '') runs.push({ text: part, weight, scale: 1, rise: 0, ...style })
  }
  for (const match of clean.matchAll(marks)) {
    push(clean.slice(from, match.index))
    const [whole, strong, below, above] = match
    if (strong !== undefined) for (const run of rich(strong, 'semibold')) runs.push(run)
    else if (below !== undefined) push(below, { scale: script, rise: -0.16 })
    else push(above ?? '', { scale: script, rise: 0.34 })
    from = match.index + whole.length
  }
  push(clean.slice(from))
  return runs
}

const widthOf = (run: Run, text: string, size: number): number => measure(text, size * run.scale, run.weight)

/** A word with what belongs to it: pieces of several runs without a space between them. */
type Word = readonly Run[]

const wordsOf = (runs: readonly Run[]): { word: Word; breakAfter: boolean }[] => {
  const words: { word: Word; breakAfter: boolean }[] = []
  let word: Run[] = []
  const close = (breakAfter: boolean) => {
    if (word.length > 0 || breakAfter) words.push({ word, breakAfter })
    word = []
  }
  for (const run of runs) {
    for (const [i, paragraph] of run.text.split('\n').entries()) {
      if (i > 0) close(true)
      for (const [k, part] of paragraph.split(' ').entries()) {
        if (k > 0) close(false)
        if (part !== '') word.push({ ...run, text: part })
      }
    }
  }
  close(false)
  return words
}

/** A word wider than the line, cut where it must be. */
const cut = (word: Word, width: number, size: number): Word[] => {
  const total = word.reduce((sum, run) => sum + widthOf(run, run.text, size), 0)
  if (total <= width) return [word]
  const out: Run[][] = [[]]
  let used = 0
  for (const run of word) {
    for (const character of run.text) {
      const next = widthOf(run, character, size)
      if (used + next > width && used > 0) {
        out.push([])
        used = 0
      }
      const current = out.at(-1)!
      const last = current.at(-1)
      if (last && last.weight === run.weight && last.rise === run.rise) last.text += character
      else current.push({ ...run, text: character })
      used += next
    }
  }
  return out
}

const sameStyle = (a: Run, b: Run): boolean => a.weight === b.weight && a.scale === b.scale && a.rise === b.rise

/** Neighbouring words of one style become one run again, so that a line is painted in few strokes. */
const placed = (words: readonly Word[], size: number): Line => {
  const joined: Run[] = []
  for (const [i, word] of words.entries()) {
    for (const [k, run] of word.entries()) {
      const space = i > 0 && k === 0 ? ' ' : ''
      const last = joined.at(-1)
      if (last && sameStyle(last, run)) last.text += space + run.text
      else if (space && last && last.rise === 0) {
        last.text += space
        joined.push({ ...run })
      } else joined.push({ ...run, text: space + run.text })
    }
  }
  let x = 0
  const runs = joined.map((run) => {
    const at = x
    x += widthOf(run, run.text, size)
    return { ...run, x: at }
  })
  return { runs, width: x }
}

/** Runs broken at spaces into lines no wider than `width`, in points. */
export const wrapRuns = (runs: readonly Run[], width: number, size: number): readonly Line[] => {
  const lines: Line[] = []
  let words: Word[] = []
  let used = 0
  const space = measure(' ', size)
  const close = () => {
    lines.push(placed(words, size))
    words = []
    used = 0
  }
  for (const { word, breakAfter } of wordsOf(runs)) {
    for (const piece of cut(word, width, size)) {
      const length = piece.reduce((sum, run) => sum + widthOf(run, run.text, size), 0)
      if (words.length > 0 && used + space + length > width + 1e-6) close()
      used += (words.length > 0 ? space : 0) + length
      words.push(piece)
    }
    if (breakAfter) close()
  }
  if (words.length > 0 || lines.length === 0) close()
  return lines
}
