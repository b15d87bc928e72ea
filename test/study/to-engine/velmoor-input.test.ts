import { expect, test } from 'vitest'
import { circuitOf } from '@/lib/engine/case-input'
import { studyRunInput } from '@/lib/study/to-engine/study-run-input'
import { toRpm } from '@/lib/units/speed'
import { example } from '../support/examples'

const input = studyRunInput(example('velmoor'))
const caseOf = (tag: number) => {
  const found = input.cases.find(({ id }) => id === `case-${tag}`)
  if (!found) throw new Error(`no case ${tag}`)
  return found
}
const c2 = caseOf(2)
const motor = (id: string, tag = 2) => {
  const found = caseOf(tag).motors.find((one) => one.id === id)
  if (!found) throw new Error(`no motor ${id}`)
  return found
}
const starting = (id: string, tag = 2) => {
  const { duty } = motor(id, tag)
  if (duty.kind !== 'starting') throw new Error(`${id} does not start`)
  return duty
}

/** Ohm at 33 kV, by hand from the ratings: pocket-calculator check of the demo plant. */
const referred = (33 / 6.9) ** 2

test('the supply of 90 MVA at X/R 2.5 is 4.494 + j11.235 ohm at 33 kV', () => {
  expect(c2.supply.impedance.re).toBeCloseTo(4.494, 3)
  expect(c2.supply.impedance.im).toBeCloseTo(11.235, 3)
  expect(c2.supply.hold).toEqual({ kind: 'bus-voltage', voltage: 32_400 })
})

test('a level that contains c = 1.1 is a source of 1.1 times the impedance', () => {
  expect(caseOf(23).supply.impedance.im / c2.supply.impedance.im).toBeCloseTo(1.1, 12)
  expect(caseOf(23).supply.impedance.re / c2.supply.impedance.re).toBeCloseTo(1.1, 12)
})

test('transformer T1 is 0.776 + j10.862 ohm at 33 kV, its ratio that of its own rated voltages', () => {
  const t1 = c2.transformers.find(({ id }) => id === 't1')
  expect(t1?.ratio).toBeCloseTo(33 / 6.9, 12)
  expect((t1?.impedance.re ?? 0) * referred).toBeCloseTo(0.776, 3)
  expect((t1?.impedance.im ?? 0) * referred).toBeCloseTo(10.862, 3)
})

test('line and cable take their length, and two cables in parallel half of one', () => {
  const line = (id: string) => c2.lines.find((one) => one.id === id)?.impedance
  expect(line('l1')?.re).toBeCloseTo(0.216, 12)
  expect((line('c4')?.re ?? 0) * referred).toBeCloseTo(1.182, 3)
  expect(line('cb')?.re).toBeCloseTo((0.158 * 0.06) / 2, 12)
})

test('the capacitor gives 1.01 Mvar at 6.6 kV, and is there only where it is in service', () => {
  expect((c2.capacitors[0]?.susceptance ?? 0) * 6600 ** 2).toBeCloseTo(1.0083e6, -2)
  expect(caseOf(24).capacitors).toEqual([])
})

test('the own impedance of the autotransformer is 0.081 + j0.648 ohm on the line side', () => {
  const { starter } = starting('m4')
  if (starter.kind !== 'autotransformer') throw new Error('not an autotransformer')
  expect(starter.impedance.re).toBeCloseTo(0.081, 3)
  expect(starter.impedance.im).toBeCloseTo(0.648, 3)
  expect(starter.changeOver.kind === 'speed' && toRpm(starter.changeOver.at)).toBeCloseTo(980, 9)
})

test('the pump motor turns 340 kg·m² at 10 589 N·m rated, the booster 7.0 at 1 607', () => {
  expect(motor('m4').inertia).toBeCloseTo(340, 9)
  expect(motor('m4').ratedTorque).toBeCloseTo(10_589, 0)
  expect(motor('b1').inertia).toBeCloseTo(7, 9)
  expect(motor('b1').ratedTorque).toBeCloseTo(1607, 0)
})

test('per unit on 1350 kVA and 6.6 kV means 32.267 ohm', () => {
  expect(circuitOf(motor('m4').circuit).magnetising / 2.89).toBeCloseTo(32.267, 3)
  expect(circuitOf(motor('m4').circuit).cages[1]?.resistance).toBeCloseTo(0.054 * 32.267, 4)
})

test('declared values are absolute: locked-rotor torque in N·m, the permissible time for a hot start', () => {
  expect(motor('m4').declared.lockedRotorTorque).toBeCloseTo(0.855 * 10_589, 0)
  expect(motor('m4').declared.permissibleTime).toEqual({ time: 12, state: 'hot' })
})

test('a tolerance on the locked-rotor current divides every impedance and leaves the declared current alone', () => {
  expect(circuitOf(motor('m4').circuit).stator.im / circuitOf(motor('m4', 20).circuit).stator.im).toBeCloseTo(1.2, 12)
  expect(motor('m4', 20).declared).toEqual(motor('m4').declared)
  expect(motor('m1', 20).circuit).toEqual(motor('m1').circuit)
})

test('a corner of torque, inertia, impedance and voltage changes just these', () => {
  const corner = caseOf(21)
  expect(motor('m4', 21).torqueFactor).toBe(0.85)
  expect(motor('m4', 21).inertia).toBeCloseTo(374, 9)
  expect(corner.supply.hold).toEqual({ kind: 'bus-voltage', voltage: 31_400 })
  const t1 = (from: typeof c2) => from.transformers.find(({ id }) => id === 't1')?.impedance.im ?? 0
  expect(t1(corner) / t1(c2)).toBeCloseTo(1.1, 12)
  expect(corner.lines).toEqual(c2.lines)
})

test('only connected motors are in a case: what runs and what starts', () => {
  expect(c2.motors.map(({ id, duty }) => `${id} ${duty.kind}`)).toEqual([
    'm1 running',
    'm2 running',
    'm3 running',
    'b1 running',
    'm4 starting',
  ])
  expect(caseOf(4).motors.map(({ id }) => id)).toEqual(['b1', 'm1'])
})

test('the load starts against the closed valve and goes over to the open one', () => {
  const { load, processLoad } = starting('m4')
  expect(load).toMatchObject({ kind: 'power', constant: 300, exponent: 2 })
  expect(processLoad?.kind).toBe('points')
  expect(starting('m4', 7).load.kind).toBe('points')
})

test('limits keep their class of starts and apply to every case unless they name supplies', () => {
  expect(input.rules[0]).toMatchObject({
    id: 'r1',
    quantity: 'voltage-change',
    limit: { kind: 'value', value: 0.04 },
    appliesTo: { caseIds: null, methods: null, motorIds: null },
    startClass: { moreThanPerDay: 4, atMostPerHour: 2 },
  })
  expect(input.rules.find(({ id }) => id === 'r9')?.appliesTo.methods).toEqual(['direct'])
})
