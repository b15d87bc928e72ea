/** A formula that was read: its value for a speed n in r/min and x, the same in parts of rated speed. */
export type Formula = (n: number, x: number) => number

export type ParsedFormula = { ok: true; formula: Formula } | { ok: false; message: string }

type Token = { kind: 'number'; value: number; at: number } | { kind: 'name' | 'sign'; text: string; at: number }

const functions: Readonly<Record<string, { fewest: number; most: number; of: (...values: number[]) => number }>> = {
  abs: { fewest: 1, most: 1, of: Math.abs },
  sqrt: { fewest: 1, most: 1, of: Math.sqrt },
  exp: { fewest: 1, most: 1, of: Math.exp },
  ln: { fewest: 1, most: 1, of: Math.log },
  sin: { fewest: 1, most: 1, of: Math.sin },
  cos: { fewest: 1, most: 1, of: Math.cos },
  min: { fewest: 2, most: 8, of: Math.min },
  max: { fewest: 2, most: 8, of: Math.max },
}

const longest = 400
const deepest = 40

class Unreadable extends Error {}

const tokenPattern = /\s*(?:(\d+(?:\.\d+)?(?:e[+-]?\d+)?|\.\d+(?:e[+-]?\d+)?)|([a-z]+)|([-+*/^(),]))/iy

function tokens(text: string): Token[] {
  const found: Token[] = []
  let at = 0
  while (at < text.length && text.slice(at).trim() !== '') {
    tokenPattern.lastIndex = at
    const match = tokenPattern.exec(text)
    if (match === null) throw new Unreadable(`“${text.slice(at).trim()[0]}” has no place in a formula.`)
    const [, number, name, sign] = match
    if (number !== undefined) found.push({ kind: 'number', value: Number(number), at })
    else found.push(name === undefined ? { kind: 'sign', text: sign!, at } : { kind: 'name', text: name, at })
    at = tokenPattern.lastIndex
  }
  return found
}

/**
 * Reads a torque formula: numbers, + − * / ^, brackets, n (r/min), x (n over rated speed) and the functions abs, sqrt,
 * exp, ln, sin, cos, min, max. Nothing else exists in it, so it can do nothing but arithmetic. Powers bind first and
 * from the right, a sign before a power applies to the whole power: −x^2 is −(x^2).
 */
export function parseFormula(text: string): ParsedFormula {
  try {
    if (text.length > longest) throw new Unreadable(`Keep the formula within ${longest} characters.`)
    const list = tokens(text.replaceAll('−', '-').replaceAll('·', '*').replaceAll('×', '*').replaceAll('²', '^2'))
    let next = 0
    let depth = 0
    const takes = (sign: string): boolean => {
      const token = list[next]
      if (token?.kind !== 'sign' || token.text !== sign) return false
      next++
      return true
    }
    const needs = (sign: string): void => {
      if (!takes(sign)) throw new Unreadable(`A “${sign}” is missing.`)
    }

    const sum = (): Formula => {
      if (++depth > deepest) throw new Unreadable('The formula is nested too deep.')
      let left = product()
      for (;;) {
        const [a, plus] = [left, takes('+')]
        if (!plus && !takes('-')) break
        const b = product()
        left = plus ? (n, x) => a(n, x) + b(n, x) : (n, x) => a(n, x) - b(n, x)
      }
      depth--
      return left
    }
    const product = (): Formula => {
      let left = signed()
      for (;;) {
        const [a, times] = [left, takes('*')]
        if (!times && !takes('/')) return left
        const b = signed()
        left = times ? (n, x) => a(n, x) * b(n, x) : (n, x) => a(n, x) / b(n, x)
      }
    }
    const signed = (): Formula => {
      if (++depth > deepest) throw new Unreadable('The formula is nested too deep.')
      const minus = takes('-')
      const value = minus || takes('+') ? signed() : power()
      depth--
      return minus ? (n, x) => -value(n, x) : value
    }
    const power = (): Formula => {
      const base = atom()
      if (!takes('^')) return base
      const exponent = signed()
      return (n, x) => base(n, x) ** exponent(n, x)
    }
    const atom = (): Formula => {
      if (takes('(')) {
        const inner = sum()
        needs(')')
        return inner
      }
      const token = list[next++]
      if (token === undefined) throw new Unreadable('The formula ends too early.')
      if (token.kind === 'number') return () => token.value
      if (token.kind === 'sign') throw new Unreadable(`A value is missing before “${token.text}”.`)
      return named(token.text)
    }
    const named = (name: string): Formula => {
      if (name === 'n') return (n) => n
      if (name === 'x') return (_, x) => x
      const call = Object.hasOwn(functions, name) ? functions[name] : undefined
      if (call === undefined)
        throw new Unreadable(`“${name}” is not known; use n, x, ${Object.keys(functions).join(', ')}.`)
      needs('(')
      const values = [sum()]
      while (takes(',')) values.push(sum())
      needs(')')
      if (values.length < call.fewest || values.length > call.most)
        throw new Unreadable(`“${name}” has too ${values.length < call.fewest ? 'few' : 'many'} values.`)
      return (n, x) => call.of(...values.map((value) => value(n, x)))
    }

    const formula = sum()
    const rest = list[next]
    if (rest !== undefined) throw new Unreadable(`Something is wrong at place ${rest.at + 1} of the formula.`)
    return { ok: true, formula }
  } catch (error) {
    if (error instanceof Unreadable) return { ok: false, message: error.message }
    throw error
  }
}
