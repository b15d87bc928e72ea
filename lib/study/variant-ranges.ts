import type { CaseResult, CaseVariant, StartResult } from '../engine/case-result'

export interface Range {
  from: number
  to: number
}

/** What one motor's start becomes over the variants of a case of one kind. */
export interface VariantRange {
  motorId: string
  kind: Extract<CaseVariant['kind'], 'same-plate' | 'low-voltage-torque'>
  /** Machines or assumptions in the range; with `same-plate` the estimated machine itself is one of them. */
  count: number
  /** Time to the running position, s; null where some do not get there. */
  runUp: Range | null
  /** How many do not get to speed. */
  missed: number
  /** Least accelerating torque in parts of rated torque. */
  leastAccelerating: Range
}

const rangeOf = (values: readonly number[]): Range => ({ from: Math.min(...values), to: Math.max(...values) })

const startIn = (result: Pick<CaseResult, 'motors'>, motorId: string): StartResult | null =>
  result.motors.find((motor) => motor.motorId === motorId)?.start ?? null

/** Ranges of every started motor of a case over what the records leave open; empty where nothing is. */
export const variantRanges = (result: Pick<CaseResult, 'motors' | 'variants'>): readonly VariantRange[] =>
  (['same-plate', 'low-voltage-torque'] as const).flatMap((kind) => {
    const variants = (result.variants ?? []).filter((variant) => variant.kind === kind)
    if (variants.length === 0) return []
    return result.motors.flatMap(({ motorId, start }): VariantRange[] => {
      if (!start) return []
      const own = kind === 'same-plate' ? [start] : []
      const starts = [...own, ...variants.flatMap((variant) => startIn(variant.result, motorId) ?? [])]
      if (starts.length === 0) return []
      const times = starts.flatMap(({ outcome }) => (outcome.kind === 'started' ? [outcome.at] : []))
      const missed = starts.length - times.length
      return [
        {
          motorId,
          kind,
          count: starts.length,
          runUp: missed === 0 ? rangeOf(times) : null,
          missed,
          leastAccelerating: rangeOf(starts.map((each) => each.leastAccelerating.ofRated)),
        },
      ]
    })
  })
