import type { MotorRecord } from '@/lib/study/document/machine-records'
import type {
  BusRecord,
  CapacitorRecord,
  LineRecord,
  LoadRecord,
  TransformerRecord,
} from '@/lib/study/document/network-records'
import type { PlantRecords } from '@/lib/study/document/study-document'

export type Branch = { kind: 'transformer'; record: TransformerRecord } | { kind: 'line'; record: LineRecord }

export type Device =
  | { kind: 'motor'; record: MotorRecord }
  | { kind: 'load'; record: LoadRecord }
  | { kind: 'capacitor'; record: CapacitorRecord }

/** What leaves a bus to the right, one row each; branches in parallel to the same bus share the rows of that bus. */
export type Feeder =
  | { kind: 'branch'; branches: readonly Branch[]; child: TreeBus }
  | { kind: 'device'; device: Device }
  /** A branch that closes a loop: drawn at both ends as a reference to the other bus, so that nothing crosses. */
  | { kind: 'tie'; branch: Branch; to: BusRecord; told: boolean }

export interface TreeBus {
  bus: BusRecord
  feeders: readonly Feeder[]
}

const other = (branch: Branch, busId: string): string =>
  branch.record.from === busId ? branch.record.to : branch.record.from

const devicesAt = (plant: PlantRecords, busId: string): readonly Device[] => [
  ...plant.motors.filter((one) => one.bus === busId).map((record): Device => ({ kind: 'motor', record })),
  ...plant.loads.filter((one) => one.bus === busId).map((record): Device => ({ kind: 'load', record })),
  ...plant.capacitors.filter((one) => one.bus === busId).map((record): Device => ({ kind: 'capacitor', record })),
]

/** Branches by the bus they touch; a branch between two names of one bus is left out. */
const branchesByBus = (plant: PlantRecords): ReadonlyMap<string, readonly Branch[]> => {
  const all: Branch[] = [
    ...plant.transformers.map((record): Branch => ({ kind: 'transformer', record })),
    ...plant.lines.map((record): Branch => ({ kind: 'line', record })),
  ]
  const map = new Map<string, Branch[]>()
  for (const branch of all) {
    const { from, to } = branch.record
    if (from === to) continue
    for (const end of [from, to]) map.set(end, [...(map.get(end) ?? []), branch])
  }
  return map
}

/** The bus from which each bus is reached by the fewest branches. */
const parents = (
  root: string,
  branches: ReadonlyMap<string, readonly Branch[]>,
): ReadonlyMap<string, string | null> => {
  const parent = new Map<string, string | null>([[root, null]])
  const queue = [root]
  for (const busId of queue) {
    for (const branch of branches.get(busId) ?? []) {
      const next = other(branch, busId)
      if (parent.has(next)) continue
      parent.set(next, busId)
      queue.push(next)
    }
  }
  return parent
}

/** The plant as trees: the first grows from the supply's bus, the others from buses that it does not reach. */
export const networkTrees = (plant: PlantRecords, supplyBus: string): readonly TreeBus[] => {
  const branches = branchesByBus(plant)
  const buses = new Map(plant.buses.map((bus) => [bus.id, bus]))
  const reached = new Set<string>()
  const tied = new Set<Branch>()

  const grow = (busId: string, parent: ReadonlyMap<string, string | null>): TreeBus => {
    reached.add(busId)
    const here = (branches.get(busId) ?? []).filter((branch) => buses.has(other(branch, busId)))
    const children = [...new Set(here.map((branch) => other(branch, busId)))].filter((id) => parent.get(id) === busId)
    const ties = here.filter((branch) => {
      const end = other(branch, busId)
      return parent.get(end) !== busId && parent.get(busId) !== end
    })
    return {
      bus: buses.get(busId)!,
      feeders: [
        ...children.map(
          (id): Feeder => ({
            kind: 'branch',
            branches: here.filter((branch) => other(branch, busId) === id),
            child: grow(id, parent),
          }),
        ),
        ...devicesAt(plant, busId).map((device): Feeder => ({ kind: 'device', device })),
        ...ties.map((branch): Feeder => {
          const told = tied.has(branch)
          tied.add(branch)
          return { kind: 'tie', branch, to: buses.get(other(branch, busId))!, told }
        }),
      ],
    }
  }

  const trees: TreeBus[] = []
  for (const root of [supplyBus, ...buses.keys()]) {
    if (reached.has(root) || !buses.has(root)) continue
    trees.push(grow(root, parents(root, branches)))
  }
  return trees
}
