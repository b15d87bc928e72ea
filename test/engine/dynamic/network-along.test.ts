import { describe, expect, it } from 'vitest'
import { speedCase } from '@/lib/cli/speed-case'
import type { CaseInput } from '@/lib/engine/case-input'
import { circuitOf } from '@/lib/engine/case-input'
import { directTimeConstant, machineAlong } from '@/lib/engine/dynamic/machine-along'
import { between, networkAlong, placeAmong } from '@/lib/engine/dynamic/network-along'
import { atSlip } from '@/lib/engine/machines/at-slip'
import { runCase } from '@/lib/engine/run-case'
import { beforeStart } from '@/lib/engine/runup/before-start'
import { preparePlant } from '@/lib/engine/runup/plant'
import { simpleMotor, simplePlant, started } from '../../support/simple-plant'

const alongOf = (input: CaseInput) => {
  const plant = preparePlant(input)
  if (!plant.ok) throw new Error(JSON.stringify(plant.outcome))
  const before = beforeStart(plant.value)
  if (!before.ok) throw new Error(JSON.stringify(before.outcome))
  const motor = input.motors.findIndex(({ duty }) => duty.kind === 'starting')
  return networkAlong(before.value.system, motor, before.value.speeds, runCase(input))!
}

describe('the network along a run-up', () => {
  it('is the source itself where there is nothing else', () => {
    const along = alongOf(simplePlant([simpleMotor('M', started())], 0.02))
    expect(along.speeds.length).toBe(1)
    expect(along.emf[0]).toBeCloseTo(400, 9)
    expect(along.resistance[0]).toBeCloseTo(0.002, 12)
    expect(along.reactance[0]).toBeCloseTo(0.02, 12)
    expect([...along.transfer[0]!]).toEqual([expect.closeTo(0.002, 12), expect.closeTo(0.02, 12)])
  })

  it('gives the voltages of the quasi-static run at every speed, with loads of constant power and running machines', () => {
    const input = speedCase(2)
    const along = alongOf(input)
    const { series } = runCase(input)
    const { speed, motorVoltage } = series.motors.M!
    const circuit = circuitOf(input.motors[0]!.circuit)
    for (let i = 1; i < speed.length; i++) {
      if (speed[i] === speed[i - 1]) continue
      const here = placeAmong(along, speed[i]!)
      const y = atSlip(circuit, 1 - speed[i]! / (50 * Math.PI)).admittance
      const [r, x] = [between(along.resistance, here), between(along.reactance, here)]
      // U = E/|1 + Z·y|; series are thinned to half a thousandth of their range, and rows joined by straight lines.
      const across = Math.hypot(1 + r * y.re - x * y.im, r * y.im + x * y.re)
      expect(Math.abs(between(along.emf, here) / across / motorVoltage[i]! - 1)).toBeLessThan(1e-3)
    }
  })

  it.each([0, 30, 150])('does not see the %d° by which a vector group turns the motor’s bus', (degrees) => {
    const input = speedCase(0)
    const turned: CaseInput = {
      ...input,
      transformers: input.transformers.map((one) => ({ ...one, lag: (degrees * Math.PI) / 180 })),
    }
    const [plain, other] = [alongOf(input), alongOf(turned)]
    plain.transfer.forEach((row, k) => {
      row.forEach((value, i) => {
        expect(other.transfer[k]![i]).toBeCloseTo(value, 8)
      })
    })
  })

  it('is none where a capacitor makes it capacitive at supply frequency', () => {
    const input = simplePlant([simpleMotor('M', started())], 0.02, {
      capacitors: [{ id: 'C', busId: 'B', susceptance: 80 as never }],
    })
    const plant = preparePlant(input)
    if (!plant.ok) throw new Error('the plant stands')
    const before = beforeStart(plant.value)
    if (!before.ok) throw new Error('the plant stands')
    expect(networkAlong(before.value.system, 0, before.value.speeds, runCase(input))).toBeNull()
  })

  it('stands before a machine whose direct component decays with all resistance up to the EMF', () => {
    const input = simplePlant([simpleMotor('M', started())], 0.02)
    const along = alongOf(input)
    const machine = machineAlong(circuitOf(input.motors[0]!.circuit), along, 50, 4, 0)
    const { stator, magnetising, cages } = circuitOf(input.motors[0]!.circuit)
    const inner = 1 / (1 / magnetising + 1 / cages[0]!.reactance)
    expect(directTimeConstant(machine)).toBeCloseTo(
      (stator.im + 0.02 + inner) / (100 * Math.PI * (stator.re + 0.002)),
      12,
    )
  })
})
