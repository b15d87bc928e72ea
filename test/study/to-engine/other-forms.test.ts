import { expect, test } from 'vitest'
import { circuitOf } from '@/lib/engine/case-input'
import { DomainError } from '@/lib/errors'
import { circuitInput, scaleAdmittance } from '@/lib/study/to-engine/circuit-input'
import { studyRunInput } from '@/lib/study/to-engine/study-run-input'
import { example } from '../support/examples'

const first = (document: ReturnType<typeof example>) => {
  const found = studyRunInput(document).cases[0]
  if (!found) throw new Error('no case')
  return found
}

test('a level given as a current stands for √3·U·I', () => {
  const { supply } = first(example('one-motor'))
  const size = Math.hypot(supply.impedance.re, supply.impedance.im)
  expect(size).toBeCloseTo(11_000 / (Math.sqrt(3) * 3200), 9)
  expect(supply.impedance.im / supply.impedance.re).toBeCloseTo(4, 9)
})

test('an unknown voltage factor is computed as 1.00', () => {
  const document = example('one-motor')
  const unknown = first(document).supply.impedance
  document.plant.supplies[0]!.voltageFactor = { kind: '1.00' }
  expect(first(document).supply.impedance).toEqual(unknown)
})

test('a stated impedance is taken as it is, whatever the voltage factor says', () => {
  const document = example('one-motor')
  const ohms = (si: number) =>
    ({ text: `${si} Ω`, si, quantity: 'impedance', style: 'point', provenance: null }) as const
  const supply = document.plant.supplies[0]!
  supply.level = { form: 'impedance', resistance: ohms(0.5), reactance: ohms(1.9) }
  supply.voltageFactor = { kind: '1.10' }
  expect(first(document).supply.impedance).toEqual({ re: 0.5, im: 1.9 })
})

test('an open-circuit voltage fixes the EMF itself', () => {
  const document = example('one-motor')
  const supply = document.plant.supplies[0]!
  supply.before = { kind: 'open-circuit', voltage: supply.before.voltage }
  expect(first(document).supply.hold).toEqual({ kind: 'emf', voltage: 10_900 })
})

test("a level that contains the plant's motors names every one of them", () => {
  const document = example('velmoor')
  for (const supply of document.plant.supplies) supply.plantMotorsIncluded = 'yes'
  expect(first(document).supply.motorsInLevel.map(({ busId }) => busId)).toEqual(['m1t', 'm2t', 'm3t', 'm4t', 'b1t'])
})

test('a tap of +5 % on the from side raises the ratio by 5 %, from the record or from the plant condition', () => {
  const document = example('one-motor')
  const ratio = first(document).transformers[0]!.ratio
  const tap = { text: '5 %', si: 0.05, quantity: 'ratio', style: 'point', provenance: null } as const
  document.plant.plantConditions[0]!.taps = [{ transformer: 't1', tap }]
  expect(first(document).transformers[0]!.ratio / ratio).toBeCloseTo(1.05, 12)
  document.plant.plantConditions[0]!.taps = []
  document.plant.transformers[0]!.tap = tap
  expect(first(document).transformers[0]!.ratio / ratio).toBeCloseTo(1.05, 12)
})

test('a load that turns at half speed counts with a quarter of its inertia', () => {
  const document = example('one-motor')
  const whole = first(document).motors[0]!.inertia
  const wheel = document.plant.drivenLoads[0]!.inertias[0]!
  wheel.speedRatio = { ...wheel.speedRatio, text: '0.5', si: 0.5 }
  // GD² of 180 kgf·m² is J = 45 kg·m².
  expect(whole).toBeCloseTo(4.6 + 45, 9)
  expect(first(document).motors[0]!.inertia).toBeCloseTo(4.6 + 45 / 4, 9)
})

test('a nameplate gives an estimated circuit with two cages, in ohm', () => {
  const circuit = circuitOf(first(example('one-motor')).motors[0]!.circuit)
  expect(circuit.cages).toHaveLength(2)
  // At standstill the circuit draws the declared current: |Z| = U/(√3·I), to the size of leakage and cages in parallel.
  const bar = 400 / (Math.sqrt(3) * 2950)
  expect(circuit.stator.im).toBeLessThan(bar)
  expect(circuit.magnetising).toBeGreaterThan(10 * bar)
})

test('a nameplate that no motor can have is refused with the reason', () => {
  const document = example('one-motor')
  const motor = document.plant.motors[0]!
  motor.efficiency = { ...motor.efficiency!, text: '99.9 %', si: 0.999 }
  try {
    studyRunInput(document)
    expect.unreachable()
  } catch (error) {
    if (!(error instanceof DomainError)) throw error
    expect(error.issues[0]?.path).toEqual(['plant', 'motors', 0, 'circuit'])
    expect(error.message).toMatch(/Efficiency 99\.90 % is not possible/)
  }
})

test('a single cage typed in ohm needs no base', () => {
  const motor = example('velmoor').plant.motors[0]!
  motor.circuit = {
    kind: 'single-cage',
    scale: { unit: 'ohm' },
    stator: { r: 0.3, x: 3.5 },
    magnetising: 93,
    core: null,
    cage: { r: 0.32, x: 3.4 },
    provenance: null,
  }
  const outcome = circuitInput(motor, () => expect.unreachable())
  expect(outcome).toEqual({
    ok: true,
    circuit: {
      stator: { re: 0.3, im: 3.5 },
      magnetising: 93,
      core: null,
      cages: [{ resistance: 0.32, reactance: 3.4 }],
    },
  })
  if (outcome.ok)
    expect(circuitOf(scaleAdmittance(outcome.circuit!, 2)).cages[0]).toEqual({ resistance: 0.16, reactance: 1.7 })
})

test('a limit that names a supply applies to the cases with that supply', () => {
  const document = example('velmoor')
  document.limits[0]!.appliesTo = { supplies: ['usual'], plantConditions: null, methods: null, motors: null }
  document.limits[1]!.appliesTo = { supplies: ['weakest'], plantConditions: ['first'], methods: null, motors: null }
  const { rules } = studyRunInput(document)
  expect(rules[0]?.appliesTo.caseIds).toEqual(['case-14', 'case-15'])
  expect(rules[1]?.appliesTo.caseIds).toEqual(['case-3', 'case-4', 'case-16'])
})

test('records that no case touches do not stop the study', () => {
  const document = example('one-motor')
  const spare = { ...document.plant.motors[0]!, id: 'spare', tag: 'MF2' }
  spare.efficiency = { ...spare.efficiency!, text: '99.9 %', si: 0.999 }
  document.plant.motors.push(spare)
  expect(first(document).motors).toHaveLength(1)
})
