import { describe, expect, test } from 'vitest'
import { parseQuantity } from '@/lib/quantity/parse-quantity'
import { printQuantity } from '@/lib/quantity/print-quantity'
import type { QuantityName } from '@/lib/quantity/quantity-name'
import { codeLetter, kvaPerHorsepower } from '@/lib/study/nameplate/code-letter'
import { ampere, volt, watt } from '@/lib/units/si'
import { atTerminals, breakdown, type TextbookMachine } from './support/at-terminals'
import { behind, direct, inStar, startOf } from './support/one-motor-case'
import { noMagnetising, singleCage } from './support/single-cage'
import { within } from './support/within'

const read = (text: string, quantity: QuantityName): number => {
  const outcome = parseQuantity(text, quantity)
  if (!outcome.ok) throw new Error(outcome.message)
  return outcome.si
}
const poundFeet = (torque: number): number => torque / read('1 lb·ft', 'torque')
const ratedTorque = (power: string, speed: string): number => read(power, 'active-power') / read(speed, 'speed')

// Inputs and method: a public set of worked companions to the book, answers recomputed.
describe('Hubert, Electric Machines, example 5.2: a six-pole motor at 1185 r/min', () => {
  const motor: TextbookMachine = {
    circuit: singleCage(0.2, 1.2, 42, 0.25, 1.29, 317),
    voltage: 460,
    frequency: 60,
    poles: 6,
  }
  const at = atTerminals(motor, 0.0125)

  test('current 15.113 A at −30.227°, power factor 0.864, input 10 403.8 W', () => {
    expect(at.current).toBeCloseTo(15.113, 3)
    expect(at.angle).toBeCloseTo(-30.227, 3)
    expect(at.powerFactor).toBeCloseTo(0.864, 3)
    expect(at.input).toBeCloseTo(10_403.8, 0)
  })

  test('rotor current 12.685 A, airgap power 9655.1 W, torque 76.83 N·m = 56.67 lb·ft', () => {
    expect(at.rotorCurrent).toBeCloseTo(12.685, 3)
    expect(at.airgapPower).toBeCloseTo(9655.1, 0)
    expect(at.torque).toBeCloseTo(76.83, 2)
    expect(printQuantity(at.torque, 'torque', { system: 'US', digits: 4 })).toBe('56.67\u2009lb·ft')
  })

  test('locked rotor 106.65 A at power factor 0.1767 with 63.80 N·m; breakdown 299.15 N·m at slip 0.1015', () => {
    const locked = startOf(motor).standstill
    expect(locked.lineCurrent).toBeCloseTo(106.65, 2)
    expect(locked.powerFactor).toBeCloseTo(0.1767, 4)
    expect(locked.torque).toBeCloseTo(63.8, 1)
    expect(breakdown(motor).slip).toBeCloseTo(0.1015, 4)
    within(breakdown(motor).torque, 299.15, 1e-4)
  })
})

describe('Hubert, Electric Machines, example 5.3: breakdown without a magnetising branch', () => {
  test('40 hp, 460 V: slip 0.1490, 1532 r/min, 366.5 lb·ft; rated torque 120.0 lb·ft', () => {
    const motor = {
      circuit: singleCage(0.102, 0.409, noMagnetising, 0.153, 0.613),
      voltage: 460,
      frequency: 60,
      poles: 4,
    }
    const { slip, torque } = breakdown(motor)
    expect(slip).toBeCloseTo(0.149, 4)
    expect(1800 * (1 - slip)).toBeCloseTo(1532, -0.3)
    within(poundFeet(torque), 366.5, 5e-4)
    expect(poundFeet(ratedTorque('40 hp', '1751 r/min'))).toBeCloseTo(120, 1)
  })
})

describe('Hubert, Electric Machines, example 5.1: least torques of a design C motor of 10 hp', () => {
  test('rated torque 45.7 lb·ft; 225, 190 and 165 % of it are 102.8, 86.8 and 75.4 lb·ft', () => {
    const rated = poundFeet(ratedTorque('10 hp', '1150 r/min'))
    expect(rated).toBeCloseTo(45.7, 1)
    const parts = ['225 %', '190 %', '165 %'].map((text) => rated * read(text, 'ratio'))
    ;[102.8, 86.8, 75.4].forEach((published, i) => {
      within(parts[i]!, published, 1e-3)
    })
  })
})

