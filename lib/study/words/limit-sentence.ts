import { isFloor } from '../../engine/criteria/envelope'
import type { LimitRecord } from '../document/limit-record'
import type { StudyDocument } from '../document/study-document'
import { listed } from './list-words'
import { methodNames } from './quantity-words'
import { busTag, motorTag, plantConditionTag, supplyTag } from './tags'

/** Where a limit holds, as one says it. */
export const placePhrase = ({ place }: LimitRecord, document: StudyDocument): string => {
  switch (place.kind) {
    case 'bus':
      return busTag(document, place.bus)
    case 'every-bus':
      return 'every bus'
    case 'starting-motors':
      return 'starting motors'
    case 'running-motors':
      return 'running motors'
  }
}

const changeNames: Record<LimitRecord['instant'], string> = {
  first: 'change at the first instant',
  deepest: 'deepest change',
  'settled-after-start': 'settled change after the start',
  'settled-after-process': 'settled change after the process loads',
}

const instants: Record<LimitRecord['instant'], string> = {
  first: ' at the first instant',
  deepest: '',
  'settled-after-start': ' settled after the start',
  'settled-after-process': ' settled after the process loads',
}

/** What is limited, with its instant and the settings that define it. */
export const limitedQuantity = ({ quantity, instant }: LimitRecord, { settings }: StudyDocument): string => {
  switch (quantity) {
    case 'voltage-change':
      return changeNames[instant]
    case 'remaining-voltage':
      return `remaining voltage${instants[instant]}`
    case 'highest-voltage':
      return 'highest voltage'
    case 'run-up-time':
      return `run-up to ${settings.speedCriterion.text} of rated speed with the starting device in its running position`
    case 'accelerating-torque':
      return 'least accelerating torque up to 95 % of rated speed'
    case 'heat-used':
      return `heat used from ${settings.thermalState}`
    case 'flicker-short-term':
      return 'short-term flicker Pst by flickermeter'
    case 'flicker-long-term':
      return 'long-term flicker Plt by flickermeter'
    case 'trip-margin':
      return 'time that the relay of the feeder leaves a start'
    case 'thermal-margin':
      return `permissible locked-rotor time from ${settings.thermalState} less time to trip with the rotor held`
  }
}

/** Quantities that are no part of anything. */
const withoutReference: ReadonlySet<LimitRecord['quantity']> = new Set([
  'run-up-time',
  'flicker-short-term',
  'flicker-long-term',
  'trip-margin',
  'thermal-margin',
])

const parts = ({ quantity, reference }: LimitRecord): string => {
  if (quantity === 'heat-used') return ' of the permissible locked-rotor heat'
  if (quantity === 'accelerating-torque') return ' of rated torque'
  if (withoutReference.has(quantity)) return ''
  return { before: ' of the voltage before the start', nominal: ' of nominal', rated: ' of rated voltage' }[reference]
}

/** The value as typed, with its side: `at most 4.0 % of the voltage before the start`. */
export const limitValuePhrase = (limit: LimitRecord): string => {
  const side = isFloor(limit.quantity) ? 'at least' : 'at most'
  if (limit.limit.kind !== 'envelope') return `${side} ${limit.limit.value.text}${parts(limit)}`
  const steps = limit.limit.steps.map(({ from, value }, i) =>
    i === 0 ? value.text : `${value.text} from ${from.text} on`,
  )
  return `${side} ${listed(steps, 'then')}${parts(limit)}`
}

const bound = (words: string, value: number | null, unit: string): string[] =>
  value === null ? [] : [`${words} ${value} ${unit}`]

const startClassPhrase = ({ startClass }: LimitRecord): string[] => {
  if (!startClass) return []
  const { moreThanPerDay, atMostPerDay, moreThanPerHour, atMostPerHour } = startClass
  const bounds = [
    ...bound('more than', moreThanPerDay, 'starts a day'),
    ...bound('at most', atMostPerDay, 'starts a day'),
    ...bound('more than', moreThanPerHour, 'an hour'),
    ...bound('at most', atMostPerHour, 'an hour'),
  ]
  return bounds.length === 0 ? [] : [`for ${listed(bounds)}`]
}

/** What a limit is written for, as phrases; none where it applies to all. */
export const appliesToPhrases = (limit: LimitRecord, document: StudyDocument): string[] => {
  const { supplies, plantConditions, methods, motors } = limit.appliesTo
  const only = (ids: readonly string[] | null, tagOf: (id: string) => string, noun: string): string[] =>
    ids === null ? [] : [`${noun}${listed(ids.map(tagOf))} only`]
  return [
    ...startClassPhrase(limit),
    ...only(supplies, (id) => supplyTag(document, id), 'supply '),
    ...only(plantConditions, (id) => plantConditionTag(document, id), ''),
    ...only(methods, (kind) => methodNames[kind as keyof typeof methodNames] ?? kind, ''),
    ...only(motors, (id) => motorTag(document, id), ''),
  ]
}

/** A limit in one sentence without its full stop: place, what, value with its reference, and for what it is written. */
export const limitSentence = (limit: LimitRecord, document: StudyDocument): string =>
  [
    `${placePhrase(limit, document)}: ${limitedQuantity(limit, document)}, ${limitValuePhrase(limit)}`,
    ...appliesToPhrases(limit, document),
  ].join('; ')
