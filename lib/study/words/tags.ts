import type { StudyDocument } from '../document/study-document'

const tagIn = (records: readonly { id: string; tag: string }[], id: string): string =>
  records.find((record) => record.id === id)?.tag ?? id

/** What people call a bus, a motor, a supply, a case, a limit: its tag, or its identity where the record is gone. */
export const busTag = ({ plant }: StudyDocument, id: string): string => tagIn(plant.buses, id)
export const motorTag = ({ plant }: StudyDocument, id: string): string => tagIn(plant.motors, id)
export const supplyTag = ({ plant }: StudyDocument, id: string): string => tagIn(plant.supplies, id)
export const loadTag = ({ plant }: StudyDocument, id: string): string => tagIn(plant.loads, id)
export const transformerTag = ({ plant }: StudyDocument, id: string): string => tagIn(plant.transformers, id)
export const plantConditionTag = ({ plant }: StudyDocument, id: string): string => tagIn(plant.plantConditions, id)
export const loadConditionTag = ({ plant }: StudyDocument, id: string): string => tagIn(plant.loadConditions, id)
export const caseTag = ({ cases }: StudyDocument, id: string): string => tagIn(cases, id)
export const limitTag = ({ limits }: StudyDocument, id: string): string => tagIn(limits, id)