describe('Hubert, Electric Machines, example 5.4: locked-rotor torque at 90 % voltage', () => {
  test('50 hp at 1760 r/min: rated 149.2 lb·ft, locked-rotor torque of 140 % falls to 169.2 lb·ft, by 19 %', () => {
    const rated = ratedTorque('50 hp', '1760 r/min')
    expect(poundFeet(rated)).toBeCloseTo(149.2, 1)
    // Any machine shows the ratio; the level is the example's 140 %.
    const motor = { circuit: singleCage(0.087, 0.302, 13.08, 0.228, 0.302), voltage: 460, frequency: 60, poles: 4 }
    const full = startOf(motor).standstill.torque
    const reduced = startOf({ ...motor, supply: 0.9 * 460 }).standstill.torque
    expect(reduced / full).toBeCloseTo(0.81, 6)
    within(poundFeet(1.4 * rated * (reduced / full)), 169.2, 1e-3)
  })
})

describe('Hubert, Electric Machines, example 5.19: a star-delta start of 60 hp', () => {
  // 0.547 Ω a winding locked, locked-rotor torque 140 % of rated: the star equivalent is a third of the winding.
  const star = 0.547 / 3
  const rated = ratedTorque('60 hp', '1750 r/min')
  const current = 460 / Math.sqrt(3) / star
  const resistance = (1.4 * rated * ((4 * Math.PI * 60) / 4)) / (3 * current ** 2)
  const motor = {
    circuit: singleCage(0, 0, noMagnetising, resistance, Math.sqrt(star ** 2 - resistance ** 2)),
    voltage: 460,
    frequency: 60,
    poles: 4,
  }

  test('in delta 1456.6 A and 252.1 lb·ft', () => {
    const { lineCurrent, torque } = startOf({ ...motor, starter: direct }).standstill
    within(lineCurrent, 1456.6, 1e-4)
    within(poundFeet(torque), 252.1, 1e-3)
  })

  test('in star 485.5 A and 84.0 lb·ft', () => {
    const { lineCurrent, torque } = startOf({ ...motor, starter: inStar }).standstill
    within(lineCurrent, 485.5, 1e-4)
    within(poundFeet(torque), 84, 1e-3)
  })

  test('19.34 kVA per horsepower is code letter T', () => {
    const { lineCurrent } = startOf({ ...motor, starter: direct }).standstill
    const kva = kvaPerHorsepower(ampere(lineCurrent), volt(460), watt(read('60 hp', 'active-power')))
    expect(kva).toBeCloseTo(19.34, 2)
    expect(codeLetter(kva)).toBe('T')
  })
})

describe('Hubert, Electric Machines, example 5.21: a series reactor for 7.5 hp at 208 V', () => {
  const motor = { circuit: singleCage(0, 0, noMagnetising, 0.294, 0.809), voltage: 208, frequency: 60, poles: 4 }

  test('locked 0.861 Ω and 139.5 A', () => {
    expect(Math.hypot(0.294, 0.809)).toBeCloseTo(0.861, 3)
    within(startOf({ ...motor, starter: direct }).standstill.lineCurrent, 139.5, 1e-3)
  })

  test('1.6755 Ω (4.44 mH at 60 Hz) hold 48 A with 80.4 V across the reactor', () => {
    const { lineCurrent, motorVoltage } = startOf({ ...motor, starter: behind('reactor', 1.6755) }).standstill
    within(lineCurrent, 48, 1e-3)
    expect((1.6755 / (2 * Math.PI * 60)) * 1e3).toBeCloseTo(4.44, 2)
    within(lineCurrent * 1.6755, 80.4, 1e-3)
    within(motorVoltage, Math.sqrt(3) * 48 * 0.861, 1e-3)
  })
})
