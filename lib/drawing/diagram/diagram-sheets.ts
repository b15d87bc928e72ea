import type { DiagramSheet } from './diagram-grid'
import type { TreeBus } from './network-tree'

/** Parts smaller than this are not worth a sheet. */
const leastRows = 4

const children = (bus: TreeBus): readonly TreeBus[] =>
  bus.feeders.flatMap((feeder) => (feeder.kind === 'branch' ? [feeder.child] : []))

/** Rows that a part takes with some of its parts on sheets of their own. */
const rowsOf = (bus: TreeBus, apart: ReadonlySet<string>): number => {
  const rows = bus.feeders.reduce((sum, feeder) => {
    if (feeder.kind !== 'branch') return sum + 1
    const own = apart.has(feeder.child.bus.id) ? 0 : rowsOf(feeder.child, apart)
    return sum + Math.max(feeder.branches.length, own)
  }, 0)
  return Math.max(1, rows)
}

/** The largest part that is still on the sheet. */
const largestPart = (bus: TreeBus, apart: ReadonlySet<string>): TreeBus | null => {
  const shown = (at: TreeBus): readonly TreeBus[] =>
    children(at)
      .filter((child) => !apart.has(child.bus.id))
      .flatMap((child) => [child, ...shown(child)])
  const whole = rowsOf(bus, apart)
  const parts = shown(bus).filter((part) => {
    const rows = rowsOf(part, apart)
    // A part as large as the whole would leave an empty sheet and go on as it was.
    return rows >= leastRows && rows < whole
  })
  return parts.reduce<TreeBus | null>(
    (best, part) => (best && rowsOf(best, apart) >= rowsOf(part, apart) ? best : part),
    null,
  )
}

/** Divides a diagram into sheets of at most so many rows, as far as its boards can be taken apart. */
export const diagramSheets = (trees: readonly TreeBus[], mostRows: number): readonly DiagramSheet[] => {
  const sheets: DiagramSheet[] = []
  const waiting: { trees: readonly TreeBus[]; from: string | null }[] = [{ trees, from: null }]
  for (const { trees: here, from } of waiting) {
    const apart = new Set<string>()
    const total = () => here.reduce((sum, tree) => sum + rowsOf(tree, apart), 0)
    while (total() > mostRows) {
      const parts = here.flatMap((tree) => largestPart(tree, apart) ?? [])
      const part = parts.toSorted((a, b) => rowsOf(b, apart) - rowsOf(a, apart))[0]
      if (!part) break
      apart.add(part.bus.id)
      waiting.push({ trees: [part], from: here[0]!.bus.tag })
    }
    sheets.push({ trees: here, apart, from })
  }
  return sheets
}
