import 'server-only'
import pg from 'pg'

/** How long to wait before listening again after the connection was lost. Milliseconds. */
const pause = 1000

/**
 * Listens on a channel of the database and comes back by itself after a lost connection. What is announced meanwhile is missed, so the
 * listener must not rely on it alone.
 */
export function listenTo(
  databaseUrl: string,
  channel: string,
  onWord: (word: string) => void,
): { close(): Promise<void> } {
  let client: pg.Client | null = null
  let closed = false
  let retry: NodeJS.Timeout | undefined
  const again = () => {
    client = null
    if (!closed) retry = setTimeout(connect, pause)
  }
  const connect = () => {
    const fresh = new pg.Client({
      connectionString: databaseUrl,
      keepAlive: true,
      application_name: 'breakaway-listen',
    })
    client = fresh
    let over = false
    const lost = () => {
      if (over) return
      over = true
      fresh.end().catch(() => {})
      again()
    }
    fresh.on('error', lost)
    fresh.on('end', lost)
    fresh.on('notification', ({ payload }) => onWord(payload ?? ''))
    fresh
      .connect()
      .then(() => fresh.query(`listen ${pg.escapeIdentifier(channel)}`))
      .catch(lost)
  }
  connect()
  return {
    close: async () => {
      closed = true
      clearTimeout(retry)
      await client?.end().catch(() => {})
    },
  }
}
