import type { ChangeOver, Starter } from '../case-input'

/**
 * How a motor is connected. `off` and `open` draw nothing; `tap` is on the autotransformer, `star` in star,
 * `running` directly on its bus.
 */
export type Position = 'off' | 'tap' | 'star' | 'open' | 'running'

/** The position after switching on. */
export function firstPosition(starter: Starter): Position {
  if (starter.kind === 'autotransformer') return 'tap'
  return starter.kind === 'star-delta' ? 'star' : 'running'
}

/** What makes a starting device leave its first position; null for direct-on-line. */
export const changeOverOf = (starter: Starter): ChangeOver | null =>
  starter.kind === 'direct' ? null : starter.changeOver

/** Seconds without voltage between the two positions. */
export const gapOf = (starter: Starter): number => (starter.kind === 'direct' ? 0 : starter.gap)
