import type { MotorInput } from '../../engine/case-input'
import type { Contactor, Disturbance } from '../../engine/schedule-input'
import { perUnit, radianPerSecond, second, volt } from '../../units/si'
import type { MotorRecord } from '../document/machine-records'
import type { SupplyRecord } from '../document/network-records'
import type { ScheduleRecord } from '../document/schedule-record'
import { secondSupplyInput } from './supply-input'

type Starting = Extract<MotorInput['duty'], { kind: 'starting' }>

/** What a start waits for, where its shaft begins and which attempts come first; nothing of it where the record is silent. */
export const startOrderInput = ({
  after,
  initialSpeed,
  attempts,
}: ScheduleRecord['starts'][number]): Pick<Starting, 'after' | 'initialSpeed' | 'attempts'> => ({
  ...(after && { after: { motorId: after.motor, interval: second(after.interval.si) } }),
  ...(initialSpeed && { initialSpeed: radianPerSecond(initialSpeed.si) }),
  ...(attempts.length > 0 && {
    attempts: attempts.map(({ runFor, rest }) => ({ runFor: second(runFor.si), rest: second(rest.si) })),
  }),
})

/** The contactor of a running motor in volts, where the schedule has one. */
export const contactorInput = (
  schedule: ScheduleRecord | undefined,
  motor: MotorRecord | undefined,
): { contactor?: Contactor } => {
  const record = schedule?.contactors.find((one) => one.motor === motor?.id)
  if (!record || !motor) return {}
  const rated = motor.ratedVoltage.si
  return {
    contactor: {
      dropOut: volt(record.dropOut.si * rated),
      delay: second(record.delay.si),
      reclose: record.reclose && {
        above: volt(record.reclose.above.si * rated),
        delay: second(record.reclose.delay.si),
      },
    },
  }
}

/** What the supply does during the run; undefined where it stands still. */
export const disturbanceInput = (
  schedule: ScheduleRecord | undefined,
  supplies: ReadonlyMap<string, SupplyRecord>,
): Disturbance | undefined => {
  const disturbance = schedule?.disturbance
  if (!disturbance) return undefined
  const { at, duration, remaining, to, decayTime } = disturbance
  const next = to && supplies.get(to.supply)
  return {
    at: second(at.si),
    duration: second(duration.si),
    remaining: perUnit(remaining.si),
    ...(to && next && { to: secondSupplyInput(next, (to.angle * Math.PI) / 180) }),
    ...(decayTime && { decayTime: second(decayTime.si) }),
  }
}
