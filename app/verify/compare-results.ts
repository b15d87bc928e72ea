import { formatNumber } from '@/lib/quantity/format-number'

/** One value that came out differently. */
export interface Difference {
  /** Which value, in words. */
  readonly where: string
  readonly attached: string
  readonly here: string
}

export interface Comparison {
  readonly compared: number
  readonly differing: number
  /** The first differences, at most `shownAtMost`. */
  readonly differences: readonly Difference[]
  readonly engine: { readonly attached: string | null; readonly here: string | null }
}

/** What is not a value of the study: curves are not attached, and counters tell how the solver went, which may vary by machine. */
const leftOut = new Set(['series', 'counters', 'engineVersion'])
const shownAtMost = 50
/** Reports print at most so many significant digits. */
const printedDigits = 6
/** Elementary functions differ in the last place between browsers. */
const noise = 1e-9

/** Compares two results of a study value by value: numbers at the digits that a report prints, everything else exactly. */
export function compareResults(attached: unknown, here: unknown): Comparison {
  const differences: Difference[] = []
  let compared = 0
  let differing = 0
  const walk = (a: unknown, b: unknown, where: readonly string[]) => {
    if (isBranch(a) && isBranch(b) && Array.isArray(a) === Array.isArray(b)) {
      for (const key of keysOf(a, b)) walk(a[key], b[key], [...where, ...nameOf(key, a[key] ?? b[key])])
      return
    }
    compared += 1
    if (agree(a, b)) return
    differing += 1
    if (differences.length < shownAtMost)
      differences.push({ where: where.join(', '), attached: show(a), here: show(b) })
  }
  walk(attached, here, [])
  return { compared, differing, differences, engine: { attached: engineOf(attached), here: engineOf(here) } }
}

type Branch = Record<string, unknown>

function isBranch(value: unknown): value is Branch {
  return typeof value === 'object' && value !== null
}

/** A value that is left out of one side counts as null, as it does in JSON. */
function keysOf(a: Branch, b: Branch): string[] {
  return [...new Set([...Object.keys(a), ...Object.keys(b)])].filter((key) => !leftOut.has(key))
}

function agree(a: unknown, b: unknown): boolean {
  if (typeof a === 'number' && typeof b === 'number') {
    if (Math.abs(a - b) <= noise * Math.max(1, Math.abs(a), Math.abs(b))) return true
    return formatNumber(a, { digits: printedDigits }) === formatNumber(b, { digits: printedDigits })
  }
  // JSON has no infinity: it writes null.
  return plain(a) === plain(b)
}

const plain = (value: unknown) =>
  value === undefined || (typeof value === 'number' && !Number.isFinite(value)) ? null : value

const identities = ['caseId', 'ruleId', 'busId', 'motorId'] as const

/** A list's item by what it is about, any other value by its name in words. */
function nameOf(key: string, value: unknown): string[] {
  if (!/^\d+$/.test(key)) return [key.replace(/([A-Z])/g, ' $1').toLowerCase()]
  const about = isBranch(value)
    ? identities.flatMap((name) => (typeof value[name] === 'string' ? [value[name]] : []))
    : []
  return about.length > 0 ? about : [`no. ${Number(key) + 1}`]
}

function show(value: unknown): string {
  if (typeof value === 'number') return formatNumber(value, { digits: printedDigits })
  return value === undefined || value === null ? 'none' : isBranch(value) ? 'several values' : String(value)
}

function engineOf(value: unknown): string | null {
  return isBranch(value) && typeof value.engineVersion === 'string' ? value.engineVersion : null
}
