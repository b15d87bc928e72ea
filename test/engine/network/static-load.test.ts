import { describe, expect, it } from 'vitest'
import type { StaticLoadInput } from '@/lib/engine/case-input'
import { impedancePart, nonlinearLoads } from '@/lib/engine/network/static-load'
import { perUnit, volt, voltAmpere } from '@/lib/units/si'

const load = (id: string, mix: StaticLoadInput['mix'], power = { re: 4000, im: 3000 }): StaticLoadInput => ({
  id,
  busId: 'B',
  power: { re: voltAmpere(power.re), im: voltAmpere(power.im) },
  ratedVoltage: volt(100),
  mix,
  floor: perUnit(0.7),
})

const nodes = new Map([['B', 3]])

describe('static loads', () => {
  it('have conj(S)/U² of their impedance part as admittance', () => {
    const part = impedancePart(load('L', { impedance: 0.5, current: 0, power: 0.5 }))
    expect(part.re).toBeCloseTo(0.2, 12)
    expect(part.im).toBeCloseTo(-0.15, 12)
  })

  it('are nonlinear only with a current or power part and a power to draw', () => {
    const kept = nonlinearLoads(
      [
        load('Z', { impedance: 1, current: 0, power: 0 }),
        load('I', { impedance: 0, current: 1, power: 0 }),
        load('P', { impedance: 0, current: 0, power: 1 }),
        load('nothing', { impedance: 0, current: 0, power: 1 }, { re: 0, im: 0 }),
      ],
      nodes,
    )
    expect(kept.ids).toEqual(['I', 'P'])
    expect([...kept.node]).toEqual([3, 3])
  })

  it('are laid out with conjugate power, shares at rated voltage and the square of the floor', () => {
    const kept = nonlinearLoads([load('L', { impedance: 0.2, current: 0.3, power: 0.5 })], nodes)
    expect([...kept.power]).toEqual([4000, -3000])
    expect(kept.current[0]).toBeCloseTo(0.003, 12)
    expect(kept.share[0]).toBe(0.5)
    expect(kept.floor[0]).toBeCloseTo(4900, 9)
  })
})
