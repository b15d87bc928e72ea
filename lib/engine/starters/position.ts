import type { Starter } from '../case-input'
import type { ChangeOver } from '../starter-input'

/**
 * How a motor is connected. `off` and `open` draw nothing; `tap` is on the autotransformer, `star` in star, `series`
 * behind an impedance, `middle` on the middle step of a closed transition, `part` on part of its winding, `rotor` with
 * resistance in its rotor, `kick` and `ramp` behind the soft starter, `drive` behind a converter that will be bypassed;
 * `running` is the last, which it keeps.
 */
export type Position =
  | 'off'
  | 'open'
  | 'tap'
  | 'star'
  | 'series'
  | 'middle'
  | 'part'
  | 'rotor'
  | 'kick'
  | 'ramp'
  | 'drive'
  | 'running'

/** When a position is left: by the device's condition, some time after it was taken, or at full voltage. */
export type Until = ChangeOver | { kind: 'after'; time: number } | { kind: 'full-voltage' }

type Device = { readonly re: number; readonly im: number }
type SoftStart = Extract<Starter, { kind: 'soft-starter' }>

/** What stands between bus and motor in a position. */
export type Link =
  | { kind: 'open' }
  | { kind: 'direct' }
  | { kind: 'tap'; tap: number; impedance: Device }
  | { kind: 'star' }
  | { kind: 'series'; impedance: Device }
  | { kind: 'part'; current: number; torque: number }
  | { kind: 'soft'; ramp: SoftStart['ramp']; time: number; currentLimit: number | null }
  | { kind: 'drive'; drive: Extract<Starter, { kind: 'drive' }> }

/** One position of a starting device. */
export interface Step {
  position: Position
  link: Link
  /** Null: the running position, which is kept. */
  until: Until | null
  /** Resistance added to each rotor phase, ohm referred to the stator. */
  rotorResistance: number
  /** Heat of the winding per A²s of the terminal current, in parts of that in the running position. */
  heat: number
}

const step = (position: Position, link: Link, until: Until | null, heat = 1): Step => ({
  position,
  link,
  until,
  rotorResistance: 0,
  heat,
})

const running = step('running', { kind: 'direct' }, null)
const gapStep = (gap: number): Step[] => (gap > 0 ? [step('open', { kind: 'open' }, { kind: 'after', time: gap })] : [])

/** The positions that a starting device goes through, each with what it makes of the motor and when it is left. */
export function stepsOf(starter: Starter): readonly Step[] {
  switch (starter.kind) {
    case 'direct':
      return [running]
    case 'autotransformer': {
      const { tap, impedance, changeOver, gap, middle } = starter
      const series: Step[] = middle
        ? [step('middle', { kind: 'series', impedance: middle.impedance }, { kind: 'after', time: middle.time })]
        : []
      return [step('tap', { kind: 'tap', tap, impedance }, changeOver), ...series, ...gapStep(gap), running]
    }
    case 'star-delta': {
      const { changeOver, gap, transition } = starter
      // A resistor in series with each winding of a delta is a third of it in series with the equivalent star.
      const impedance = { re: (transition?.resistance ?? 0) / 3, im: 0 }
      const series: Step[] = transition
        ? [step('middle', { kind: 'series', impedance }, { kind: 'after', time: transition.time })]
        : []
      // In star the winding carries the whole line current, in delta only 1/√3 of it.
      return [step('star', { kind: 'star' }, changeOver, 3), ...series, ...gapStep(gap), running]
    }
    case 'reactor':
    case 'resistor':
      return [step('series', { kind: 'series', impedance: starter.impedance }, starter.changeOver), running]
    case 'soft-starter':
      return softSteps(starter)
    case 'part-winding': {
      const { currentShare: current, torqueShare: torque, windingShare, changeOver } = starter
      return [step('part', { kind: 'part', current, torque }, changeOver, 1 / windingShare ** 2), running]
    }
    case 'rotor-resistance':
      return [
        ...starter.steps.map(
          ({ resistance, changeOver }): Step => ({
            ...step('rotor', { kind: 'direct' }, changeOver),
            rotorResistance: resistance,
          }),
        ),
        running,
      ]
    case 'captive-transformer':
      return [step('running', { kind: 'tap', tap: starter.ratio, impedance: starter.impedance }, null)]
    case 'drive':
      return starter.bypass === null
        ? [step('running', { kind: 'drive', drive: starter }, null)]
        : [step('drive', { kind: 'drive', drive: starter }, starter.bypass), running]
  }
}

function softSteps({ ramp, rampTime, kick, currentLimit, bypass }: SoftStart): readonly Step[] {
  const kicking: Step[] = kick
    ? [
        step(
          'kick',
          {
            kind: 'soft',
            ramp: { kind: 'voltage', from: kick.voltage, to: kick.voltage },
            time: 0,
            currentLimit: null,
          },
          { kind: 'after', time: kick.time },
        ),
      ]
    : []
  const until: Until = bypass ?? { kind: 'full-voltage' }
  return [...kicking, step('ramp', { kind: 'soft', ramp, time: rampTime, currentLimit }, until), running]
}

/** Whether a starting device leaves its motor without voltage on the way. */
export const hasGap = (starter: Starter): boolean => stepsOf(starter).some(({ position }) => position === 'open')

/** How long the link itself goes on changing with time after it was taken, s. */
export const rampOf = ({ link }: Step): number =>
  link.kind === 'soft' ? link.time : link.kind === 'drive' ? link.drive.rampTime : 0
