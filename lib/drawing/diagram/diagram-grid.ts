import type { CaseRecord } from '@/lib/study/document/case-records'
import type { SupplyRecord } from '@/lib/study/document/network-records'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { busLabel } from './bus-label'
import type { Bar, Cell, DiagramGrid } from './diagram-cells'
import { type Branch, type Device, networkTrees, type TreeBus } from './network-tree'
import {
  capacitorSymbol,
  lineSymbol,
  loadSymbol,
  motorSymbol,
  sourceSymbol,
  tieSymbol,
  transformerSymbol,
} from './symbols'
import { branchLines, deviceLines, supplyLines } from './value-lines'
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
    return motorSymbol(x, y, schedule?.starts.some((start) => start.motor === device.record.id) ?? false)
  }

/** Gives every feeder a row of its own, so that lines run level and cannot cross. */
export const diagramGrid = (context: GridContext): DiagramGrid => {
  const { document, supply, one, detail } = context
  const cells: Cell[] = []
  const bars: Bar[] = []

  const lay = (bus: TreeBus, row: number, incoming: number): number => {
    let next = row
    let lastRow = row + incoming - 1
    const { depth } = bus
    for (const feeder of bus.feeders) {
      const from = next
      lastRow = Math.max(lastRow, from)
      if (feeder.kind === 'branch') {
        const { branches, child } = feeder
        for (const [i, branch] of branches.entries()) {
          const sheet = valueSheet(branchLines(branch), detail)
          cells.push({ depth, row: from + i, symbol: branchSymbol(branch), sheet, through: true })
        }
        lastRow = Math.max(lastRow, from + branches.length - 1)
        next = Math.max(from + branches.length, lay(child, from, branches.length))
        continue
      }
      if (feeder.kind === 'device') {
        const sheet = valueSheet(deviceLines(document, feeder.device, one), detail)
        cells.push({ depth, row: from, symbol: deviceSymbol(context, feeder.device), sheet, through: false })
      } else {
        const { tag, lines } = branchLines(feeder.branch)
        const sheet = valueSheet(
          { tag: `${tag} to ${feeder.to.tag}`, lines: feeder.told ? [`see ${feeder.to.tag}`] : lines },
          detail,
        )
        cells.push({ depth, row: from, symbol: tieSymbol, sheet, through: false })
      }
      next += 1
    }
    bars.push({ depth, firstRow: row, lastRow, label: busLabel(bus.bus, detail) })
    return Math.max(next, row + incoming)
  }

  cells.push({ depth: -1, row: 0, symbol: sourceSymbol, sheet: valueSheet(supplyLines(supply), detail), through: true })
  let rows = 0
  for (const tree of networkTrees(document.plant, supply.bus)) rows = lay(tree, rows, 1)
  return { cells, bars, rows }
}
