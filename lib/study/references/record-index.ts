import type { DrivenLoadRecord, LoadCurveRecord } from '../document/driven-load-record'
import type { StudyDocument } from '../document/study-document'

interface Identified {
  id: string
}

const byId = <T extends Identified>(records: readonly T[]): ReadonlyMap<string, T> =>
  new Map(records.map((record) => [record.id, record]))

/** Every record of a document by its identity; where an identity stands twice, the last one counts. */
export const recordIndex = ({ plant, schedules, cases, limits }: StudyDocument) => ({
  buses: byId(plant.buses),
  supplies: byId(plant.supplies),
  transformers: byId(plant.transformers),
  lines: byId(plant.lines),
  loads: byId(plant.loads),
  capacitors: byId(plant.capacitors),
  motors: byId(plant.motors),
  drivenLoads: byId(plant.drivenLoads),
  starters: byId(plant.starters),
  plantConditions: byId(plant.plantConditions),
  loadConditions: byId(plant.loadConditions),
  schedules: byId(schedules),
  cases: byId(cases),
  limits: byId(limits),
  /** The load that each motor drives. */
  loadOfMotor: new Map<string, DrivenLoadRecord>(plant.drivenLoads.map((load) => [load.motor, load])),
})

export type RecordIndex = ReturnType<typeof recordIndex>

/** A curve of the load that a motor drives; undefined where there is none of that identity. */
export const curveOf = (index: RecordIndex, motorId: string, curveId: string): LoadCurveRecord | undefined =>
  index.loadOfMotor.get(motorId)?.curves.find((curve) => curve.id === curveId)
