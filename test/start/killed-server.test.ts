import { spawnSync } from 'node:child_process'
import pg from 'pg'
import { expect, test } from 'vitest'
import { ensureDatabase, withClient } from '@/lib/start/embedded/owner.mjs'
import { type Cluster, startCluster } from '@/lib/start/embedded/server.mjs'
import { ownCluster } from '../support/own-cluster'

/**
 * Writes pairs of rows, a pair a transaction, until the connection breaks; returns the pairs the server acknowledged.
 * `onEnough` is told once some are, while the next ones are under way.
 */
async function writeUntilBroken(url: string, round: number, onEnough: () => void): Promise<number[]> {
  const client = new pg.Client({ connectionString: url })
  client.on('error', () => {})
  await client.connect()
  const acknowledged: number[] = []
  try {
    for (let pair = 0; ; pair += 1) {
      await client.query('begin')
      await client.query('insert into entry values ($1, $2, 1)', [round, pair])
      await client.query('insert into entry values ($1, $2, 2)', [round, pair])
      await client.query('commit')
      acknowledged.push(pair)
      if (pair === 40) setTimeout(onEnough, round)
    }
  } catch {
    return acknowledged
  }
}

/** Kills the server at once; with `all`, its session processes too, as a failing machine would. */
function kill(cluster: Cluster, all: boolean): void {
  const sessions = all
    ? spawnSync('ps', ['-o', 'pid=', '--ppid', String(cluster.pid)], { encoding: 'utf8' }).stdout
    : ''
  process.kill(cluster.pid, 'SIGKILL')
  for (const pid of sessions.split('\n').map(Number).filter(Boolean)) {
    try {
      process.kill(pid, 'SIGKILL')
    } catch {
      // it noticed the end of the server first
    }
  }
}

test('a server killed in the middle of writing loses no committed row and keeps no half transaction', async () => {
  let cluster = await ownCluster()
  await ensureDatabase(cluster, 'records')
  const url = cluster.ownerUrl('records')
  await withClient(url, (client) => client.query('create table entry (round int, pair int, half int)'))
  const acknowledged: number[][] = []
  for (const round of [0, 1, 2]) {
    acknowledged.push(await writeUntilBroken(url, round, () => kill(cluster, round % 2 === 1)))
    cluster = await startCluster({ dataDir: cluster.dataDir })
  }
  const halves = await withClient(url, async (client) => {
    const { rows } = await client.query('select round, pair, count(*)::int as halves from entry group by 1, 2')
    return new Map(rows.map((row) => [`${row.round}/${row.pair}`, row.halves]))
  })
  const lost = acknowledged.flatMap((pairs, round) => pairs.filter((pair) => halves.get(`${round}/${pair}`) !== 2))
  expect(lost).toEqual([])
  expect([...halves.values()].filter((count) => count !== 2)).toEqual([])
  // otherwise nothing was tested
  for (const pairs of acknowledged) expect(pairs.length).toBeGreaterThan(40)
})
