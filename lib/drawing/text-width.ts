import { regularWidths, semiboldWidths } from './source-sans-widths'

const tableOf = (rows: readonly (readonly [number, string])[]) =>
  new Map(rows.flatMap(([width, characters]) => [...characters].map((character) => [character, width] as const)))

const tables = { regular: tableOf(regularWidths), semibold: tableOf(semiboldWidths) }

/** Width for a character that the family lacks; the fallback family is wide. */
const otherwise = 780

/** Width of one line of text in the unit of `size`. */
export const textWidth = (text: string, size: number, weight: 'regular' | 'semibold' = 'regular'): number => {
  const table = tables[weight]
  let sum = 0
  for (const character of text) sum += table.get(character) ?? otherwise
  return (sum * size) / 1000
}

/** Height of a capital and depth below the baseline, in parts of the size. */
export const capHeight = 0.66
export const descent = 0.22
