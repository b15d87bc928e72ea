import { DomainError, type Result } from '../../errors'

/** The version that this program writes and computes. */
export const currentFormatVersion = 1

type Step = (document: Record<string, unknown>) => Record<string, unknown>

/** How a document of version n becomes one of version n + 1; every later version adds its step and never changes an old one. */
const steps: Readonly<Record<number, Step>> = {}

const refuse = (message: string, path: readonly string[]): Result<never> => ({
  ok: false,
  error: new DomainError('unsupported', message, [{ path, message }]),
})

const isObject = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value)

/**
 * Brings a parsed file up to the current version, one step after the other. The steps and the version wanted are
 * parameters so that the mechanism can be tested before there is a second version.
 */
export const upgrade = (
  value: unknown,
  wanted: number = currentFormatVersion,
  known: Readonly<Record<number, Step>> = steps,
): Result<Record<string, unknown>> => {
  if (!isObject(value)) return refuse('This is not a study file: it does not hold a record in braces.', [])
  if (value.format !== 'breakaway-study')
    return refuse('This is not a study file: its “format” does not say “breakaway-study”.', ['format'])
  const version = value.formatVersion
  if (typeof version !== 'number' || !Number.isInteger(version) || version < 1)
    return refuse(`Give the version of the format, a whole number; it is ${wanted} now.`, ['formatVersion'])
  if (version > wanted)
    return refuse(
      `This file is of version ${version} of the format and this program reads up to ${wanted}; use a newer program.`,
      ['formatVersion'],
    )
  let document = value
  for (let from = version; from < wanted; from += 1) {
    const step = known[from]
    if (!step) throw new Error(`there is no step from version ${from} to ${from + 1}`)
    document = { ...step(document), formatVersion: from + 1 }
  }
  return { ok: true, value: document }
}
