import type { BusInput, LineInput, ThreeWindingInput, TransformerInput } from '../case-input'
import { type Refusal, refuse, type Setup } from './refusal'

/** A branch with the angle by which its to side lags its from side; null where nothing states it. */
interface Turn {
  name: string
  fromBusId: string
  toBusId: string
  lag: number | null
}

/** Largest angle between two ways that round-off explains, rad. */
const tolerance = 1e-6

/** Windings of a transformer as turns, the first one the reference of a three-winding transformer. */
const turnsOf = (transformers: readonly TransformerInput[], threeWindings: readonly ThreeWindingInput[]): Turn[] => [
  ...transformers.map(({ id, name, fromBusId, toBusId, lag }) => ({
    name: name ?? id,
    fromBusId,
    toBusId,
    lag: lag ?? null,
  })),
  ...threeWindings.flatMap(({ id, name, windings: [first, ...others] }) =>
    others.map(({ busId, lag }) => ({ name: name ?? id, fromBusId: first.busId, toBusId: busId, lag })),
  ),
]

/**
 * The lag of every turn, radian, with the unstated ones put so that they fit the rest of the network (0 where nothing
 * binds them); refused where two ways between the same buses turn the voltage by unlike angles, naming the transformers.
 */
function settleLags(
  buses: readonly BusInput[],
  lines: readonly LineInput[],
  turns: readonly Turn[],
): { ok: true; lags: readonly number[] } | { ok: false; outcome: Refusal } {
  /** Group of connected buses, and the lag of each bus behind the first of its group. */
  const parent = new Map(buses.map(({ id }) => [id, { of: id, lag: 0 }]))
  const placeOf = (id: string): { root: string; lag: number } => {
    let [root, lag] = [id, 0]
    for (let at = parent.get(root)!; at.of !== root; at = parent.get(root)!) {
      lag += at.lag
      root = at.of
    }
    return { root, lag }
  }
  const tree: Turn[] = []
  const lags = turns.map((turn) => turn.lag ?? 0)
  const stated = turns.flatMap((turn, index) => (turn.lag === null ? [] : [{ turn, index }]))
  const open = turns.flatMap((turn, index) => (turn.lag === null ? [{ turn, index }] : []))
  const plain = lines.map(({ id, fromBusId, toBusId }) => ({
    turn: { name: id, fromBusId, toBusId, lag: 0 },
    index: -1,
  }))
  for (const { turn, index } of [...plain, ...stated, ...open]) {
    const [from, to] = [placeOf(turn.fromBusId), placeOf(turn.toBusId)]
    if (from.root !== to.root) {
      parent.set(to.root, { of: from.root, lag: from.lag + (turn.lag ?? 0) - to.lag })
      tree.push(turn)
      continue
    }
    const around = to.lag - from.lag
    if (turn.lag === null) {
      lags[index] = around
      continue
    }
    const off = turn.lag - around
    if (Math.abs(off - 2 * Math.PI * Math.round(off / (2 * Math.PI))) < tolerance) continue
    const others = wayBetween(turn, tree).filter(({ name, lag }) => name !== turn.name && lag !== 0)
    return refuse(
      'unlike-groups',
      [turn.fromBusId, turn.toBusId],
      `Give ${turn.name} and ${others.map(({ name }) => name).join(', ') || 'what lies beside it'} vector groups that turn the voltage alike, or open the loop.`,
    )
  }
  return { ok: true, lags }
}

/** Branches of a tree on the way between the ends of one more. */
function wayBetween({ fromBusId, toBusId }: Turn, tree: readonly Turn[]): Turn[] {
  const cameBy = new Map<string, { turn: Turn; from: string } | null>([[fromBusId, null]])
  const queue = [fromBusId]
  for (const here of queue) {
    for (const turn of tree) {
      const next = turn.fromBusId === here ? turn.toBusId : turn.toBusId === here ? turn.fromBusId : null
      if (next === null || cameBy.has(next)) continue
      cameBy.set(next, { turn, from: here })
      queue.push(next)
    }
  }
  const way: Turn[] = []
  for (let at = cameBy.get(toBusId); at; at = cameBy.get(at.from)) way.push(at.turn)
  return way
}

/** The case's transformers with every lag put in; refused as `settleLags` does. */
export function withLags(
  buses: readonly BusInput[],
  lines: readonly LineInput[],
  transformers: readonly TransformerInput[],
  threeWindings: readonly ThreeWindingInput[],
): Setup<{ transformers: TransformerInput[]; threeWindings: ThreeWindingInput[]; turns: readonly Turn[] }> {
  const turns = turnsOf(transformers, threeWindings)
  const found = settleLags(buses, lines, turns)
  if (!found.ok) return found
  const { lags } = found
  return {
    ok: true,
    value: {
      turns,
      transformers: transformers.map((transformer, i) => ({ ...transformer, lag: lags[i]! })),
      threeWindings: threeWindings.map((transformer, i) => {
        const [first, second, third] = transformer.windings
        const at = transformers.length + 2 * i
        const windings = [
          { ...first, lag: 0 },
          { ...second, lag: lags[at]! },
          { ...third, lag: lags[at + 1]! },
        ] as const
        return { ...transformer, windings }
      }),
    },
  }
}
