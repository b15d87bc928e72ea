import 'server-only'
import * as z from 'zod'
import { database } from '../db'
import type { Presence } from './live-event'

/** Whoever was not heard of for so long has gone. Milliseconds. */
const forgottenAfter = 45_000

const word = z.object({
  projectId: z.string(),
  connection: z.string(),
  /** Null when the page was closed. */
  person: z.object({ userId: z.string(), name: z.string(), where: z.string() }).nullable(),
})

type Word = z.output<typeof word>

/** Who has which page open, in every process: announced over the database, kept nowhere. */
export class Present {
  private readonly places = new Map<string, Map<string, Presence & { heard: number }>>()
  private readonly onChange: (projectId: string) => void

  constructor(onChange: (projectId: string) => void) {
    this.onChange = onChange
  }

  in(projectId: string): Presence[] {
    const since = performance.now() - forgottenAfter
    return [...(this.places.get(projectId)?.values() ?? [])]
      .filter(({ heard }) => heard > since)
      .map(({ connection, userId, name, where }) => ({ connection, userId, name, where }))
  }

  announce = (projectId: string, { connection, userId, name, where }: Presence): Promise<void> =>
    tell({ projectId, connection, person: { userId, name, where } })

  leave = (projectId: string, connection: string): Promise<void> => tell({ projectId, connection, person: null })

  onWord(text: string): void {
    const { data } = word.safeParse(JSON.parse(text))
    if (!data) return
    const { projectId, connection, person } = data
    const there = this.places.get(projectId) ?? new Map<string, Presence & { heard: number }>()
    this.places.set(projectId, there)
    const known = there.get(connection)
    if (person) there.set(connection, { connection, ...person, heard: performance.now() })
    else there.delete(connection)
    const left = this.forget(projectId, there)
    if (left || (person ? known?.where !== person.where : known !== undefined)) this.onChange(projectId)
  }

  private forget(projectId: string, there: Map<string, { heard: number }>): boolean {
    const since = performance.now() - forgottenAfter
    let left = false
    for (const [connection, { heard }] of there) if (heard <= since) left = there.delete(connection) || left
    if (there.size === 0) this.places.delete(projectId)
    return left
  }
}

async function tell(said: Word): Promise<void> {
  await database().$executeRaw`select pg_notify('breakaway_presence', ${JSON.stringify(said)})`
}
