import type { FieldIssue } from '../../errors'
import type { StudyDocument } from '../document/study-document'
import { repeated } from './issue'

type Path = FieldIssue['path']

const inList = (records: readonly { id: string }[], path: Path): FieldIssue[] =>
  repeated(records, ({ id }) => id).map((index) => ({
    path: [...path, index, 'id'],
    message: `The identity “${records[index]?.id}” stands twice in this list; give one of the two records another.`,
  }))

/** Identities that stand twice in the same list: a reference to one would be a guess. */
export const duplicateIds = ({ plant, schedules, cases, limits }: StudyDocument): FieldIssue[] => [
  ...Object.entries(plant).flatMap(([name, records]) => inList(records, ['plant', name])),
  ...plant.drivenLoads.flatMap((load, i) => inList(load.curves, ['plant', 'drivenLoads', i, 'curves'])),
  ...inList(schedules, ['schedules']),
  ...inList(cases, ['cases']),
  ...inList(limits, ['limits']),
]
