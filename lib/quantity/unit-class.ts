import { createUnitClass } from 'mathjs'

interface ParsedUnit {
  value: number | null
  equalBase(other: ParsedUnit): boolean
}

interface UnitClass {
  parse(text: string): ParsedUnit
  createUnitSingle(name: string, definition: string | { prefixes: string; baseName: string }): unknown
}

// The package exports the factory at run time and leaves it out of its types.
declare module 'mathjs' {
  export function createUnitClass(dependencies: Record<string, unknown>): UnitClass
}

const absent = class {}

/** The unit parser of mathjs over plain numbers: the rest of the package stays out of the browser. */
const Unit = createUnitClass({
  on: undefined,
  config: { number: 'number', predictable: false },
  addScalar: (a: number, b: number) => a + b,
  subtractScalar: (a: number, b: number) => a - b,
  multiplyScalar: (a: number, b: number) => a * b,
  divideScalar: (a: number, b: number) => a / b,
  pow: (a: number, b: number) => a ** b,
  abs: Math.abs,
  fix: Math.trunc,
  round: Math.round,
  equal: (a: number, b: number) => a === b,
  isNumeric: (value: unknown) => typeof value === 'number',
  format: String,
  number: Number,
  Complex: absent,
  BigNumber: absent,
  Fraction: absent,
})

// Dimensions of their own, so that kVA, kW and kvar are never taken for one another.
Unit.createUnitSingle('voltampere', { prefixes: 'short', baseName: 'APPARENT_POWER' })
Unit.createUnitSingle('reactivevar', { prefixes: 'short', baseName: 'REACTIVE_POWER' })
// Exact definitions: the package rounds the horsepower.
Unit.createUnitSingle('mechanicalhorsepower', '550 ft*lbf/s')
Unit.createUnitSingle('metrichorsepower', '75 kgf*m/s')
Unit.createUnitSingle('kilofoot', '1000 ft')
Unit.createUnitSingle('slug', '1 lbf*s^2/ft')

const parsed = new Map<string, ParsedUnit>()

const parse = (expression: string): ParsedUnit => {
  const known = parsed.get(expression)
  if (known) return known
  const unit = Unit.parse(`1 ${expression}`)
  parsed.set(expression, unit)
  return unit
}

/** How many SI units one unit is; the expression is in the words of `unit-words`, never typed text. */
export const unitFactor = (expression: string): number => parse(expression).value ?? Number.NaN

/** Whether two unit expressions measure the same thing. */
export const sameDimension = (a: string, b: string): boolean => parse(a).equalBase(parse(b))
