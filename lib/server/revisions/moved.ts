import type { LiveStudy } from '../studies/live-study'
import type { Moved } from './view'

interface Version {
  tag: string
  version: number
  by: string | null
  at: string | null
}

/** Version of each record by `kind/id`; the study itself is `study/<id>`. */
export type Versions = Record<string, Version>

export function versionsOf({ study, plant, records }: LiveStudy): Versions {
  const rows = Object.entries({ ...plant, ...records }).flatMap(([kind, list]) =>
    list.map((row): [string, Version] => [
      `${kind}/${row.id}`,
      { tag: row.values.tag, version: row.version, by: row.changedBy, at: row.changedAt },
    ]),
  )
  const own: Version = {
    tag: study.title,
    version: study.version,
    by: study.changedByName,
    at: study.changedAt.toISOString(),
  }
  return Object.fromEntries([[`study/${study.id}`, own], ...rows])
}

/** What is not as it was: added, changed or removed since the freeze. A record added again under its old identity counts as changed. */
export function movedBetween(frozen: Versions, live: Versions): Moved[] {
  const named = (key: string) => ({ kind: key.slice(0, key.indexOf('/')), id: key.slice(key.indexOf('/') + 1) })
  const now = Object.entries(live).flatMap(([key, { tag, version, by, at }]): Moved[] => {
    const before = frozen[key]
    if (!before) return [{ ...named(key), tag, change: 'added', by, at }]
    return before.version === version && before.at === at ? [] : [{ ...named(key), tag, change: 'changed', by, at }]
  })
  const gone = Object.entries(frozen)
    .filter(([key]) => !live[key])
    .map(([key, { tag }]): Moved => ({ ...named(key), tag, change: 'removed', by: null, at: null }))
  return [...now, ...gone]
}
