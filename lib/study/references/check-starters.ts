import type { FieldIssue } from '../../errors'
import type { Entered } from '../document/entered'
import type { StarterRecord } from '../document/starter-record'
import type { StudyDocument } from '../document/study-document'
import { unless } from './issue'

type Path = FieldIssue['path']

const above = (value: Entered | null, path: Path, name: string): FieldIssue[] =>
  unless(value === null || value.si > 0, path, `${name} must be above 0.`)

const notNegative = (value: Entered | null, path: Path, name: string): FieldIssue[] =>
  unless(value === null || value.si >= 0, path, `${name} cannot be below 0.`)

const part = (value: Entered | null, path: Path, name: string): FieldIssue[] =>
  unless(value === null || (value.si > 0 && value.si <= 1), path, `${name} must lie above 0 and at most at 1 (100 %).`)

const starterIssues = (record: StarterRecord, path: Path): FieldIssue[] => {
  const of = `starting method ${record.tag}`
  switch (record.kind) {
    case 'autotransformer':
      return [
        ...part(record.tap, [...path, 'tap'], `The tap of ${of}`),
        ...notNegative(record.own?.impedance ?? null, [...path, 'own', 'impedance'], `The impedance of ${record.tag}`),
        ...notNegative(record.own?.xOverR ?? null, [...path, 'own', 'xOverR'], `X/R of ${record.tag}`),
        ...above(record.middle?.time ?? null, [...path, 'middle', 'time'], `The middle step of ${of}`),
        ...notNegative(
          record.middle?.reactance ?? null,
          [...path, 'middle', 'reactance'],
          `The middle reactance of ${of}`,
        ),
      ]
    case 'star-delta':
      return [
        ...above(
          record.transition?.resistance ?? null,
          [...path, 'transition', 'resistance'],
          `The resistance of ${of}`,
        ),
        ...above(record.transition?.time ?? null, [...path, 'transition', 'time'], `The transition of ${of}`),
      ]
    case 'reactor':
      return [
        ...above(record.reactance, [...path, 'reactance'], `The reactance of ${of}`),
        ...notNegative(record.resistance, [...path, 'resistance'], `The resistance of ${of}`),
      ]
    case 'resistor':
      return above(record.resistance, [...path, 'resistance'], `The resistance of ${of}`)
    case 'soft-starter': {
      const { ramp, kick } = record
      return [
        ...above(ramp.from, [...path, 'ramp', 'from'], `The begin of the ramp of ${of}`),
        ...unless(ramp.to.si >= ramp.from.si, [...path, 'ramp', 'to'], `The ramp of ${of} must rise.`),
        ...(ramp.kind === 'voltage' ? part(ramp.to, [...path, 'ramp', 'to'], `The end of the ramp of ${of}`) : []),
        ...notNegative(record.rampTime, [...path, 'rampTime'], `The ramp time of ${of}`),
        ...part(kick?.voltage ?? null, [...path, 'kick', 'voltage'], `The kick of ${of}`),
        ...above(kick?.time ?? null, [...path, 'kick', 'time'], `The length of the kick of ${of}`),
        ...above(record.currentLimit, [...path, 'currentLimit'], `The current limit of ${of}`),
      ]
    }
    case 'part-winding':
      return (['currentShare', 'torqueShare', 'windingShare'] as const).flatMap((field) =>
        part(record[field], [...path, field], `Each share of ${of}`),
      )
    case 'rotor-resistance':
      return record.steps.flatMap(({ resistance }, k) =>
        above(resistance, [...path, 'steps', k, 'resistance'], `Each rotor step of ${of}`),
      )
    case 'captive-transformer':
      return [
        ...(['primary', 'secondary', 'rating'] as const).flatMap((field) =>
          above(record[field], [...path, field], `Voltages and rating of ${of}`),
        ),
        ...part(record.impedance, [...path, 'impedance'], `The impedance of ${of}`),
        ...notNegative(record.xOverR, [...path, 'xOverR'], `X/R of ${of}`),
      ]
    case 'drive':
      return [
        ...(['speed', 'rampTime', 'motorCurrent', 'torqueLimit', 'currentLimit', 'undervoltage'] as const).flatMap(
          (field) => above(record[field], [...path, field], `Speed, ramp, currents and limits of ${of}`),
        ),
        ...(['efficiency', 'displacementFactor', 'totalFactor'] as const).flatMap((field) =>
          part(record[field], [...path, field], `Efficiency and power factors of ${of}`),
        ),
        ...unless(
          record.totalFactor.si <= record.displacementFactor.si,
          [...path, 'totalFactor'],
          `The total power factor of ${of} cannot exceed its displacement factor.`,
        ),
        ...unless(
          record.magnetising.si >= 0 && record.magnetising.si < 1,
          [...path, 'magnetising'],
          `The no-load current of ${of} must lie between 0 and the rated current.`,
        ),
        ...unless(
          record.currentLimit === null || record.currentLimit.si > record.magnetising.si * record.motorCurrent.si,
          [...path, 'currentLimit'],
          `The current limit of ${of} must exceed the no-load current.`,
        ),
      ]
    case 'direct':
      return []
  }
}

/** Settings of starting methods that read well and cannot be. */
export const checkStarters = ({ plant, schedules }: StudyDocument): FieldIssue[] => [
  ...plant.starters.flatMap((record, i) => [
    ...starterIssues(record, ['plant', 'starters', i]),
    ...record.capacitors.flatMap(({ power, ratedVoltage }, k) => [
      ...above(power, ['plant', 'starters', i, 'capacitors', k, 'power'], `Each capacitor of ${record.tag}`),
      ...above(
        ratedVoltage,
        ['plant', 'starters', i, 'capacitors', k, 'ratedVoltage'],
        `The voltage of each capacitor of ${record.tag}`,
      ),
    ]),
  ]),
  ...schedules.flatMap(({ starts, tag }, i) =>
    starts.flatMap(({ starter, motor }, k) => {
      const method = plant.starters.find(({ id }) => id === starter)
      const circuit = plant.motors.find(({ id }) => id === motor)?.circuit.kind
      return unless(
        method?.kind !== 'rotor-resistance' || circuit === 'single-cage',
        ['schedules', i, 'starts', k, 'starter'],
        `Schedule ${tag}: rotor resistance needs slip rings: type the circuit of the motor with one rotor branch.`,
      )
    }),
  ),
]
