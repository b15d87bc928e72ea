import type { CaseRecord } from '@/lib/study/document/case-records'
import type { SupplyRecord } from '@/lib/study/document/network-records'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { busLabel } from './bus-label'
import type { Bar, Cell, DiagramGrid } from './diagram-cells'
import type { Branch, Device, Feeder, TreeBus } from './network-tree'
import {
  capacitorSymbol,
  comingSymbol,
  generatorSymbol,
  lineSymbol,
  loadSymbol,
  motorSymbol,
  sourceSymbol,
  tieSymbol,
  transformerSymbol,
} from './symbols'
import { branchLines, deviceLines, supplyLines, type ValueLines } from './value-lines'
import { type Detail, valueSheet } from './value-sheet'

export interface GridContext {
  document: StudyDocument
  supply: SupplyRecord
  one: CaseRecord | undefined
  detail: Detail
}

const branchSymbol = (branch: Branch) => (x: number, y: number) =>
  branch.kind === 'transformer' ? transformerSymbol(x, y) : lineSymbol(x, y, branch.record.kind)

const deviceSymbol =
  ({ document, one }: GridContext, device: Device) =>
  (x: number, y: number) => {
    if (device.kind === 'load') return loadSymbol(x, y)
    if (device.kind === 'capacitor') return capacitorSymbol(x, y)
    const schedule = document.schedules.find((each) => each.id === one?.schedule)
    return motorSymbol(
      x,
      y,
      schedule?.starts.some((start) => start.motor === device.record.id) ?? false,
      device.record.role === 'generator' ? 'G' : 'M',
    )
  }

/** One sheet of a diagram: the trees on it, and the buses whose part is drawn apart. */
export interface DiagramSheet {
  trees: readonly TreeBus[]
  apart: ReadonlySet<string>
  /** Bus that this sheet goes on from; null on the first sheet, which begins at the source. */
  from: string | null
}

/** Gives every feeder a row of its own, so that lines run level and cannot cross. */
export const diagramGrid = (context: GridContext, { trees, apart, from }: DiagramSheet): DiagramGrid => {
  const { document, supply, one, detail } = context
  const cells: Cell[] = []
  const bars: Bar[] = []
  const add = (cell: Omit<Cell, 'sheet'>, words: ValueLines) =>
    cells.push({ ...cell, sheet: valueSheet(words, detail) })

  /** Lays a feeder from a row on and gives the row after it. */
  const layFeeder = (feeder: Feeder, depth: number, row: number): number => {
    if (feeder.kind === 'device') {
      const words = deviceLines(document, feeder.device, one)
      add({ depth, row, symbol: deviceSymbol(context, feeder.device), through: false }, words)
      return row + 1
    }
    if (feeder.kind === 'tie') {
      const { tag, lines } = branchLines(feeder.branch)
      const told = feeder.told ? [`see ${feeder.to.tag}`] : lines
      add({ depth, row, symbol: tieSymbol, through: false }, { tag: `${tag} to ${feeder.to.tag}`, lines: told })
      return row + 1
    }
    const { branches, child } = feeder
    const elsewhere = apart.has(child.bus.id)
    for (const [i, branch] of branches.entries()) {
      const { tag, lines } = branchLines(branch)
      const words = elsewhere
        ? { tag: `${tag} to ${child.bus.tag}`, lines: ['drawn apart, on another sheet', ...lines] }
        : { tag, lines }
      add({ depth, row: row + i, symbol: elsewhere ? tieSymbol : branchSymbol(branch), through: !elsewhere }, words)
    }
    const after = row + branches.length
    return elsewhere ? after : Math.max(after, layBus(child, depth + 1, row, branches.length))
  }

  const layBus = (bus: TreeBus, depth: number, row: number, incoming: number, note = ''): number => {
    let next = row
    let lastRow = row + incoming - 1
    for (const feeder of bus.feeders) {
      lastRow = Math.max(lastRow, next + (feeder.kind === 'branch' ? feeder.branches.length - 1 : 0))
      next = layFeeder(feeder, depth, next)
    }
    bars.push({ depth, firstRow: row, lastRow, label: busLabel(bus.bus, detail, note) })
    return Math.max(next, row + incoming)
  }

  const start = { depth: -1, row: 0, through: true }
  if (from === null)
    add({ ...start, symbol: supply.level.form === 'generator' ? generatorSymbol : sourceSymbol }, supplyLines(supply))
  else add({ ...start, symbol: comingSymbol }, { tag: `from ${from}`, lines: [] })
  let rows = 0
  for (const [i, tree] of trees.entries()) rows = layBus(tree, 0, rows, 1, i === 0 ? '' : 'no way to the supply')
  return { cells, bars, rows }
}
