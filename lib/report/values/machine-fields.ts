import { formatNumber } from '@/lib/quantity/format-number'
import type { DrivenLoadRecord, LoadCurveRecord } from '@/lib/study/document/driven-load-record'
import type { MotorRecord } from '@/lib/study/document/machine-records'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { sampledFormula } from '@/lib/study/to-engine/load-curve-input'
import { busTag, motorTag } from '@/lib/study/words/tags'
import type { Wording } from '../wording/en'
import { type FieldValue, ofEntered, ofWords, type RecordField } from './record-field'

type Words = Wording['fields']

const count = (value: number | null): FieldValue | null => (value === null ? null : { text: String(value) })

export const motorFields = (words: Words, document: StudyDocument): readonly RecordField<MotorRecord>[] => [
  { label: words.bus, own: true, of: (one) => ofWords(busTag(document, one.bus)) },
  { label: words.role, of: (one) => ofWords(one.role === 'generator' ? words.values.generator : '') },
  { label: words.maker, of: (one) => ofWords(one.maker) },
  { label: words.ratedPower, of: (one) => ofEntered(one.ratedPower) },
  { label: words.ratedVoltage, of: (one) => ofEntered(one.ratedVoltage) },
  { label: words.poles, of: (one) => count(one.poles) },
  { label: words.ratedSpeed, of: (one) => ofEntered(one.ratedSpeed) },
  { label: words.efficiency, of: (one) => ofEntered(one.efficiency) },
  { label: words.powerFactor, of: (one) => ofEntered(one.powerFactor) },
  { label: words.ratedCurrent, of: (one) => ofEntered(one.ratedCurrent) },
  { label: words.lockedRotorCurrent, of: (one) => ofEntered(one.lockedRotorCurrent) },
  { label: words.lockedRotorPowerFactor, of: (one) => ofEntered(one.lockedRotorPowerFactor) },
  { label: words.lockedRotorTorque, of: (one) => ofEntered(one.lockedRotorTorque) },
  { label: words.pullUpTorque, of: (one) => ofEntered(one.pullUpTorque) },
  { label: words.breakdownTorque, of: (one) => ofEntered(one.breakdownTorque) },
  { label: words.ratedTorque, of: (one) => ofEntered(one.ratedTorque) },
  { label: words.codeLetter, of: (one) => ofWords(one.codeLetter) },
  { label: words.motorInertia, of: (one) => ofEntered(one.inertia) },
  { label: words.permissibleCold, of: (one) => ofEntered(one.permissibleCold) },
  { label: words.permissibleHot, of: (one) => ofEntered(one.permissibleHot) },
  { label: words.startsCold, of: (one) => count(one.startsCold) },
  { label: words.startsHot, of: (one) => count(one.startsHot) },
  { label: words.startsHourly, of: (one) => count(one.startsPerHour) },
  { label: words.note, of: (one) => ofWords(one.note) },
]

const number = (value: number) =>
  formatNumber(value, { digits: 4 })
    .replace(/(\.\d*?)0+$/, '$1')
    .replace(/\.$/, '')
const pair = ({ r, x }: { r: number; x: number }) => `${number(r)}, ${number(x)}`

type TypedCircuit = Exclude<MotorRecord['circuit'], { kind: 'estimated' | 'table' }>

/** The typed circuit has one source for all its numbers. */
const ofCircuit =
  (text: (circuit: TypedCircuit) => string | null) =>
  ({ circuit }: MotorRecord): FieldValue | null => {
    if (circuit.kind === 'estimated' || circuit.kind === 'table') return null
    const words = text(circuit)
    return words === null ? null : { text: words, provenance: circuit.provenance }
  }

export const circuitFields = (words: Words): readonly RecordField<MotorRecord>[] => [
  { label: words.circuitKind, of: ({ circuit }) => ofWords(words.values[circuit.kind]) },
  {
    label: words.circuitScale,
    of: ({ circuit, ratedVoltage }) => {
      if (circuit.kind === 'estimated' || circuit.kind === 'table') return null
      const { scale } = circuit
      return ofWords(scale.unit === 'ohm' ? words.values.ohm : words.values.perUnit(scale.base.text, ratedVoltage.text))
    },
  },
  { label: words.stator, of: ofCircuit(({ stator }) => pair(stator)) },
  { label: words.magnetising, of: ofCircuit(({ magnetising }) => number(magnetising)) },
  { label: words.core, of: ofCircuit(({ core }) => (core === null ? null : number(core))) },
  { label: words.cage, of: ofCircuit((circuit) => ('cage' in circuit ? pair(circuit.cage) : null)) },
  { label: words.lockedCage, of: ofCircuit((circuit) => ('locked' in circuit ? pair(circuit.locked) : null)) },
  {
    label: words.barDepth,
    of: ofCircuit((circuit) =>
      'depth' in circuit ? words.values.barDepth(number(circuit.depth), number(circuit.slotShare)) : null,
    ),
  },
  { label: words.innerCage, of: ofCircuit((circuit) => (circuit.kind === 'double-cage' ? pair(circuit.inner) : null)) },
  { label: words.outerCage, of: ofCircuit((circuit) => (circuit.kind === 'double-cage' ? pair(circuit.outer) : null)) },
  {
    label: words.machineCurves,
    of: ({ circuit }) => {
      if (circuit.kind !== 'table') return null
      const points = circuit.points.map(({ speed, torque, current, powerFactor }) =>
        words.values.machinePoint(speed.text, torque.text, current.text, powerFactor.text),
      )
      const text = `${points.join('; ')} (${words.values.interpolation[circuit.interpolation]})`
      return { text, provenance: circuit.points[0]?.torque.provenance ?? null }
    },
  },
  {
    label: words.torquePoints,
    of: ({ torquePoints, torqueInterpolation }) => {
      if (torquePoints.length === 0) return null
      const points = torquePoints.map(({ speed, torque }) => words.values.point(speed.text, torque.text))
      const text = `${points.join('; ')} (${words.values.interpolation[torqueInterpolation]})`
      return { text, provenance: torquePoints[0]?.torque.provenance ?? null }
    },
  },
  {
    label: words.saturation,
    of: ({ saturation }) =>
      saturation === null
        ? null
        : ofWords(words.values.saturation(number(saturation.current), number(saturation.torque))),
  },
]

