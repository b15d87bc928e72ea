import fc from 'fast-check'
import { evaluate } from 'mathjs'
import { describe, expect, it } from 'vitest'
import { parseFormula } from '@/lib/study/formula/formula'
import { sampleCurve } from '@/lib/study/formula/sample-formula'

const value = (text: string, n = 0, x = 0): number => {
  const parsed = parseFormula(text)
  if (!parsed.ok) throw new Error(parsed.message)
  return parsed.formula(n, x)
}
const message = (text: string): string => {
  const parsed = parseFormula(text)
  return parsed.ok ? '' : parsed.message
}

describe('a torque formula', () => {
  it('has arithmetic, the speed in two forms and a few functions', () => {
    expect(value('100 + 800*x^2', 740, 0.5)).toBe(300)
    expect(value('0.5*n − 3', 10)).toBe(2)
    expect(value('max(50, 1400·(1 − x))', 0, 0.25)).toBe(1050)
    expect(value('900*x²', 0, 2)).toBe(3600)
    expect(value('2^3^2')).toBe(512)
    expect(value('-x^2', 0, 3)).toBe(-9)
    expect(value('2^-1')).toBe(0.5)
    expect(value('1.5e3/ (2+1)')).toBe(500)
  })

  it('agrees with a general library on any arithmetic', () => {
    const leaf = fc.oneof(fc.integer({ min: 0, max: 999 }).map(String), fc.constantFrom('x', 'n', '0.25', '1e2'))
    const { tree } = fc.letrec<{ tree: string }>((tie) => ({
      tree: fc.oneof(
        { maxDepth: 4 },
        leaf,
        fc
          .tuple(tie('tree'), fc.constantFrom('+', '-', '*', '/'), tie('tree'))
          .map(([a, sign, b]) => `(${a} ${sign} ${b})`),
        tie('tree').map((a) => `-${a}`),
        tie('tree').map((a) => `abs(${a})^2`),
        fc.tuple(tie('tree'), tie('tree')).map(([a, b]) => `max(${a}, ${b})`),
      ),
    }))
    fc.assert(
      fc.property(tree, fc.double({ min: 0.01, max: 2, noNaN: true }), (text, x) => {
        const [own, other] = [value(text, 1500 * x, x), Number(evaluate(text, { n: 1500 * x, x }))]
        if (Number.isFinite(other)) expect(Math.abs(own - other)).toBeLessThanOrEqual(1e-9 * Math.abs(other))
        else expect(Number.isFinite(own)).toBe(false)
      }),
      { numRuns: 300 },
    )
  })

  it('says what is wrong and where', () => {
    expect(message('')).toBe('The formula ends too early.')
    expect(message('3 +')).toBe('The formula ends too early.')
    expect(message('(3 + x')).toBe('A “)” is missing.')
    expect(message('3 * * 4')).toBe('A value is missing before “*”.')
    expect(message('3 4')).toMatch(/wrong at place/)
    expect(message('speed')).toMatch(/“speed” is not known; use n, x/)
    expect(message('max(3)')).toBe('“max” has too few values.')
    expect(message('3 $ 4')).toBe('“$” has no place in a formula.')
    expect(message('x'.repeat(401))).toMatch(/400 characters/)
    expect(message(`${'('.repeat(60)}x${')'.repeat(60)}`)).toMatch(/nested too deep/)
    expect(message(`${'-'.repeat(60)}x`)).toMatch(/nested too deep/)
  })

  it('reaches nothing but arithmetic, whatever is typed', () => {
    for (const text of [
      'constructor',
      'toString()',
      '__proto__',
      'import("fs")',
      'x.constructor',
      'this',
      'abs.call(1)',
      'n=3',
    ]) {
      expect(parseFormula(text).ok).toBe(false)
    }
    fc.assert(
      fc.property(fc.string({ maxLength: 60 }), (text) => {
        const parsed = parseFormula(text)
        if (parsed.ok) expect(typeof parsed.formula(1000, 0.5)).toBe('number')
        else expect(parsed.message.length).toBeGreaterThan(0)
      }),
      { numRuns: 2000 },
    )
  })
})

describe('sampling a curve', () => {
  it('sets points until no line departs by more than a ten-thousandth of the largest value', () => {
    const curve = sampleCurve((x) => 300 + 4000 * x ** 2, 0, 1.2)!
    expect(curve.departure).toBeLessThanOrEqual(1e-4)
    for (let x = 0; x <= 1.2; x += 0.0013) {
      const i = curve.at.findIndex((at) => at >= x) || 1
      const part = (x - curve.at[i - 1]!) / (curve.at[i]! - curve.at[i - 1]!)
      const line = curve.values[i - 1]! + part * (curve.values[i]! - curve.values[i - 1]!)
      expect(Math.abs(line - 300 - 4000 * x ** 2)).toBeLessThan(1.01e-4 * 6060)
    }
  })

  it('keeps to the ends and to rising speeds, and says how far it is off where points run out', () => {
    const wild = sampleCurve((x) => Math.sin(3000 * x), 0, 1)!
    expect(wild.at.length).toBe(200)
    expect(wild.departure).toBeGreaterThan(1e-4)
    expect([wild.at[0], wild.at.at(-1)]).toEqual([0, 1])
    expect(wild.at.every((at, i) => i === 0 || at > wild.at[i - 1]!)).toBe(true)
  })

  it('has no points where the curve has no value', () => {
    expect(sampleCurve((x) => 1 / x, 0, 1)).toBeNull()
    expect(sampleCurve((x) => Math.sqrt(x - 0.5), 0, 1)).toBeNull()
  })
})
