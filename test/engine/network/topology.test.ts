import { describe, expect, it } from 'vitest'
import type { BusInput, LineInput } from '@/lib/engine/case-input'
import { findTopology } from '@/lib/engine/network/topology'
import { ohm, siemens, volt } from '@/lib/units/si'

const buses = (...ids: string[]): BusInput[] => ids.map((id) => ({ id, nominal: volt(6600) }))

const line = (id: string, fromBusId: string, toBusId: string, r = 0.1): LineInput => ({
  id,
  fromBusId,
  toBusId,
  impedance: { re: ohm(r), im: ohm(r) },
  susceptance: siemens(0),
})

describe('the nodes of a network', () => {
  it('are its buses where every line has an impedance', () => {
    const found = findTopology(buses('A', 'B', 'C'), [line('1', 'A', 'B'), line('2', 'B', 'C')], [], 'A')
    expect(found.ok && found.value.nodeOfBus).toEqual([0, 1, 2])
  })

  it('join buses that lines without impedance connect, also over several of them', () => {
    const lines = [line('1', 'A', 'B', 0), line('2', 'B', 'C', 0), line('3', 'C', 'D')]
    const found = findTopology(buses('A', 'B', 'C', 'D'), lines, [], 'A')
    expect(found.ok && found.value.count).toBe(2)
    expect(found.ok && found.value.nodeOfBus).toEqual([0, 0, 0, 1])
    expect(found.ok && found.value.busOfNode.map(({ id }) => id)).toEqual(['A', 'D'])
  })

  it('count an impedance that only round-off would notice as none', () => {
    const found = findTopology(buses('A', 'B'), [line('1', 'A', 'B', 1e-12)], [], 'A')
    expect(found.ok && found.value.count).toBe(1)
  })

  it('keep a micro-ohm busbar apart from none', () => {
    const found = findTopology(buses('A', 'B'), [line('1', 'A', 'B', 1e-6)], [], 'A')
    expect(found.ok && found.value.count).toBe(2)
  })

  it('are refused for a loop of lines without impedance, which is named', () => {
    const lines = [line('1', 'A', 'B', 0), line('2', 'B', 'C', 0), line('3', 'B', 'D', 0), line('4', 'C', 'A', 0)]
    const found = findTopology(buses('A', 'B', 'C', 'D'), lines, [], 'A')
    expect(found).toMatchObject({ ok: false, outcome: { kind: 'refused', cause: 'zero-impedance-loop' } })
    expect(!found.ok && found.outcome.kind === 'refused' && [...found.outcome.buses].sort()).toEqual(['A', 'B', 'C'])
  })

  it('are refused for two lines without impedance side by side', () => {
    const found = findTopology(buses('A', 'B'), [line('1', 'A', 'B', 0), line('2', 'A', 'B', 0)], [], 'A')
    expect(found).toMatchObject({ ok: false, outcome: { cause: 'zero-impedance-loop', buses: ['A', 'B'] } })
  })

  it('are refused for an island, whose buses are named', () => {
    const found = findTopology(buses('A', 'B', 'C', 'D'), [line('1', 'A', 'B'), line('2', 'C', 'D')], [], 'A')
    expect(found).toMatchObject({ ok: false, outcome: { kind: 'refused', cause: 'island', buses: ['C', 'D'] } })
  })

  it('hang on the supply over transformers too', () => {
    const transformer = {
      id: 'T',
      fromBusId: 'A',
      toBusId: 'B',
      ratio: 5,
      impedance: { re: ohm(0), im: ohm(1) },
    }
    expect(findTopology(buses('A', 'B'), [], [transformer], 'A').ok).toBe(true)
    expect(findTopology(buses('A', 'B'), [], [], 'A').ok).toBe(false)
  })
})
