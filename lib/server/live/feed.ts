import 'server-only'
import { env } from '../env'
import { listenTo } from '../jobs/wake-up'
import type { Presence } from './live-event'
import { Present } from './present'
import { eventsAfter, type FeedEvent } from './read-events'

/** Who follows a project in this process. */
export interface Follower {
  organisationId: string
  projectId: string
  onEvents(events: readonly FeedEvent[]): void
  onPresence(people: readonly Presence[]): void
}

/** All followers of this process behind two channels of the database, whatever their number. */
class Feed {
  private readonly followers = new Map<string, Set<Follower>>()
  private readonly reading = new Map<string, Promise<void>>()
  private readonly seen = new Map<string, number>()
  private readonly present = new Present((projectId) => this.tellPresence(projectId))

  constructor() {
    listenTo(env().DATABASE_URL, 'breakaway_event', (word) => this.onEvent(word))
    listenTo(env().DATABASE_URL, 'breakaway_presence', (word) => this.present.onWord(word))
  }

  follow(follower: Follower, from: number): () => void {
    const { projectId } = follower
    const all = this.followers.get(projectId) ?? new Set()
    this.followers.set(projectId, all.add(follower))
    this.seen.set(projectId, Math.max(from, this.seen.get(projectId) ?? 0))
    follower.onPresence(this.present.in(projectId))
    return () => {
      all.delete(follower)
      if (all.size > 0) return
      this.followers.delete(projectId)
      this.seen.delete(projectId)
    }
  }

  announce = (projectId: string, presence: Presence): Promise<void> => this.present.announce(projectId, presence)
  leave = (projectId: string, connection: string): Promise<void> => this.present.leave(projectId, connection)

  private onEvent(word: string): void {
    const { organisationId, scope } = JSON.parse(word) as { organisationId: string; scope: string }
    if (!this.followers.has(scope)) return
    // one reading at a time keeps the order, and takes together what comes close behind each other
    const before = this.reading.get(scope) ?? Promise.resolve()
    const next = before.then(() => this.read(organisationId, scope)).catch((error) => console.error(error))
    this.reading.set(scope, next)
  }

  private async read(organisationId: string, projectId: string): Promise<void> {
    const after = this.seen.get(projectId)
    if (after === undefined) return
    const events = await eventsAfter(organisationId, projectId, after)
    const last = events.at(-1)?.event.sequence
    if (last === undefined) return
    this.seen.set(projectId, last)
    for (const follower of this.followers.get(projectId) ?? []) follower.onEvents(events)
  }

  private tellPresence(projectId: string): void {
    const people = this.present.in(projectId)
    for (const follower of this.followers.get(projectId) ?? []) follower.onPresence(people)
  }
}

const shared = globalThis as typeof globalThis & { breakawayFeed?: Feed }

/** This process's feed, opened by the first who follows. */
export function feed(): Feed {
  shared.breakawayFeed ??= new Feed()
  return shared.breakawayFeed
}
