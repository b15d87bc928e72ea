const isObject = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value)

const text = (value: string): string => {
  if (!value.isWellFormed()) throw new RangeError('a text with half a character has no canonical form')
  return JSON.stringify(value)
}

/** Plain order of UTF-16 code units, as the standard asks; a locale's order would differ between machines. */
const byCodeUnit = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0)

const write = (value: unknown): string => {
  if (value === null || typeof value === 'boolean') return String(value)
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw new RangeError(`${value} has no canonical form`)
    return JSON.stringify(value)
  }
  if (typeof value === 'string') return text(value)
  if (Array.isArray(value)) return `[${value.map(write).join(',')}]`
  if (!isObject(value)) throw new RangeError(`a value of type ${typeof value} has no canonical form`)
  const members = Object.keys(value)
    .filter((key) => value[key] !== undefined)
    .sort(byCodeUnit)
    .map((key) => `${text(key)}:${write(value[key])}`)
  return `{${members.join(',')}}`
}

/**
 * The one text form of a JSON value (RFC 8785, JSON Canonicalization Scheme): members in the order of their names, no
 * blanks, numbers as ECMAScript prints them. Throws a RangeError for what JSON cannot hold: it would be a bug.
 */
export const canonicalJson = (value: unknown): string => write(value)

/** The canonical text in UTF-8: the bytes that are stored, hashed and signed. */
export const canonicalBytes = (value: unknown): Uint8Array<ArrayBuffer> =>
  new TextEncoder().encode(canonicalJson(value))
