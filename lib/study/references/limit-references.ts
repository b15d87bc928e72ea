import type { FieldIssue } from '../../errors'
import type { LimitRecord } from '../document/limit-record'
import type { StudyDocument } from '../document/study-document'
import { known, unless } from './issue'
import type { RecordIndex } from './record-index'

type Quantity = LimitRecord['quantity']
type PlaceKind = LimitRecord['place']['kind']
type Reference = LimitRecord['reference']
type LimitKind = LimitRecord['limit']['kind']

const buses: readonly PlaceKind[] = ['bus', 'every-bus']
const motors: readonly PlaceKind[] = ['starting-motors', 'running-motors']
const starting: readonly PlaceKind[] = ['starting-motors']

/** What goes with what: where a quantity exists, in which form its limit is given. */
const fits: Record<
  Quantity,
  { places: readonly PlaceKind[]; where: string; limits: readonly LimitKind[]; form: string }
> = {
  'voltage-change': { places: buses, where: 'a bus', limits: ['ratio', 'envelope'], form: 'a ratio or an envelope' },
  'remaining-voltage': { places: [...buses, ...motors], where: 'a bus or motors', limits: ['ratio'], form: 'a ratio' },
  'highest-voltage': { places: buses, where: 'a bus', limits: ['ratio'], form: 'a ratio' },
  'run-up-time': { places: starting, where: 'the starting motors', limits: ['time'], form: 'a time' },
  'accelerating-torque': { places: starting, where: 'the starting motors', limits: ['ratio'], form: 'a ratio' },
  'heat-used': { places: starting, where: 'the starting motors', limits: ['ratio'], form: 'a ratio' },
  'flicker-short-term': { places: buses, where: 'a bus', limits: ['ratio'], form: 'a severity such as 0.9' },
  'flicker-long-term': { places: buses, where: 'a bus', limits: ['ratio'], form: 'a severity such as 0.7' },
  'trip-margin': { places: starting, where: 'the starting motors', limits: ['time'], form: 'a time' },
  'thermal-margin': { places: starting, where: 'the starting motors', limits: ['time'], form: 'a time' },
}

/** The references that make sense for a voltage at a place; other quantities have none to choose. */
const references = (limit: LimitRecord): { allowed: readonly Reference[]; words: string } | null => {
  if (limit.quantity === 'voltage-change')
    return { allowed: ['before', 'nominal'], words: 'the voltage before the start or nominal voltage' }
  if (limit.quantity === 'highest-voltage') return { allowed: ['nominal'], words: 'nominal voltage' }
  if (limit.quantity !== 'remaining-voltage') return null
  return motors.includes(limit.place.kind)
    ? { allowed: ['rated'], words: 'rated voltage of the motor' }
    : { allowed: ['before', 'nominal'], words: 'the voltage before the start or nominal voltage' }
}

const envelopeIssues = ({ limit, tag }: LimitRecord, path: FieldIssue['path']): FieldIssue[] =>
  limit.kind !== 'envelope'
    ? []
    : limit.steps.flatMap((step, k) => {
        const earlier = limit.steps[k - 1]
        return unless(
          earlier ? step.from.si > earlier.from.si : step.from.si === 0,
          [...path, 'limit', 'steps', k, 'from'],
          earlier
            ? `The steps of limit ${tag} must follow one another in time.`
            : `The first step of limit ${tag} begins at 0 s.`,
        )
      })

/** What a limit refers to must exist, and its quantity, place, reference and value must belong together. */
export const limitReferences = ({ limits }: StudyDocument, index: RecordIndex): FieldIssue[] =>
  limits.flatMap((limit, i) => {
    const path = ['limits', i] as const
    const who = `Limit ${limit.tag}`
    const fit = fits[limit.quantity]
    const reference = references(limit)
    const applies = [...path, 'appliesTo'] as const
    return [
      ...(limit.place.kind === 'bus' ? known(index.buses, limit.place.bus, [...path, 'place', 'bus'], who, 'bus') : []),
      ...unless(
        fit.places.includes(limit.place.kind),
        [...path, 'place'],
        `${who} limits what exists at ${fit.where} only; choose that place.`,
      ),
      ...unless(fit.limits.includes(limit.limit.kind), [...path, 'limit'], `${who} needs ${fit.form} as its value.`),
      ...unless(
        reference === null || reference.allowed.includes(limit.reference),
        [...path, 'reference'],
        `${who} is set against ${reference?.words}; choose that reference.`,
      ),
      ...envelopeIssues(limit, path),
      ...(limit.appliesTo.supplies ?? []).flatMap((id, k) =>
        known(index.supplies, id, [...applies, 'supplies', k], who, 'supply'),
      ),
      ...(limit.appliesTo.plantConditions ?? []).flatMap((id, k) =>
        known(index.plantConditions, id, [...applies, 'plantConditions', k], who, 'plant condition'),
      ),
      ...(limit.appliesTo.motors ?? []).flatMap((id, k) =>
        known(index.motors, id, [...applies, 'motors', k], who, 'motor'),
      ),
    ]
  })
