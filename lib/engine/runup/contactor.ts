import type { Contactor } from '../schedule-input'
import type { Courses, RunningCourse, StartCourse } from './course'
import { type Move, sameInstant } from './schedule'
import type { System } from './system'
import { trip } from './trip'

/** How the contactor of a running motor fares; `dropping` and `returning` wait for their delay. */
export interface ContactorCourse {
  readonly item: Contactor
  state: 'in' | 'dropping' | 'out' | 'returning'
  since: number
  droppedAt: number | null
  reclosedAt: number | null
}

export const contactorCourse = (item: Contactor): ContactorCourse => ({
  item,
  state: 'in',
  since: 0,
  droppedAt: null,
  reclosedAt: null,
})

/** By how many volts the condition for leaving the present state is exceeded; minus infinity where there is none. */
export function contactorExcess({ item, state }: ContactorCourse, voltage: number): number {
  if (state === 'in') return item.dropOut - voltage
  if (state === 'dropping') return voltage - item.dropOut
  if (item.reclose === null) return Number.NEGATIVE_INFINITY
  return state === 'out' ? voltage - item.reclose.above : item.reclose.above - voltage
}

/** Takes the contactor over the voltage that it waited for. */
export function noteVoltage(course: ContactorCourse, t: number): void {
  const next = { in: 'dropping', dropping: 'in', out: 'returning', returning: 'out' } as const
  course.state = next[course.state]
  course.since = t
}

/** When the delay of a contactor is over; null while it waits for a voltage. */
export function contactorDue({ item, state, since }: ContactorCourse): number | null {
  if (state === 'dropping') return since + item.delay
  return state === 'returning' ? since + item.reclose!.delay : null
}

/** When the delays of all contactors are over. */
export const contactorInstants = ({ running, starts }: Courses): (number | null)[] =>
  [...running, ...starts].map(({ contactor }) => (contactor === null ? null : contactorDue(contactor)))

/** Ends the starts whose contactor has been without voltage for its delay. */
export function tripContactors(system: System, starts: readonly StartCourse[], state: Float64Array, t: number): Move[] {
  return starts.flatMap((start): Move[] => {
    const due = start.contactor === null ? null : contactorDue(start.contactor)
    if (start.contactor === null || due === null || t < due - sameInstant) return []
    start.contactor.state = 'out'
    start.contactor.droppedAt = t
    return [trip(system, start, 'contactor', state[start.motor]!, t)]
  })
}

const direct = { link: { kind: 'direct' }, rotorResistance: 0 } as const

/** Opens and closes the contactors whose delay is over; whether any moved. */
export function switchContactors(system: System, running: readonly RunningCourse[], t: number): boolean {
  let moved = false
  for (const { motor, contactor } of running) {
    if (contactor === null) continue
    const due = contactorDue(contactor)
    if (due === null || t < due - sameInstant) continue
    moved = true
    const opens = contactor.state === 'dropping'
    system.move(motor, opens ? null : direct, t)
    contactor.state = opens ? 'out' : 'in'
    if (opens) contactor.droppedAt = t
    else contactor.reclosedAt = t
  }
  return moved
}
