import 'server-only'
import * as z from 'zod'
import { DomainError } from '@/lib/errors'
import { can } from '@/lib/policy/can'
import { studyRecordSchemas } from '@/lib/study/document/record-kinds'
import { checkTexts } from '@/lib/study/read/check-texts'
import { idInput, newId } from '../identity'
import { conflictOf, newRecordId, refuseSameTag } from '../live-record'
import { command } from '../perform'
import { presentRow } from '../plants/rows'
import { invalidRecord, readValues } from '../record-values'
import type { Row } from '../row'
import { toJson } from '../to-json'
import { refuseIfUsed } from '../where-used'
import { defaultSettings, emptyTexts } from './defaults'
import { requestRun, stopRun } from './request-run'
import { addedStudyRecord, changedStudy, changedStudyRecord, createdStudy, removedStudyRecord } from './schema'
import { loadStudy } from './study-of'

const studyScope = ({ studyId }: { studyId: string }) => ({ kind: 'study' as const, id: studyId })

/** Starts a study of the project's plant, without cases and limits. */
export const createStudy = command({
  input: createdStudy,
  scope: ({ projectId }) => ({ kind: 'project' as const, id: projectId }),
  load: async ({ tx }, { projectId }) =>
    tx.project.findFirstOrThrow({
      where: { id: projectId },
      include: { organisation: { select: { name: true } } },
    }),
  may: (actor) => can(actor, 'edit-study'),
  run: async ({ tx, place, actor, at }, input, project) => {
    const { projectId, title, documentNumber, utility, frequency, numberStyle } = input
    await refuseSameNumber(tx, projectId, documentNumber, null, ['documentNumber'])
    const id = newId()
    const head = {
      organisation: project.organisation.name,
      project: project.name,
      client: project.client,
      utility,
      title,
      documentNumber,
    }
    await tx.study.create({
      data: {
        organisationId: place.organisationId,
        projectId,
        id,
        title,
        documentNumber,
        head,
        settings: toJson(defaultSettings()),
        texts: emptyTexts,
        frequency: toJson(frequency),
        numberStyle,
        changedById: actor.userId,
        changedByName: actor.name,
        changedAt: at,
        createdAt: at,
      },
    })
    return {
      answer: { studyId: id },
      events: [{ action: 'study-created', subject: { kind: 'study', id }, payload: { title, documentNumber } }],
    }
  },
})

/** Changes a study's head, settings or texts as they were read; what is left out stays. */
export const changeStudy = command({
  input: changedStudy,
  scope: studyScope,
  load: async ({ tx }, { studyId }) => loadStudy(tx, studyId),
  may: (actor) => can(actor, 'edit-study'),
  run: async ({ tx, place, actor, at }, { studyId, version, ...changes }, before) => {
    const issues = checkTexts(changes)
    if (issues.length > 0) throw invalidRecord(issues)
    if (before.version !== version) {
      const { head, settings, texts, frequency, numberStyle } = before
      throw conflictOf({ ...before, values: { head, settings, texts, frequency, numberStyle } })
    }
    const { head } = changes
    if (head) await refuseSameNumber(tx, before.projectId, head.documentNumber, studyId, ['head', 'documentNumber'])
    const after = await tx.study.update({
      where: { organisationId_id: { organisationId: place.organisationId, id: studyId }, version },
      data: {
        ...toJson(changes),
        ...(head ? { title: head.title, documentNumber: head.documentNumber } : {}),
        version: { increment: 1 },
        changedById: actor.userId,
        changedByName: actor.name,
        changedAt: at,
      },
    })
    return {
      answer: { version: after.version },
      events: [{ action: 'study-changed', subject: { kind: 'study', id: studyId }, payload: changes }],
    }
  },
})

