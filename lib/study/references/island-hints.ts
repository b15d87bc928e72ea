import type { FieldIssue } from '../../errors'
import type { StudyDocument } from '../document/study-document'

/** Buses that can be reached from one over lines and transformers. */
const reachable = ({ plant }: StudyDocument, start: string): ReadonlySet<string> => {
  const next = new Map<string, string[]>()
  for (const { from, to } of [...plant.lines, ...plant.transformers]) {
    next.set(from, [...(next.get(from) ?? []), to])
    next.set(to, [...(next.get(to) ?? []), from])
  }
  const found = new Set([start])
  for (const bus of found) for (const other of next.get(bus) ?? []) found.add(other)
  return found
}

/** Buses without a way to the supply of a case; a case there has no solution, so it is said before computing. */
export const islandHints = (document: StudyDocument): FieldIssue[] => {
  const { supplies, buses } = document.plant
  const used = new Set(document.cases.map((record) => record.supply))
  const starts = new Set(supplies.filter((supply) => used.has(supply.id)).map((supply) => supply.bus))
  return [...starts].flatMap((start) => {
    const found = reachable(document, start)
    const from = buses.find((bus) => bus.id === start)?.tag ?? start
    return buses.flatMap(({ id, tag }, i) =>
      found.has(id)
        ? []
        : [
            {
              path: ['plant', 'buses', i],
              message: `No line or transformer joins bus ${tag} to the supply at bus ${from}; connect it or remove it.`,
            },
          ],
    )
  })
}
