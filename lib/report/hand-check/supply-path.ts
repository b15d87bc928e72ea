import type { LineRecord, TransformerRecord } from '@/lib/study/document/network-records'
import type { PlantRecords } from '@/lib/study/document/study-document'

export type PathBranch = { kind: 'line'; record: LineRecord } | { kind: 'transformer'; record: TransformerRecord }

/** A branch of the path, walked along or against its direction. */
export interface PathStep {
  branch: PathBranch
  forwards: boolean
}

const branchesOf = (plant: PlantRecords): readonly PathBranch[] => [
  ...plant.transformers.map((record): PathBranch => ({ kind: 'transformer', record })),
  ...plant.lines.map((record): PathBranch => ({ kind: 'line', record })),
]

const shortest = (branches: readonly PathBranch[], from: string, to: string): readonly PathStep[] | null => {
  const reached = new Map<string, { step: PathStep; before: string } | null>([[from, null]])
  const queue = [from]
  for (const bus of queue) {
    for (const branch of branches) {
      const { record } = branch
      const forwards = record.from === bus
      const next = forwards ? record.to : record.to === bus ? record.from : null
      if (next === null || reached.has(next)) continue
      reached.set(next, { step: { branch, forwards }, before: bus })
      queue.push(next)
    }
  }
  if (!reached.has(to)) return null
  const steps: PathStep[] = []
  let at = to
  for (let link = reached.get(at); link; link = reached.get(at)) {
    steps.unshift(link.step)
    at = link.before
  }
  return steps
}

/** The branches from the supply's bus to another bus; null unless there is exactly one way. */
export const supplyPath = (plant: PlantRecords, from: string, to: string): readonly PathStep[] | null => {
  const branches = branchesOf(plant)
  const path = shortest(branches, from, to)
  if (!path) return null
  const another = path.some(({ branch }) => {
    const rest = branches.filter(({ record }) => record !== branch.record)
    return shortest(rest, from, to) !== null
  })
  return another ? null : path
}
