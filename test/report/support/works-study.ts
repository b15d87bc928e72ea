import { type StudyDocument, studyDocument } from '@/lib/study/document/study-document'
import { largePlant } from '../../support/large-plant'
import { reportDocument } from '../../support/report-document'

interface WorksSize {
  boards: number
  motorsPerBoard: number
  /** Motors started one after the other, one case each. */
  started: number
  /** Short-circuit level of the weakest supply. */
  level: string
  /** Torque of the driven machines at standstill. */
  breakaway: string
  /** Share of constant power in the static loads. */
  constantPower: number
}

/** A made-up works of any size: every motor drives a fan, some are started while the others run. */
export function worksStudy({
  boards,
  motorsPerBoard,
  started,
  level,
  breakaway,
  constantPower,
}: WorksSize): StudyDocument {
  const { plant } = largePlant(boards, motorsPerBoard)
  const ids = plant.motors.map(({ id }) => id)
  const curveOf = (motor: string) => `${motor}-open`
  return studyDocument.parse({
    ...reportDocument,
    head: { ...reportDocument.head, title: `Starting of ${started} of ${ids.length} motors of the works` },
    plant: {
      ...plant,
      supplies: plant.supplies.map((supply) => ({ ...supply, level: { form: 'power', power: level } })),
      loads: plant.loads.map((load) => ({
        ...load,
        mix: { impedance: 1 - constantPower, current: 0, power: constantPower },
        floor: constantPower === 1 ? '0.3' : '0.7',
      })),
      drivenLoads: ids.map((motor) => ({
        id: `${motor}-fan`,
        tag: `FAN-${motor.toUpperCase()}`,
        motor,
        machine: 'fan',
        inertias: [{ part: 'impeller', inertia: '310 kg·m²', speedRatio: '1' }],
        curves: [
          {
            id: curveOf(motor),
            name: 'damper a third open',
            kind: 'power',
            constant: breakaway,
            atRated: '3900 N·m',
            ratedSpeed: '1487 r/min',
            exponent: '2',
            breakaway: null,
          },
        ],
      })),
      starters: [{ id: 'dol', tag: 'direct-on-line', kind: 'direct' }],
      plantConditions: ids.slice(0, started).map((motor) => ({
        id: `others-of-${motor}`,
        tag: `Without ${motor.toUpperCase()}`,
        running: ids
          .filter((_, i) => i >= started && i % 4 === 0)
          .map((other) => ({ motor: other, curve: curveOf(other) })),
        capacitors: ['k1'],
      })),
      loadConditions: [
        {
          id: 'ordinary',
          tag: 'ordinary',
          curves: ids.map((motor) => ({ motor, starting: curveOf(motor), process: null })),
        },
      ],
    },
    schedules: ids.slice(0, started).map((motor) => ({
      id: `start-${motor}`,
      tag: `${motor.toUpperCase()} alone`,
      starts: [{ motor, at: '0 s', starter: 'dol' }],
    })),
    cases: ids.slice(0, started).map((motor, i) => ({
      id: `case-${motor}`,
      tag: `C${i + 1}`,
      supply: 'weakest',
      plantCondition: `others-of-${motor}`,
      schedule: `start-${motor}`,
      loadCondition: 'ordinary',
      role: 'design',
    })),
    limits: [
      {
        id: 'r1',
        tag: 'R1',
        place: { kind: 'bus', bus: 'sub' },
        quantity: 'voltage-change',
        instant: 'deepest',
        reference: 'before',
        limit: { kind: 'ratio', value: '4 %' },
        appliesTo: {},
        document: 'Works standard on rapid changes of voltage at the intake substation of the utility',
        verify: true,
      },
      {
        id: 'r2',
        tag: 'R2',
        place: { kind: 'starting-motors' },
        quantity: 'run-up-time',
        reference: 'rated',
        limit: { kind: 'time', value: '20 s' },
        appliesTo: {},
        document: 'Works standard',
        verify: false,
      },
    ],
  })
}
