/** Instants at which a voltage can be spoken of; `before` is that before the start. */
export const anchorInstants = ['before', 'first', 'deepest', 'settled-after-start', 'settled-after-process'] as const

/** Figures of one start that can be spoken of. */
export const startFigures = ['run-up-time', 'accelerating-torque', 'heat-used', 'line-current'] as const

/** Curves whose points can be spoken of. */
export const pointCurves = ['voltage', 'speed', 'current'] as const

export type AnchorInstant = (typeof anchorInstants)[number]
export type StartFigure = (typeof startFigures)[number]
export type PointCurve = (typeof pointCurves)[number]

/** What a comment is about: identities only, never a position or a tag, so that it is found again in the next revision. */
export type Anchor =
  | { kind: 'revision' }
  /** A record, or a value in it: `motors`, its identity, names that lead to the value. */
  | { kind: 'record'; list: string; id: string; path: readonly string[] }
  | { kind: 'verdict'; limitId: string; caseId: string }
  | { kind: 'case'; caseId: string }
  | { kind: 'voltage'; caseId: string; busId: string; instant: AnchorInstant }
  | { kind: 'start'; caseId: string; motorId: string; figure: StartFigure }
  /** A point of a curve; `of` is a bus or a motor, the instant in seconds from the first switching-on. */
  | { kind: 'point'; caseId: string; curve: PointCurve; of: string; at: number }
  | { kind: 'check'; checkId: string }
  | { kind: 'section'; key: string }

const isOneOf = <Word extends string>(words: readonly Word[], word: string | undefined): word is Word =>
  words.some((one) => one === word)

/** The text of an anchor, as it is stored and as it stands in addresses. */
export const printAnchor = (anchor: Anchor): string => {
  switch (anchor.kind) {
    case 'revision':
      return 'revision'
    case 'record':
      return ['record', anchor.list, anchor.id, ...anchor.path].join('/')
    case 'verdict':
      return `limit/${anchor.limitId}/case/${anchor.caseId}`
    case 'case':
      return `case/${anchor.caseId}`
    case 'voltage':
      return `case/${anchor.caseId}/place/${anchor.busId}/voltage/${anchor.instant}`
    case 'start':
      return `case/${anchor.caseId}/motor/${anchor.motorId}/${anchor.figure}`
    case 'point':
      return `series/${anchor.caseId}/${anchor.curve}/${anchor.of}@${anchor.at.toFixed(3)}`
    case 'check':
      return `check/${anchor.checkId}`
    case 'section':
      return `section/${anchor.key}`
  }
}

const inCase = (caseId: string, rest: readonly string[]): Anchor | null => {
  const [what, id, name, instant] = rest
  if (what === undefined) return { kind: 'case', caseId }
  if (!id) return null
  if (what === 'place' && name === 'voltage' && isOneOf(anchorInstants, instant) && rest.length === 4)
    return { kind: 'voltage', caseId, busId: id, instant }
  if (what === 'motor' && isOneOf(startFigures, name) && rest.length === 3)
    return { kind: 'start', caseId, motorId: id, figure: name }
  return null
}

const point = (caseId: string, curve: string | undefined, end: string | undefined): Anchor | null => {
  const [of, instant] = (end ?? '').split('@')
  const at = Number(instant)
  return isOneOf(pointCurves, curve) && of && instant && Number.isFinite(at) && at >= 0
    ? { kind: 'point', caseId, curve, of, at }
    : null
}

/** Reads the text of an anchor; null where it is none. */
export const parseAnchor = (text: string): Anchor | null => {
  const [kind, first, ...rest] = text.split('/')
  if (text === 'revision') return { kind: 'revision' }
  if (!first || text.length > 300) return null
  switch (kind) {
    case 'record':
      return rest[0] && rest.every((step) => step !== '')
        ? { kind: 'record', list: first, id: rest[0], path: rest.slice(1) }
        : null
    case 'limit':
      return rest[0] === 'case' && rest[1] && rest.length === 2
        ? { kind: 'verdict', limitId: first, caseId: rest[1] }
        : null
    case 'case':
      return inCase(first, rest)
    case 'series':
      return rest.length === 2 ? point(first, rest[0], rest[1]) : null
    case 'check':
      return rest.length === 0 ? { kind: 'check', checkId: first } : null
    case 'section':
      return rest.length === 0 ? { kind: 'section', key: first } : null
    default:
      return null
  }
}
