import type { FieldIssue } from '../../errors'
import type { ScheduleRecord } from '../document/schedule-record'
import type { StudyDocument } from '../document/study-document'
import { known, once, unless } from './issue'
import type { RecordIndex } from './record-index'

type Path = FieldIssue['path']

const positive = (value: { si: number }, path: Path, name: string): FieldIssue[] =>
  unless(value.si > 0, path, `${name} must be above 0.`)

/** Whether the starts that one waits for lead back to it. */
const waitsForItself = (motor: string, starts: ScheduleRecord['starts']): boolean => {
  const formerOf = (id: string) => starts.find((one) => one.motor === id)?.after?.motor
  let former = formerOf(motor)
  for (let step = 0; former !== undefined && step <= starts.length; step++) {
    if (former === motor) return true
    former = formerOf(former)
  }
  return false
}

const startIssues = (record: ScheduleRecord, k: number, path: Path, index: RecordIndex): FieldIssue[] => {
  const { starts, tag } = record
  const { motor, starter, after, attempts } = starts[k]!
  const who = `Schedule ${tag}`
  const name = index.motors.get(motor)?.tag ?? motor
  return [
    ...known(index.motors, motor, [...path, 'motor'], who, 'motor'),
    ...known(index.starters, starter, [...path, 'starter'], who, 'starting method'),
    ...(after === null
      ? []
      : [
          ...unless(
            starts.some((one) => one.motor === after.motor),
            [...path, 'after', 'motor'],
            `${who}: motor ${name} waits for a motor that is not started in it; choose one of its starts.`,
          ),
          ...unless(
            !waitsForItself(motor, starts),
            [...path, 'after', 'motor'],
            `${who}: the start of motor ${name} waits for itself; break the ring.`,
          ),
        ]),
    ...attempts.flatMap(({ runFor, rest }, a) => [
      ...positive(runFor, [...path, 'attempts', a, 'runFor'], `The time of an attempt in schedule ${tag}`),
      ...positive(rest, [...path, 'attempts', a, 'rest'], `The rest after an attempt in schedule ${tag}`),
    ]),
  ]
}

const contactorIssues = ({ contactors, tag }: ScheduleRecord, path: Path, index: RecordIndex): FieldIssue[] =>
  contactors.flatMap(({ motor, dropOut, reclose }, k) => [
    ...known(index.motors, motor, [...path, 'contactors', k, 'motor'], `Schedule ${tag}`, 'motor'),
    ...unless(
      dropOut.si > 0 && dropOut.si < 1,
      [...path, 'contactors', k, 'dropOut'],
      `The drop-out voltage of a contactor in schedule ${tag} must lie between 0 and 100 %.`,
    ),
    ...unless(
      reclose === null || reclose.above.si >= dropOut.si,
      [...path, 'contactors', k, 'reclose', 'above'],
      `A contactor in schedule ${tag} closes again at its drop-out voltage or above.`,
    ),
  ])

const transferIssues = (
  { tag }: ScheduleRecord,
  { to, remaining, decayTime }: NonNullable<ScheduleRecord['disturbance']>,
  path: Path,
  index: RecordIndex,
): FieldIssue[] => [
  ...unless(
    decayTime === null || decayTime.si >= 0,
    [...path, 'decayTime'],
    `The decay time of the residual voltage in schedule ${tag} cannot be below 0.`,
  ),
  ...(to === null
    ? []
    : [
        ...known(index.supplies, to.supply, [...path, 'to', 'supply'], `Schedule ${tag}`, 'supply condition'),
        ...unless(
          remaining.si === 0,
          [...path, 'remaining'],
          `Schedule ${tag} takes the plant to another supply, so nothing of the voltage remains in between; enter 0 %.`,
        ),
      ]),
]

/** References of schedules, and what in them cannot be. */
export const scheduleReferences = ({ schedules }: StudyDocument, index: RecordIndex): FieldIssue[] =>
  schedules.flatMap((record, i) => {
    const { tag, starts, contactors, disturbance } = record
    const path = ['schedules', i] as const
    return [
      ...once(starts, [...path, 'starts'], `Schedule ${tag}`),
      ...starts.flatMap((_, k) => startIssues(record, k, [...path, 'starts', k], index)),
      ...unless(
        starts.length > 0 || disturbance !== null,
        [...path, 'starts'],
        `Schedule ${tag} neither starts a motor nor has a dip of the supply; add one of the two.`,
      ),
      ...(disturbance === null
        ? []
        : [
            ...positive(disturbance.duration, [...path, 'disturbance', 'duration'], `The dip of schedule ${tag}`),
            ...unless(
              disturbance.remaining.si >= 0,
              [...path, 'disturbance', 'remaining'],
              `What remains of the voltage in schedule ${tag} cannot be below 0.`,
            ),
            ...transferIssues(record, disturbance, [...path, 'disturbance'], index),
          ]),
      ...once(contactors, [...path, 'contactors'], `the contactors of schedule ${tag}`),
      ...contactorIssues(record, path, index),
    ]
  })
