import type { CaseInput, MachineModel, MotorInput } from '../../engine/case-input'
import { hertz, perUnit, second, volt } from '../../units/si'
import type { CaseRecord } from '../document/case-records'
import type { StudyDocument } from '../document/study-document'
import { curveOf, type RecordIndex } from '../references/record-index'
import { lineInput, transformerInput } from './branch-inputs'
import { factorOn } from './case-changes'
import { caseModelInput } from './case-model-input'
import { scaleAdmittance } from './circuit-input'
import { loadCurveInput } from './load-curve-input'
import { motorInput } from './motor-input'
import { contactorInput, disturbanceInput, startOrderInput } from './schedule-input'
import { capacitorInput, staticLoadInput } from './shunt-inputs'
import { startCapacitorInput, starterDutyInput, starterInput } from './starter-input'
import { supplyInput } from './supply-input'

/** Local error that the run-up is integrated to; tight enough that no printed digit depends on it. */
const tolerance = 1e-8

const found = <T>(value: T | undefined, what: string): T => {
  if (value === undefined) throw new RangeError(`${what} was not checked: a reference leads nowhere`)
  return value
}

type Duties = readonly { motorId: string; duty: MotorInput['duty'] }[]

const runningDuties = (record: CaseRecord, index: RecordIndex): Duties =>
  found(index.plantConditions.get(record.plantCondition), record.id).running.map(({ motor, curve }) => ({
    motorId: motor,
    duty: {
      kind: 'running',
      ...contactorInput(index.schedules.get(record.schedule), index.motors.get(motor)),
      load: loadCurveInput(found(curveOf(index, motor, curve), record.id), index.loadOfMotor.get(motor)?.gear),
    },
  }))

const startingDuties = ({ settings, frequency }: StudyDocument, record: CaseRecord, index: RecordIndex): Duties => {
  const { curves } = found(index.loadConditions.get(record.loadCondition), record.id)
  return found(index.schedules.get(record.schedule), record.id).starts.map((start) => {
    const { motor, at, starter } = start
    const { starting, process } = found(
      curves.find((one) => one.motor === motor),
      record.id,
    )
    const device = found(index.starters.get(starter), record.id)
    const starterDuty = starterDutyInput(device, settings.startsPerHour.si)
    const gear = index.loadOfMotor.get(motor)?.gear
    const curve = (id: string) => loadCurveInput(found(curveOf(index, motor, id), record.id), gear)
    return {
      motorId: motor,
      duty: {
        kind: 'starting',
        at: second(at.si),
        ...startOrderInput(start),
        ...contactorInput(index.schedules.get(record.schedule), index.motors.get(motor)),
        starter: starterInput(device, found(index.motors.get(motor), record.id), frequency.si),
        ...(device.capacitors.length > 0 && { capacitors: device.capacitors.map(startCapacitorInput) }),
        ...(starterDuty && { starterDuty }),
        load: curve(starting),
        processLoad: process === null ? null : curve(process),
      },
    }
  })
}

/** One case of a checked document as the engine sees it, all in SI. */
export const caseInputOf = (
  document: StudyDocument,
  record: CaseRecord,
  index: RecordIndex,
  circuits: ReadonlyMap<string, MachineModel>,
  others: (motorId: string) => readonly MachineModel[],
): CaseInput => {
  const { plant, settings, frequency } = document
  const condition = found(index.plantConditions.get(record.plantCondition), record.id)
  const supply = found(index.supplies.get(record.supply), record.id)
  const disturbance = disturbanceInput(index.schedules.get(record.schedule), index.supplies)
  const circuitOf = (motorId: string) => found(circuits.get(motorId), `motor ${motorId}`)
  const starts = startingDuties(document, record, index)
  const samePlate = starts.flatMap(({ motorId }) => {
    const factor = factorOn(record, 'motor-admittance', motorId)
    const models = others(motorId).map((model) => scaleAdmittance(model, factor))
    return models.length === 0 ? [] : [{ motorId, models }]
  })
  return {
    id: record.id,
    frequency: hertz(frequency.si),
    buses: plant.buses.map(({ id, nominal }) => ({ id, nominal: volt(nominal.si) })),
    supply: supplyInput(
      supply,
      record,
      supply.plantMotorsIncluded === 'yes'
        ? plant.motors.map(({ id, bus }) => ({ busId: bus, circuit: circuitOf(id) }))
        : [],
    ),
    transformers: plant.transformers.map((transformer) => transformerInput(transformer, condition, record)),
    lines: plant.lines.map(lineInput),
    loads: plant.loads.filter(({ id }) => !condition.loadsOff.includes(id)).map(staticLoadInput),
    capacitors: plant.capacitors.filter(({ id }) => condition.capacitors.includes(id)).map(capacitorInput),
    motors: [...runningDuties(record, index), ...starts].map(({ motorId, duty }) =>
      motorInput({
        motor: found(index.motors.get(motorId), record.id),
        load: found(index.loadOfMotor.get(motorId), record.id),
        circuit: circuitOf(motorId),
        duty,
        record,
        settings,
      }),
    ),
    ...(disturbance && { disturbance }),
    ...caseModelInput(record),
    settings: {
      speedCriterion: perUnit(settings.speedCriterion.si),
      timeLimit: second(settings.timeLimit.si),
      tolerance,
    },
    ...(samePlate.length > 0 && { samePlate }),
  }
}
