import { line, path, type Scene, type SceneItem } from '../scene'
import type { Cell, DiagramGrid } from './diagram-cells'
import { symbolWidth } from './symbols'
import type { Detail } from './value-sheet'

const lead = 3
const sheetAt = lead + symbolWidth + 1.2
const barRise = 4
const rowGap = 1.8
const edge = 1

/** Where a sheet's top stands against its line: under a line that goes on, beside a symbol that ends it. */
const sheetTop = ({ through, sheet }: Cell, detail: Detail): number => {
  if (through) return detail === 'full' ? 1.2 : -sheet.height - 0.5
  return -Math.min(sheet.height / 2, 3)
}

const symbolRise = 3.2

/** Turns the grid into millimetres: columns as wide as their widest sheet, rows as high as what stands in them. */
export const placeGrid = (grid: DiagramGrid, detail: Detail): Pick<Scene, 'width' | 'height' | 'items'> => {
  const above = new Array<number>(grid.rows).fill(symbolRise)
  const below = new Array<number>(grid.rows).fill(symbolRise)
  const columns = 2 + Math.max(0, ...grid.bars.map((bar) => bar.depth))
  const widths = new Array<number>(columns).fill(sheetAt)
  for (const cell of grid.cells) {
    const top = sheetTop(cell, detail)
    above[cell.row] = Math.max(above[cell.row]!, -top)
    below[cell.row] = Math.max(below[cell.row]!, top + cell.sheet.height)
    widths[cell.depth + 1] = Math.max(widths[cell.depth + 1]!, sheetAt + cell.sheet.width + 3)
  }
  for (const bar of grid.bars) {
    above[bar.firstRow] = Math.max(above[bar.firstRow]!, barRise + bar.label.height)
    widths[bar.depth + 1] = Math.max(widths[bar.depth + 1]!, bar.label.width + 3)
  }
  const xs: number[] = []
  let right = edge - lead
  for (const width of widths) {
    xs.push(right)
    right += width
  }
  const ys: number[] = []
  let y = edge
  for (let row = 0; row < grid.rows; row += 1) {
    y += above[row]!
    ys.push(y)
    y += below[row]! + rowGap
  }
  const columnX = (depth: number) => xs[depth + 1]!
  const wires: SceneItem[] = []
  const symbols: SceneItem[] = []
  for (const cell of grid.cells) {
    const x = columnX(cell.depth)
    const at = ys[cell.row]!
    const before =
      cell.depth < 0
        ? []
        : [
            line([
              [x, at],
              [x + lead, at],
            ]),
          ]
    const after = cell.through
      ? [
          line([
            [x + lead + symbolWidth, at],
            [columnX(cell.depth + 1), at],
          ]),
        ]
      : []
    wires.push(path([...before, ...after].join(''), { stroke: 'ink', width: 0.3 }))
    symbols.push(...cell.symbol(x + lead, at), ...cell.sheet.items(x + sheetAt, at + sheetTop(cell, detail)))
  }
  const bars = grid.bars.flatMap((bar): SceneItem[] => {
    const x = columnX(bar.depth)
    const top = ys[bar.firstRow]! - barRise + 0.6
    return [
      path(
        line([
          [x, top],
          [x, ys[bar.lastRow]! + barRise - 0.6],
        ]),
        { stroke: 'ink', width: 0.9 },
      ),
      ...bar.label.items(x - 0.4, top - 0.4),
    ]
  })
  return {
    width: right + edge,
    height: y - rowGap + edge,
    items: [...wires.filter((one) => one.kind !== 'path' || one.d !== ''), ...symbols, ...bars],
  }
}
