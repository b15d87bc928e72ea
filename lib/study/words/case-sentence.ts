import type { CaseRecord } from '../document/case-records'
import type { StudyDocument } from '../document/study-document'
import { changePhrase } from './change-phrase'
import { listed, listedTags } from './list-words'
import { modelWords } from './model-words'
import { starterPhrase } from './starter-phrase'
import { motorTag, supplyTag } from './tags'

const unique = (words: readonly string[]): string[] => [...new Set(words)]

/** Motors that start by the same method at the same time are named together. */
const starts = (record: CaseRecord, document: StudyDocument): string => {
  const schedule = document.schedules.find(({ id }) => id === record.schedule)
  const groups = new Map<string, string[]>()
  for (const { motor, starter, at, after, attempts, initialSpeed } of schedule?.starts ?? []) {
    const method = document.plant.starters.find(({ id }) => id === starter)
    const fixed = at.si === 0 ? '' : `, ${at.text} later`
    const waiting = after && `, after ${motorTag(document, after.motor)} and at least ${after.interval.text} later`
    const again =
      attempts.length === 0 ? '' : `, with ${attempts.length} earlier ${attempts.length === 1 ? 'attempt' : 'attempts'}`
    const turning = initialSpeed ? `, turning at ${initialSpeed.text}` : ''
    const generator = document.plant.motors.find(({ id }) => id === motor)?.role === 'generator'
    const when = turning + (waiting ?? fixed) + again
    const key = `${generator ? 'switched in' : 'started'} | ${method ? starterPhrase(method) : starter}${when}`
    groups.set(key, [...(groups.get(key) ?? []), motorTag(document, motor)])
  }
  return listed(
    [...groups].map(([key, tags]) => {
      const [what, how] = key.split(' | ')
      return `${listedTags(tags)} ${what} ${tags.length > 1 ? 'together ' : ''}${how}`
    }),
  )
}

/** A dip of the supply in words; empty where there is none. */
const dip = (record: CaseRecord, document: StudyDocument): string => {
  const disturbance = document.schedules.find(({ id }) => id === record.schedule)?.disturbance
  if (!disturbance) return ''
  const { at, duration, remaining, to } = disturbance
  if (to)
    return `transfer to the ${supplyTag(document, to.supply)} supply after ${duration.text} without${at.si === 0 ? '' : `, beginning at ${at.text}`}`
  const what = remaining.si === 0 ? 'supply away' : `supply at ${remaining.text}`
  return `${what} for ${duration.text}${at.si === 0 ? '' : `, beginning at ${at.text}`}`
}

const running = (record: CaseRecord, document: StudyDocument): string => {
  const condition = document.plant.plantConditions.find(({ id }) => id === record.plantCondition)
  const tags = (condition?.running ?? []).map(({ motor }) => motorTag(document, motor))
  return tags.length === 0 ? 'with no motor running' : `with ${listedTags(tags)} running`
}

/** `valve closed` and `valve open` read as `valve closed, then open`. */
const then = (first: string, second: string): string => {
  const [a, b] = [first.split(' '), second.split(' ')]
  const shared = a.length > 1 && b.length > 1 && a[0] === b[0] ? 1 : 0
  return first === second ? first : `${first}, then ${b.slice(shared).join(' ')}`
}

const loads = (record: CaseRecord, document: StudyDocument): string => {
  const condition = document.plant.loadConditions.find(({ id }) => id === record.loadCondition)
  const starting = document.schedules.find(({ id }) => id === record.schedule)?.starts.map(({ motor }) => motor) ?? []
  const nameOf = (motor: string, curve: string): string =>
    document.plant.drivenLoads.find((load) => load.motor === motor)?.curves.find(({ id }) => id === curve)?.name ??
    curve
  const phrases = (condition?.curves ?? [])
    .filter(({ motor }) => starting.includes(motor))
    .map((one) => then(nameOf(one.motor, one.starting), nameOf(one.motor, one.process ?? one.starting)))
  return listed(unique(phrases))
}

/** A case in one sentence without its full stop: what starts, how, on which supply, beside what, against which load. */
export const caseSentence = (record: CaseRecord, document: StudyDocument): string => {
  const changes = record.changes.map((change) => changePhrase(change, document))
  const load = loads(record, document)
  const happening = [starts(record, document), dip(record, document)].filter((part) => part !== '')
  return [
    `${listed(happening)} on the ${supplyTag(document, record.supply)} supply ${running(record, document)}`,
    ...(load === '' ? [] : [load]),
    ...(record.model === 'quasi-static' ? [] : [`${modelWords[record.model]} model`]),
    ...(changes.length === 0 ? [] : [listed(changes)]),
  ].join('; ')
}