/** Adds a schedule, a case or a limit. */
export const addStudyRecord = command({
  input: addedStudyRecord,
  scope: studyScope,
  load: async () => undefined,
  may: (actor) => can(actor, 'edit-study'),
  run: async ({ tx, place, actor, at }, { studyId, kind, values: given }) => {
    const values = readValues(studyRecordSchemas[kind], { id: newRecordId(kind), ...given }, ['values'])
    const { id, tag } = values
    const same = { studyId, kind }
    if (await tx.studyRecord.findFirst({ where: { ...same, id } })) {
      throw new DomainError('conflict', 'There is a record with this identity already: reload the page.')
    }
    refuseSameTag(await tx.studyRecord.findFirst({ where: { ...same, tag } }), tag)
    const last = await tx.studyRecord.aggregate({ where: same, _max: { position: true } })
    const row = await tx.studyRecord.create({
      data: {
        ...same,
        organisationId: place.organisationId,
        id,
        tag,
        values: toJson(values),
        position: (last._max.position ?? 0) + 1,
        changedById: actor.userId,
        changedByName: actor.name,
        changedAt: at,
      },
    })
    return {
      answer: presentRow(row) as Row,
      events: [{ action: 'record-added', subject: { kind, id }, payload: { studyId, values } }],
    }
  },
})

export const changeStudyRecord = command({
  input: changedStudyRecord,
  scope: studyScope,
  load: async ({ tx }, { studyId, kind, id }) => tx.studyRecord.findFirst({ where: { studyId, kind, id } }),
  may: (actor) => can(actor, 'edit-study'),
  run: async ({ tx, place, actor, at }, { studyId, kind, id, version, values: given }, before) => {
    const values = readValues(studyRecordSchemas[kind], { ...given, id }, ['values'])
    if (!before) throw new DomainError('not-found', 'This record has been removed meanwhile; add it again to keep it.')
    if (before.version !== version) throw conflictOf(before)
    const { tag } = values
    refuseSameTag(await tx.studyRecord.findFirst({ where: { studyId, kind, tag, id: { not: id } } }), tag)
    const row = await tx.studyRecord.update({
      where: { organisationId_studyId_kind_id: { organisationId: place.organisationId, studyId, kind, id }, version },
      data: {
        tag,
        values: toJson(values),
        version: { increment: 1 },
        changedById: actor.userId,
        changedByName: actor.name,
        changedAt: at,
      },
    })
    return {
      answer: presentRow(row) as Row,
      events: [
        { action: 'record-changed', subject: { kind, id }, payload: { studyId, before: before.values, after: values } },
      ],
    }
  },
})

export const removeStudyRecord = command({
  input: removedStudyRecord,
  scope: studyScope,
  load: async ({ tx }, { studyId, kind, id }) => tx.studyRecord.findFirst({ where: { studyId, kind, id } }),
  may: (actor) => can(actor, 'edit-study'),
  run: async ({ tx, place }, { studyId, kind, id, version }, before) => {
    if (!before) throw new DomainError('not-found', 'This record has been removed already.')
    if (before.version !== version) throw conflictOf(before)
    await refuseIfUsed(tx, place.projectId ?? '', studyId, { kind, id, tag: before.tag, values: before.values })
    const { organisationId } = place
    await tx.studyRecord.delete({ where: { organisationId_studyId_kind_id: { organisationId, studyId, kind, id } } })
    return {
      answer: { id },
      events: [{ action: 'record-removed', subject: { kind, id }, payload: { studyId, before: before.values } }],
    }
  },
})

/** Asks for all cases of the study; a worker computes them. Asked for again while it runs, the running one is answered. */
export const computeStudy = command({
  input: z.object({ studyId: idInput }),
  scope: studyScope,
  load: async ({ tx }, { studyId }) => loadStudy(tx, studyId),
  may: (actor) => can(actor, 'compute'),
  run: (context, _input, study) => requestRun(context, study),
})

/** Stops the computation that runs; results there were before stay. */
export const stopComputing = command({
  input: z.object({ studyId: idInput }),
  scope: studyScope,
  load: async ({ tx }, { studyId }) => loadStudy(tx, studyId),
  may: (actor) => can(actor, 'compute'),
  run: (context, { studyId }) => stopRun(context, studyId),
})

async function refuseSameNumber(
  tx: Parameters<typeof loadStudy>[0],
  projectId: string,
  documentNumber: string,
  studyId: string | null,
  path: string[],
): Promise<void> {
  const other = await tx.study.findFirst({
    where: { projectId, documentNumber, ...(studyId ? { id: { not: studyId } } : {}) },
  })
  if (!other) return
  throw new DomainError('invalid', 'The study cannot be kept as it is: correct the marked fields.', [
    { path, message: `“${other.title}” carries this number already: choose another document number.` },
  ])
}
