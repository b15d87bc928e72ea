import 'server-only'
import { DomainError } from '@/lib/errors'
import { can } from '@/lib/policy/can'
import { plantRecordSchemas } from '@/lib/study/document/record-kinds'
import { conflictOf, newRecordId, refuseSameTag } from '../live-record'
import { command } from '../perform'
import { readValues } from '../record-values'
import type { Row } from '../row'
import { toJson } from '../to-json'
import { refuseIfUsed } from '../where-used'
import { busesOf } from './buses-of'
import { requireBuses } from './require-buses'
import { presentRow } from './rows'
import { addedPlantRecord, changedPlantRecord, removedPlantRecord } from './schema'

const projectScope = ({ projectId }: { projectId: string }) => ({ kind: 'project' as const, id: projectId })

/** Adds a record at the end of its sheet; without an id in the values it gets one. */
export const addRecord = command({
  input: addedPlantRecord,
  scope: projectScope,
  load: async () => undefined,
  may: (actor) => can(actor, 'edit-plant'),
  run: async ({ tx, place, actor, at }, { projectId, kind, values: given }) => {
    const values = readValues(plantRecordSchemas[kind], { id: newRecordId(kind), ...given }, ['values'])
    const { id, tag } = values
    const { organisationId } = place
    const same = { projectId, kind }
    if (await tx.plantRecord.findFirst({ where: { ...same, id } })) {
      throw new DomainError('conflict', 'There is a record with this identity already: reload the page.')
    }
    refuseSameTag(await tx.plantRecord.findFirst({ where: { ...same, tag } }), tag)
    const buses = busesOf(kind, values)
    await requireBuses(tx, projectId, kind, buses)
    const last = await tx.plantRecord.aggregate({ where: same, _max: { position: true } })
    const row = await tx.plantRecord.create({
      data: {
        ...same,
        ...buses,
        organisationId,
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
      events: [{ action: 'record-added', subject: { kind, id }, payload: { values } }],
    }
  },
})

/** Changes a record as it was read; if somebody else came first, the refusal says who and holds both sides. */
export const changeRecord = command({
  input: changedPlantRecord,
  scope: projectScope,
  load: async ({ tx }, { projectId, kind, id }) => tx.plantRecord.findFirst({ where: { projectId, kind, id } }),
  may: (actor) => can(actor, 'edit-plant'),
  run: async ({ tx, place, actor, at }, { projectId, kind, id, version, values: given }, before) => {
    const values = readValues(plantRecordSchemas[kind], { ...given, id }, ['values'])
    if (!before) throw new DomainError('not-found', 'This record has been removed meanwhile; add it again to keep it.')
    if (before.version !== version) throw conflictOf(before)
    const { tag } = values
    refuseSameTag(await tx.plantRecord.findFirst({ where: { projectId, kind, tag, id: { not: id } } }), tag)
    const buses = busesOf(kind, values)
    await requireBuses(tx, projectId, kind, buses)
    const row = await tx.plantRecord.update({
      where: {
        organisationId_projectId_kind_id: { organisationId: place.organisationId, projectId, kind, id },
        version,
      },
      data: {
        ...buses,
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
      events: [{ action: 'record-changed', subject: { kind, id }, payload: { before: before.values, after: values } }],
    }
  },
})

/** Removes a record that nothing points at; otherwise the refusal lists where it is used. */
export const removeRecord = command({
  input: removedPlantRecord,
  scope: projectScope,
  load: async ({ tx }, { projectId, kind, id }) => tx.plantRecord.findFirst({ where: { projectId, kind, id } }),
  may: (actor) => can(actor, 'edit-plant'),
  run: async ({ tx, place }, { projectId, kind, id, version }, before) => {
    if (!before) throw new DomainError('not-found', 'This record has been removed already.')
    if (before.version !== version) throw conflictOf(before)
    await refuseIfUsed(tx, projectId, null, { kind, id, tag: before.tag, values: before.values })
    const { organisationId } = place
    await tx.plantRecord.delete({
      where: { organisationId_projectId_kind_id: { organisationId, projectId, kind, id } },
    })
    return {
      answer: { id },
      events: [{ action: 'record-removed', subject: { kind, id }, payload: { before: before.values } }],
    }
  },
})
