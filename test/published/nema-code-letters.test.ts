import { describe, expect, test } from 'vitest'
import {
  type CodeLetter,
  codeLetter,
  codeLetterRange,
  kvaPerHorsepower,
  lockedRotorCurrentOf,
} from '@/lib/study/nameplate/code-letter'
import { ampere, volt, watt } from '@/lib/units/si'

const horsepower = 745.699871582

describe('NEMA MG 1, 10.37.2, and NEC Table 430.7(B), as reprinted by EASA: locked-rotor code letters', () => {
  test.each<[number, CodeLetter]>([
    [0, 'A'],
    [3.14, 'A'],
    [3.149999, 'A'],
    [3.15, 'B'],
    [3.54, 'B'],
    [3.55, 'C'],
    [4.49, 'D'],
    [5.5999, 'F'],
    [5.6, 'G'],
    [6.2999, 'G'],
    [6.3, 'H'],
    [7.99, 'J'],
    [8, 'K'],
    [9.9999, 'L'],
    [10, 'M'],
    [11.2, 'N'],
    [12.5, 'P'],
    [15.99, 'R'],
    [16, 'S'],
    [18, 'T'],
    [20, 'U'],
    [22.3999, 'U'],
    [22.4, 'V'],
    [40, 'V'],
  ])('%d kVA/hp is letter %s', (kva, letter) => {
    expect(codeLetter(kva)).toBe(letter)
  })

  test('each range begins where the one before ends, and the last has no end', () => {
    expect(codeLetterRange('G')).toEqual({ from: 5.6, below: 6.3 })
    expect(codeLetterRange('V')).toEqual({ from: 22.4, below: null })
  })

  test('a negative figure is no kVA per horsepower', () => {
    expect(() => codeLetter(-1)).toThrow(RangeError)
    expect(() => codeLetter(Number.NaN)).toThrow(RangeError)
  })
})

describe('NEMA MG 1, 12.35, and NEC Table 430.251(B), in three agreeing reprints: largest locked-rotor current at 230 V', () => {
  // The kVA/hp are recomputed from the tabled amperes.
  test.each<[number, number, number, CodeLetter]>([
    [100, 1450, 5.78, 'G'],
    [50, 725, 5.78, 'G'],
    [10, 162, 6.45, 'H'],
    [5, 92, 7.33, 'J'],
    [1, 30, 11.95, 'N'],
  ])('%d hp with %d A has %d kVA/hp, letter %s', (hp, current, expected, letter) => {
    const kva = kvaPerHorsepower(ampere(current), volt(230), watt(hp * horsepower))
    expect(kva).toBeCloseTo(expected, 2)
    expect(codeLetter(kva)).toBe(letter)
  })
})

describe('Chapman, Electric Machinery Fundamentals (answer from memory): inrush from the code letter', () => {
  test('15 hp, 208 V, code F draws up to 84 kVA and 233 A', () => {
    const { below } = lockedRotorCurrentOf('F', watt(15 * horsepower), volt(208))
    expect(below).toBeCloseTo(233.16, 1)
    expect((Math.sqrt(3) * 208 * below!) / 1000).toBeCloseTo(84, 6)
  })
})

describe('Hubert, Electric Machines, example 5.13: inrush from the code letter', () => {
  test('150 hp, 460 V, code G draws 1054 A to 1186 A', () => {
    const { from, below } = lockedRotorCurrentOf('G', watt(150 * horsepower), volt(460))
    expect(from).toBeCloseTo(1054, -0.3)
    expect(below).toBeCloseTo(1186, -0.3)
  })
})