/** A load curve in words, as typed. */
const curveText = (curve: LoadCurveRecord, words: Words): FieldValue => {
  if (curve.kind === 'points') {
    const points = curve.points.map(({ speed, torque }) => words.values.point(speed.text, torque.text)).join('; ')
    const text = words.values.points(points) + (curve.active ? words.values.active : '')
    return { text, provenance: curve.points[0]?.torque.provenance ?? null }
  }
  const { values } = words
  const start = 'breakaway' in curve && curve.breakaway ? curve.breakaway : null
  const from = start ? values.breakaway(start.torque.text, start.until.text) : ''
  switch (curve.kind) {
    case 'power': {
      const { constant, atRated, ratedSpeed, exponent } = curve
      const rise = values.powerCurve(constant.text, atRated.text, ratedSpeed.text, exponent.text)
      return { text: rise + from, provenance: atRated.provenance }
    }
    case 'pump-closed': {
      const { friction, shut, ratedSpeed } = curve
      return { text: values.shutPump(friction.text, shut.text, ratedSpeed.text) + from, provenance: shut.provenance }
    }
    case 'pump-open': {
      const { friction, shut, ratedSpeed, staticHead, shutHead, points } = curve
      const list = points.map(({ speed, torque }) => values.point(speed.text, torque.text)).join('; ')
      const opening = values.checkValve(staticHead.text, shutHead.text, list)
      const closed = values.shutPump(friction.text, shut.text, ratedSpeed.text)
      return { text: closed + from + opening, provenance: shut.provenance }
    }
    case 'constant-power': {
      const { power, from: lowest, standstill } = curve
      return {
        text: values.constantPower(power.text, lowest.text, standstill?.text ?? null),
        provenance: power.provenance,
      }
    }
    case 'formula': {
      const sampled = sampledFormula(curve)
      const points = sampled?.at.length ?? 0
      const departure = ((sampled?.departure ?? 0) * 100).toPrecision(1)
      return {
        text: values.formula(curve.formula, curve.ratedSpeed.text, curve.upTo.text, points, departure),
        provenance: curve.ratedSpeed.provenance,
      }
    }
  }
}

/** Driven loads differ in their parts and curves, so that each has a list of its own. */
export const drivenLoadFields = (
  record: DrivenLoadRecord,
  words: Words,
  document: StudyDocument,
): readonly RecordField<DrivenLoadRecord>[] => [
  { label: words.motor, own: true, of: (one) => ofWords(motorTag(document, one.motor)) },
  { label: words.machine, of: (one) => ofWords(words.values.machines[one.machine]) },
  ...record.inertias.map(
    ({ part, speedRatio }, i): RecordField<DrivenLoadRecord> => ({
      label: words.part(part, speedRatio.si === 1 ? null : speedRatio.text),
      of: (one) => ofEntered(one.inertias[i]?.inertia ?? null),
    }),
  ),
  ...record.inertiaConstants.map(
    ({ part }, i): RecordField<DrivenLoadRecord> => ({
      label: words.part(part, null),
      of: (one) => {
        const item = one.inertiaConstants[i]
        if (!item) return null
        const { constant, power } = item
        return { text: words.values.inertiaConstant(constant.text, power.text), provenance: constant.provenance }
      },
    }),
  ),
  {
    label: words.gear,
    of: ({ gear }) =>
      gear && {
        text: words.values.gear(gear.speedRatio.text, gear.efficiency?.text ?? null),
        provenance: gear.speedRatio.provenance,
      },
  },
  { label: words.shaft, of: (one) => ofWords(one.shaft) },
  { label: words.processStarts, of: (one) => count(one.startsPerHour) },
  ...record.curves.map(
    ({ name }, i): RecordField<DrivenLoadRecord> => ({
      label: words.curve(name),
      of: (one) => {
        const curve = one.curves[i]
        return curve ? curveText(curve, words) : null
      },
    }),
  ),
  { label: words.note, of: (one) => ofWords(one.note) },
]
