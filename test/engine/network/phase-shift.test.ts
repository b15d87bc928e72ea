import fc from 'fast-check'
import * as math from 'mathjs'
import { describe, expect, it } from 'vitest'
import type { BusInput, LineInput, TransformerInput } from '@/lib/engine/case-input'
import { branchMatrix } from '@/lib/engine/network/admittance'
import { withLags } from '@/lib/engine/network/phase-shift'
import { reduceNetwork } from '@/lib/engine/network/reduce'
import { findTopology } from '@/lib/engine/network/topology'
import { ohm, siemens, volt } from '@/lib/units/si'

const hours = (clock: number): number => (clock * Math.PI) / 6
const busesOf = (...ids: string[]): BusInput[] => ids.map((id) => ({ id, nominal: volt(6600) }))

const transformer = (id: string, fromBusId: string, toBusId: string, clock: number | null): TransformerInput => ({
  id,
  fromBusId,
  toBusId,
  ratio: 5,
  impedance: { re: ohm(0.1), im: ohm(2) },
  ...(clock === null ? {} : { lag: hours(clock) }),
})

const line = (id: string, fromBusId: string, toBusId: string): LineInput => ({
  id,
  fromBusId,
  toBusId,
  impedance: { re: ohm(0.2), im: ohm(0.1) },
  susceptance: siemens(0),
})

describe('vector groups in a network', () => {
  it('are refused in parallel where they turn unlike, with both transformers named', () => {
    const found = withLags(busesOf('A', 'B'), [], [transformer('T1', 'A', 'B', 11), transformer('T2', 'A', 'B', 1)], [])
    expect(found).toMatchObject({ ok: false, outcome: { kind: 'refused', cause: 'unlike-groups', buses: ['A', 'B'] } })
    expect(!found.ok && found.outcome.kind === 'refused' && found.outcome.detail).toMatch(/T2 and T1/)
  })

  it('are refused in a loop over lines too', () => {
    const lines = [line('L', 'B', 'C')]
    const found = withLags(
      busesOf('A', 'B', 'C'),
      lines,
      [transformer('T1', 'A', 'B', 11), transformer('T2', 'A', 'C', 0)],
      [],
    )
    expect(found.ok).toBe(false)
  })

  it('may differ in series: Dyn11 twice in one way and Yy10 beside it turn alike', () => {
    const transformers = [
      transformer('T1', 'A', 'B', 11),
      transformer('T2', 'B', 'C', 11),
      transformer('T3', 'A', 'C', 10),
    ]
    expect(withLags(busesOf('A', 'B', 'C'), [], transformers, []).ok).toBe(true)
  })

  it('that are not stated follow those beside them', () => {
    const found = withLags(
      busesOf('A', 'B'),
      [],
      [transformer('T1', 'A', 'B', null), transformer('T2', 'A', 'B', 11)],
      [],
    )
    expect(found.ok && found.value.transformers[0]!.lag).toBeCloseTo(hours(11), 12)
  })

  it('are refused between two windings of a three-winding transformer and what lies beside them', () => {
    const windings = [
      { busId: 'A', ratio: 1, lag: 0 },
      { busId: 'B', ratio: 1, lag: hours(1) },
      { busId: 'C', ratio: 1, lag: hours(0) },
    ] as const
    const z = { re: ohm(0), im: ohm(1) }
    const three = { id: 'W', windings, impedance: [z, z, z] as const }
    const buses = busesOf('A', 'B', 'C')
    expect(withLags(buses, [], [], [three]).ok).toBe(true)
    expect(withLags(buses, [line('L', 'B', 'C')], [], [three]).ok).toBe(false)
  })
})

/** A tree of 3 to 12 buses with further branches; every transformer turns as the clock hours of its buses ask. */
const meshed = fc
  .integer({ min: 3, max: 12 })
  .chain((count) =>
    fc.record({
      clocks: fc.array(fc.integer({ min: 0, max: 11 }), { minLength: count, maxLength: count }),
      parents: fc.array(fc.nat(), { minLength: count - 1, maxLength: count - 1 }),
      chords: fc.array(fc.tuple(fc.nat(count - 1), fc.nat(count - 1)), { maxLength: 6 }),
      values: fc.array(fc.double({ min: 0.1, max: 2, noNaN: true }), {
        minLength: 2 * count + 12,
        maxLength: 30 + count * 2,
      }),
    }),
  )
  .map(({ clocks, parents, chords, values }) => {
    const buses = busesOf(...clocks.map((_, i) => `N${i}`))
    const ends = [
      ...parents.map((parent, i) => [parent % (i + 1), i + 1] as const),
      ...chords.filter(([a, b]) => a !== b),
    ]
    const transformers = ends.map(
      ([a, b], k): TransformerInput => ({
        id: `T${k}`,
        fromBusId: `N${a}`,
        toBusId: `N${b}`,
        ratio: 1 + values[k]!,
        impedance: { re: ohm(values[k]! / 10), im: ohm(values[k + 1]!) },
        lag: hours(clocks[b]! - clocks[a]!),
      }),
    )
    return { buses, transformers, ends }
  })

describe('a meshed network with phase shift', () => {
  it('agrees with a dense complex solution by a general library', () => {
    fc.assert(
      fc.property(meshed, ({ buses, transformers, ends }) => {
        const turned = withLags(buses, [], transformers, [])
        if (!turned.ok) return false
        const found = findTopology(buses, [], transformers, 'N0')
        if (!found.ok) return false
        const matrix = branchMatrix(found.value, [], turned.value.transformers)
        // A load of 0.1 − 0.05j S at every bus, bus 0 driven with 1 V.
        const n = buses.length
        for (let i = 0; i < n; i++) {
          matrix.data[2 * (i * n + i)] = matrix.data[2 * (i * n + i)]! + 0.1
          matrix.data[2 * (i * n + i) + 1] = matrix.data[2 * (i * n + i) + 1]! - 0.05
        }
        const mine = reduceNetwork(matrix, [], 0)!.recovery
        const zero = math.complex(0, 0)
        const y = Array.from({ length: n }, (_, i) =>
          Array.from({ length: n }, (_, j) => (i === j ? math.complex(0.1, -0.05) : zero)),
        )
        const plus = (i: number, j: number, value: math.MathType) => {
          y[i]![j] = math.add(y[i]![j]!, value) as math.Complex
        }
        for (const [k, [i, j]] of ends.entries()) {
          const { ratio, impedance, lag } = transformers[k]!
          const a = math.complex(ratio * Math.cos(lag!), ratio * Math.sin(lag!))
          const own = math.divide(1, math.complex(impedance.re, impedance.im)) as math.Complex
          plus(i, i, math.divide(own, ratio * ratio))
          plus(j, j, own)
          plus(i, j, math.unaryMinus(math.divide(own, math.conj(a))) as math.Complex)
          plus(j, i, math.unaryMinus(math.divide(own, a)) as math.Complex)
        }
        const inner = y.slice(1).map((row) => row.slice(1))
        const right = y.slice(1).map((row) => [math.unaryMinus(row[0]!)])
        const theirs = math.lusolve(inner as never, right as never) as unknown as math.Complex[][]
        return theirs.every(([v], i) => Math.hypot(v!.re - mine[2 * (i + 1)]!, v!.im - mine[2 * (i + 1) + 1]!) < 1e-9)
      }),
      { numRuns: 60, seed: 7 },
    )
  })
})
