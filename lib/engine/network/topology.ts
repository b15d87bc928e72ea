import type { BusInput, LineInput } from '../case-input'
import { magnitude } from '../numeric/complex'
import { refuse, type Setup } from './refusal'

/** Electrical nodes: buses joined by lines without impedance are one node. */
export interface Topology {
  count: number
  /** Node of each bus, by the position of the bus. */
  nodeOfBus: readonly number[]
  /** Node of a bus by its id. */
  nodeOf: ReadonlyMap<string, number>
  /** The first bus of each node, by which the node is named. */
  busOfNode: readonly BusInput[]
}

/**
 * Joins buses into nodes and checks that every one of them hangs on the supply.
 *
 * Refused: a loop of lines without impedance (the current around it is undetermined) and an island without supply.
 */
export function findTopology(
  buses: readonly BusInput[],
  lines: readonly LineInput[],
  transformers: readonly { fromBusId: string; toBusId: string }[],
  supplyBusId: string,
): Setup<Topology> {
  const nominalOf = new Map(buses.map((bus) => [bus.id, bus.nominal]))
  const joints = lines.filter((line) => isJoint(line, nominalOf.get(line.fromBusId)!))
  const joined = new Map<string, string>(buses.map((bus) => [bus.id, bus.id]))
  const rootOf = (id: string): string => {
    const parent = joined.get(id)!
    return parent === id ? id : rootOf(parent)
  }
  for (const [index, line] of joints.entries()) {
    const [from, to] = [rootOf(line.fromBusId), rootOf(line.toBusId)]
    if (from === to) {
      const loop = pathBetween(line.fromBusId, line.toBusId, joints.slice(0, index))
      return refuse('zero-impedance-loop', loop, `Line ${line.id} closes a loop of lines without impedance.`)
    }
    joined.set(to, from)
  }

  const numberOfRoot = new Map<string, number>()
  const busOfNode: BusInput[] = []
  const nodeOfBus = buses.map((bus) => {
    const root = rootOf(bus.id)
    const known = numberOfRoot.get(root)
    if (known !== undefined) return known
    numberOfRoot.set(root, busOfNode.length)
    busOfNode.push(bus)
    return busOfNode.length - 1
  })
  const nodeOf = new Map(buses.map((bus, index) => [bus.id, nodeOfBus[index]!]))

  const cutOff = unreached(nodeOf, busOfNode.length, [...lines, ...transformers], nodeOf.get(supplyBusId)!)
  const island = buses.filter((_, index) => cutOff.has(nodeOfBus[index]!)).map((bus) => bus.id)
  if (island.length > 0) return refuse('island', island, 'No line or transformer leads from these buses to the supply.')
  return { ok: true, value: { count: busOfNode.length, nodeOfBus, nodeOf, busOfNode } }
}

/**
 * Whether a line joins its buses: no impedance, or so little that 1 MVA drops less than 1e-9 of the voltage along it
 * and the rest of the network would drown in the round-off of its admittance.
 */
export const isJoint = (line: LineInput, nominal: number): boolean =>
  magnitude(line.impedance) < (1e-9 * nominal * nominal) / 1e6

/** Buses on the way between two ends of a tree of lines, both ends included. */
function pathBetween(from: string, to: string, tree: readonly LineInput[]): string[] {
  const cameFrom = new Map<string, string>([[from, from]])
  const queue = [from]
  for (const here of queue) {
    for (const line of tree) {
      const next = line.fromBusId === here ? line.toBusId : line.toBusId === here ? line.fromBusId : null
      if (next === null || cameFrom.has(next)) continue
      cameFrom.set(next, here)
      queue.push(next)
    }
  }
  const path = [to]
  while (path[0] !== from) path.unshift(cameFrom.get(path[0]!)!)
  return path
}

/** Nodes that no branch connects with the start. */
function unreached(
  nodeOf: ReadonlyMap<string, number>,
  count: number,
  branches: readonly { fromBusId: string; toBusId: string }[],
  start: number,
): Set<number> {
  const missing = new Set(Array.from({ length: count }, (_, node) => node))
  const queue = [start]
  missing.delete(start)
  for (const here of queue) {
    for (const branch of branches) {
      const [from, to] = [nodeOf.get(branch.fromBusId)!, nodeOf.get(branch.toBusId)!]
      const next = from === here ? to : to === here ? from : here
      if (missing.delete(next)) queue.push(next)
    }
  }
  return missing
}
