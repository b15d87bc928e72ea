import type { AdmittanceMatrix } from './admittance'

/** In which order nodes are eliminated, and which nodes each is then still joined with. */
export interface EliminationOrder {
  /** Nodes, the first to go first. */
  order: Int32Array
  /** For each step the nodes joined with the one that goes, among those that go later or stay. */
  joined: readonly Int32Array[]
}

/** Nodes joined by an element of the matrix, each by its neighbours. */
function neighbours(matrix: AdmittanceMatrix): Set<number>[] {
  const n = matrix.order
  const sets = Array.from({ length: n }, () => new Set<number>())
  for (let i = 0; i < n; i++) {
    for (let j = i + 1; j < n; j++) {
      const [there, back] = [2 * (i * n + j), 2 * (j * n + i)]
      const { data } = matrix
      if (data[there] === 0 && data[there + 1] === 0 && data[back] === 0 && data[back + 1] === 0) continue
      sets[i]!.add(j)
      sets[j]!.add(i)
    }
  }
  return sets
}

/**
 * Order of least degree: the node with the fewest neighbours goes first and leaves them joined with each other. A
 * radial network goes without a single new element.
 *
 * Reference: W. F. Tinney, J. W. Walker, Proc. IEEE 55 (1967) 1801, scheme 2 (from memory).
 *
 * @param goes whether a node is eliminated
 */
export function eliminationOrder(matrix: AdmittanceMatrix, goes: (node: number) => boolean): EliminationOrder {
  const sets = neighbours(matrix)
  const left = new Set<number>()
  for (let node = 0; node < matrix.order; node++) if (goes(node)) left.add(node)
  const order = new Int32Array(left.size)
  const joined: Int32Array[] = []
  for (let k = 0; k < order.length; k++) {
    let next = -1
    let least = Number.POSITIVE_INFINITY
    for (const node of left) {
      if (sets[node]!.size >= least) continue
      next = node
      least = sets[node]!.size
      if (least <= 1) break
    }
    left.delete(next)
    order[k] = next
    const around = [...sets[next]!]
    joined.push(Int32Array.from(around))
    for (const node of around) {
      sets[node]!.delete(next)
      for (const other of around) if (other !== node) sets[node]!.add(other)
    }
  }
  return { order, joined }
}
