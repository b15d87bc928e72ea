import type { ReportInput } from '../report-input'

/** Limits that are held against some case with the declared frequency of starts. */
export const limitsInUse = ({ document, result }: ReportInput): ReadonlySet<string> => {
  const idle = new Set(result.verdicts.filter((verdict) => !verdict.inUse).map((verdict) => verdict.ruleId))
  const used = new Set(result.verdicts.filter((verdict) => verdict.inUse).map((verdict) => verdict.ruleId))
  // A limit that applies to no computed case is not shown as out of use: nothing says that its class is.
  return new Set(document.limits.map(({ id }) => id).filter((id) => used.has(id) || !idle.has(id)))
}
