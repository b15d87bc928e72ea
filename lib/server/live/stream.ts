import 'server-only'
import { randomUUID } from 'node:crypto'
import type { Actor } from '../actor'
import { read } from '../read'
import { feed } from './feed'
import type { LiveEvent, Presence } from './live-event'
import { mayLearn } from './may-learn'
import { livePlace } from './queries'
import { eventsAfter, type FeedEvent, mostReplayed } from './read-events'

/** Keeps proxies from closing an idle connection, and finds out who no longer may follow. Milliseconds. */
const beat = 15_000

/** Pieces that may wait for a slow reader. */
const mostWaiting = 500

interface Following {
  projectId: string
  /** The last event that the browser has seen; null for a page that starts now. */
  after: number | null
  where: string
  /** Asked anew at every beat: the person while the session is in force. */
  whoIs: () => Promise<Actor | null>
  signal: AbortSignal
}

const line = (name: string, data: unknown, id?: number): string =>
  `${id === undefined ? '' : `id: ${id}\n`}event: ${name}\ndata: ${JSON.stringify(data)}\n\n`

/**
 * The events of a project as a stream for one open page: first what it has missed, then what happens, until the page is closed or the
 * person may no longer follow.
 * @throws DomainError when the person has no part in the project
 */
export async function liveStream(actor: Actor, { projectId, after, where, whoIs, signal }: Following) {
  let place = await read(livePlace, actor, { projectId })
  const connection = randomUUID()
  const presence: Presence = { connection, userId: actor.userId, name: actor.name, where }
  const works = () => [...place.policy.roles].some((role) => role !== 'client')
  let seen = after ?? place.sequence
  const text = new TextEncoder()
  let end = () => {}
  const body = new ReadableStream<Uint8Array>({
    async start(controller) {
      let over = false
      const send = (words: string) => {
        if (over) return
        // a reader that takes nothing any more is let go; it comes back with what it has seen
        if ((controller.desiredSize ?? 0) < -mostWaiting) return end()
        controller.enqueue(text.encode(words))
      }
      const onEvents = (events: readonly FeedEvent[]) => {
        for (const one of events) {
          if (one.event.sequence <= seen) continue
          seen = one.event.sequence
          if (mayLearn(place.policy, one)) send(line('happened', present(one.event, actor.userId), seen))
        }
      }
      const onPresence = (people: readonly Presence[]) => {
        if (!works()) return
        const others = people.filter((one) => one.connection !== connection)
        send(
          line(
            'present',
            others.map(({ name, where, userId }) => ({ name, where, own: userId === actor.userId })),
          ),
        )
      }
      const { organisationId } = place
      send('retry: 1000\n\n')
      const unfollow = feed().follow({ organisationId, projectId, onEvents, onPresence }, place.sequence)
      const timer = setInterval(() => void heartbeat(), beat)
      end = () => {
        if (over) return
        over = true
        clearInterval(timer)
        unfollow()
        void feed()
          .leave(projectId, connection)
          .catch(() => {})
        try {
          controller.close()
        } catch {
          // the reader has gone already
        }
      }
      const heartbeat = async () => {
        try {
          const person = await whoIs()
          if (!person) return end()
          place = await read(livePlace, person, { projectId })
          send(`: ${place.sequence}\n\n`)
          // what a lost connection to the database kept from us
          await catchUp()
          if (works()) await feed().announce(projectId, presence)
        } catch {
          end()
        }
      }
      const catchUp = async () => {
        const missed = await eventsAfter(organisationId, projectId, seen)
        if (missed.length > mostReplayed) {
          seen = Math.max(seen, place.sequence)
          return send(line('reload', {}, seen))
        }
        onEvents(missed)
      }
      signal.addEventListener('abort', end)
      await catchUp()
      // a page that nothing has happened on yet also knows where it stands
      send(line('standing', {}, seen))
      if (works()) await feed().announce(projectId, presence)
    },
    cancel: () => end(),
  })
  return body
}

const present = ({ actorId, ...event }: LiveEvent, userId: string) => ({ ...event, own: actorId === userId })
