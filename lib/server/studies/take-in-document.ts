import 'server-only'
import { plantCollections } from '@/lib/study/document/record-kinds'
import type { StudyDocument } from '@/lib/study/document/study-document'
import type { Actor } from '../actor'
import type { Tx } from '../db'
import { busesOf } from '../plants/buses-of'
import { plantKinds } from '../plants/schema'
import { toJson } from '../to-json'

interface Destination {
  organisationId: string
  projectId: string
  studyId: string
}

/** Puts a whole study document into an empty project: the plant's records, the study and its records, in the document's order. */
export async function takeInDocument(
  tx: Tx,
  { organisationId, projectId, studyId }: Destination,
  document: StudyDocument,
  actor: Actor,
  at: Date,
): Promise<void> {
  const changed = { changedById: actor.userId, changedByName: actor.name, changedAt: at }
  // buses stand first among the kinds: the other records point at them
  for (const kind of plantKinds) {
    await tx.plantRecord.createMany({
      data: document.plant[plantCollections[kind]].map((values, index) => ({
        organisationId,
        projectId,
        kind,
        id: values.id,
        tag: values.tag,
        ...busesOf(kind, values),
        position: index + 1,
        values: toJson(values),
        ...changed,
      })),
    })
  }
  const { head, settings, texts, frequency, numberStyle } = document
  await tx.study.create({
    data: {
      organisationId,
      projectId,
      id: studyId,
      title: head.title,
      documentNumber: head.documentNumber,
      head,
      settings: toJson(settings),
      texts,
      frequency: toJson(frequency),
      numberStyle,
      createdAt: at,
      ...changed,
    },
  })
  const lists = { schedule: document.schedules, case: document.cases, limit: document.limits }
  for (const [kind, list] of Object.entries(lists)) {
    await tx.studyRecord.createMany({
      data: list.map((values, index) => ({
        organisationId,
        studyId,
        kind,
        id: values.id,
        tag: values.tag,
        position: index + 1,
        values: toJson(values),
        ...changed,
      })),
    })
  }
}
