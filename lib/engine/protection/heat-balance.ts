import { type PerUnit, perUnit, type Second, second } from '../../units/si'
import type { ThermalData } from '../protection-input'

/** Heat of a motor in parts of what locked rotor may bring from cold (from hot where only that is declared). */
export interface HeatBalance {
  /** Heat of running at full load, 1 − t_hot/t_cold; null where one of the two is not declared. */
  running: PerUnit | null
  ofStart: PerUnit
  before: PerUnit
  after: PerUnit
  /** Starts in succession without cooling between them; from hot null where that state is unknown. Null for a start that did not get there. */
  inSuccession: { cold: number; hot: number | null } | null
  /** Standstill before the same start fits again; null where cooling is unknown or it never fits. */
  restBeforeNext: Second | null
  /** Starts an hour without end: the least over motors stopped and running in between, as far as known; null where neither is. */
  perHour: number | null
}

/** Starts an hour beyond which nobody asks. */
const most = 60
const whole = (value: number): number => Math.floor(value + 1e-9)

/** Heat before a start in a sequence without end of starts of one heat, cooling towards a rest. */
const periodic = (heat: number, towards: number, gap: number, constant: number): number => {
  const left = Math.exp(-gap / constant)
  return towards + (heat * left) / (1 - left)
}

/** Heat of running at full load by the two permissible locked-rotor times; null where it cannot be told. */
export const heatOfRunning = ({ cold, hot }: ThermalData): number | null =>
  cold === null || hot === null || hot > cold ? null : 1 - hot / cold

/**
 * Heat of starts one after the other: each adds its own, a rest lets it fall towards ambient with the constant of
 * standstill (not at all where that is unknown). First-order, one body; common practice for repeated starts.
 *
 * @param starts heat used by each in parts of the permissible in `state`, how long it lasts and the rest after it, s,
 *   and whether it got there, so that it can be repeated
 * @param state the motor's before the first
 * @returns one balance a start; null where no permissible time fits the state
 */
export function heatBalances(
  thermal: ThermalData,
  state: 'hot' | 'cold',
  starts: readonly { used: number; lasts: number; rest: number; complete: boolean }[],
): HeatBalance[] | null {
  const own = state === 'hot' ? thermal.hot : thermal.cold
  const base = thermal.cold ?? thermal.hot
  if (own === null || base === null) return null
  const running = heatOfRunning(thermal)
  let heat = state === 'hot' ? (running ?? 0) : 0
  return starts.map(({ used, lasts, rest, complete }) => {
    const ofStart = (used * own) / base
    const before = heat
    const after = before + ofStart
    heat = thermal.coolingStopped === null ? after : after * Math.exp(-rest / thermal.coolingStopped)
    return {
      running: running === null ? null : perUnit(running),
      ofStart: perUnit(ofStart),
      before: perUnit(before),
      after: perUnit(after),
      ...(complete ? repetition(thermal, ofStart, after, lasts, running) : unrepeated),
    }
  })
}

/** What a start that did not get there says about more of them: nothing. */
const unrepeated = { inSuccession: null, restBeforeNext: null, perHour: null }

function repetition(
  { cold, coolingStopped, coolingRunning }: ThermalData,
  ofStart: number,
  after: number,
  lasts: number,
  running: number | null,
): Pick<HeatBalance, 'inSuccession' | 'restBeforeNext' | 'perHour'> {
  const room = 1 - ofStart
  const fits = (perHour: number): boolean => {
    const gap = Math.max(0, 3600 / perHour - lasts)
    const stopped = coolingStopped === null ? 0 : periodic(ofStart, 0, gap, coolingStopped)
    const on = coolingRunning === null || running === null ? 0 : periodic(ofStart, running, gap, coolingRunning)
    return Math.max(stopped, on) <= room + 1e-12
  }
  const known = coolingStopped !== null || (coolingRunning !== null && running !== null)
  let perHour = 0
  while (known && perHour < most && fits(perHour + 1)) perHour++
  // Without the cold time the scale begins at hot: what fits from there is the count from hot.
  const fromHot = running === null ? (cold === null ? whole(1 / ofStart) : null) : whole((1 - running) / ofStart)
  const rest = coolingStopped === null || room <= 0 ? null : Math.max(0, coolingStopped * Math.log(after / room))
  return {
    inSuccession: { cold: whole(1 / ofStart), hot: fromHot },
    restBeforeNext: rest === null ? null : second(rest),
    perHour: known ? perHour : null,
  }
}
