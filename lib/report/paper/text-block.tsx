import type { ReactElement } from 'react'
import type { Ink } from '@/lib/drawing/ink'
import { body, colour } from '../theme'
import { paintLine } from '../type/paint-text'
import { type Line, plain, type Run, rich, wrapRuns } from '../type/rich-text'
import { block } from './block'
import type { Paper } from './paper'

export interface TextOptions {
  width: number
  size?: number
  leading?: number
  ink?: Ink
  above?: number
  below?: number
  indent?: number
  keep?: number
}

/** Lines are painted in groups, so that a paragraph can go on over the page but leaves no line alone. */
const groups = (lines: readonly Line[]): readonly (readonly Line[])[] => {
  if (lines.length <= 4) return [lines]
  const out: Line[][] = [[...lines.slice(0, 2)]]
  for (let i = 2; i < lines.length - 2; i += 1) out.push([lines[i]!])
  out.push([...lines.slice(-2)])
  return out
}

const linesBlock = (
  paper: Paper,
  lines: readonly Line[],
  options: TextOptions & { first: boolean; last: boolean },
): ReactElement => {
  const { width, size = body.size, leading = body.leading, ink = 'ink', indent = 0 } = options
  const baseline = leading / 2 + 0.33 * size
  return block(
    paper,
    {
      width,
      height: lines.length * leading,
      above: options.first ? options.above : 0,
      below: options.last ? (options.below ?? 5) : 0,
      keep: options.keep,
    },
    (pdf) => {
      for (const [i, line] of lines.entries())
        paintLine(pdf, line, indent, i * leading + baseline, { size, colour: colour(ink) })
    },
  )
}

const ofRuns = (paper: Paper, runs: readonly Run[], options: TextOptions): readonly ReactElement[] => {
  const lines = wrapRuns(runs, options.width - (options.indent ?? 0), options.size ?? body.size)
  const parts = groups(lines)
  return parts.map((part, i) => linesBlock(paper, part, { ...options, first: i === 0, last: i === parts.length - 1 }))
}

/** A paragraph of our own wording, with its markup. */
export const paragraph = (paper: Paper, words: string, options: TextOptions): readonly ReactElement[] =>
  ofRuns(paper, rich(words), options)

/** Text that an engineer typed, printed as it stands: blank lines part the paragraphs. */
export const typedText = (paper: Paper, text: string, options: TextOptions): readonly ReactElement[] =>
  text
    .split(/\n\s*\n/)
    .filter((part) => part.trim() !== '')
    .flatMap((part) => ofRuns(paper, plain(part.trim()), options))

/** A list of sentences, each behind a dash. */
export const list = (paper: Paper, sentences: readonly string[], options: TextOptions): readonly ReactElement[] => {
  const { width, size = body.size, leading = body.leading, ink = 'ink' } = options
  const indent = 11
  const baseline = leading / 2 + 0.33 * size
  return sentences.map((sentence, i) => {
    const lines = wrapRuns(rich(sentence), width - indent, size)
    const last = i === sentences.length - 1
    return block(paper, { width, height: lines.length * leading, below: last ? (options.below ?? 5) : 2 }, (pdf) => {
      paintLine(pdf, wrapRuns(plain('–'), indent, size)[0]!, 1, baseline, { size, colour: colour(ink) })
      for (const [k, line] of lines.entries())
        paintLine(pdf, line, indent, k * leading + baseline, { size, colour: colour(ink) })
    })
  })
}

/** A line in strong type over a table or under a figure; typed tags in it are never read as markup. */
export const caption = (paper: Paper, text: string, options: TextOptions): readonly ReactElement[] =>
  ofRuns(paper, plain(text, 'semibold'), { size: 8.3, leading: 11, below: 3, ...options })
