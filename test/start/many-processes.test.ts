import { type ChildProcess, spawn } from 'node:child_process'
import crypto from 'node:crypto'
import fs from 'node:fs'
import path from 'node:path'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { bringUpToDate, startEmbedded } from '@/lib/start/database.mjs'
import { readDemoPeople, seedDemo } from '@/lib/start/demo.mjs'
import { withClient } from '@/lib/start/embedded/owner.mjs'
import type { Cluster } from '@/lib/start/embedded/server.mjs'
import { bundleOf } from '@/lib/start/entries.mjs'
import { anyFreePort } from '@/lib/start/port.mjs'
import { prepareApplication, preparePrograms } from '@/lib/start/prepare.mjs'
import { programEnvironment } from '@/lib/start/program-environment.mjs'
import { inRoot, root } from '@/lib/start/root.mjs'
import { waitForHealth } from '@/lib/start/service/health.mjs'
import { ends, hears } from '../support/run-module'
import { askToCompute, eventually, runOf, signIn } from '../support/served-study'

const folder = inRoot('.data', 'test', `own-${process.pid}-processes`)
const studyId = 'demo-velmoor-starting'
const processes: ChildProcess[] = []
let cluster: Cluster
let server: string
let environment: NodeJS.ProcessEnv
let webs: string[]
let workers: ChildProcess[]
let cookie: string

const start = (args: string[], env: NodeJS.ProcessEnv): ChildProcess => {
  const child = spawn(process.execPath, args, { cwd: root, env, stdio: ['ignore', 'pipe', 'inherit'] })
  processes.push(child)
  return child
}

async function startWorker(): Promise<ChildProcess> {
  const worker = start([bundleOf('worker')], environment)
  await hears(worker, 'worker ready')
  return worker
}

async function startWeb(): Promise<string> {
  const port = await anyFreePort()
  const address = `http://127.0.0.1:${port}`
  const web = start([server], { ...environment, HOSTNAME: '127.0.0.1', PORT: String(port), BASE_URL: address })
  web.stdout?.resume()
  expect(await waitForHealth(address, { seconds: 60 })).toBe(true)
  return address
}

/** Asks the database itself, past row-level security: what the application says about itself is what is under test. */
const observe = async (sql: string): Promise<Record<string, unknown> | undefined> =>
  withClient(cluster.adminUrl('breakaway'), async (client) => (await client.query(sql)).rows[0])

beforeAll(async () => {
  const quiet = () => {}
  await preparePrograms(quiet)
  server = await prepareApplication(quiet)
  const embedded = await startEmbedded(folder)
  cluster = embedded.cluster
  await bringUpToDate(embedded.url)
  const secret = () => crypto.randomBytes(32).toString('base64url')
  const secrets = { BETTER_AUTH_SECRET: secret(), CA_WRAP_SECRET: secret() }
  // the test tool keeps a BASE_URL of its own in the environment
  const BASE_URL = 'http://127.0.0.1'
  environment = { ...process.env, ...programEnvironment({ databaseUrl: embedded.url, secrets }), BASE_URL }
  const peopleFile = path.join(folder, 'people.json')
  await seedDemo(embedded.url, peopleFile, environment)
  workers = await Promise.all([startWorker(), startWorker()])
  webs = [await startWeb(), await startWeb()]
  const engineer = readDemoPeople(peopleFile).find(({ role }) => role?.includes('engineer'))
  if (!engineer) throw new Error('the demo has no engineer')
  cookie = await signIn(webs[0] ?? '', engineer)
}, 400_000)

afterAll(async () => {
  for (const child of processes) child.kill('SIGKILL')
  await Promise.all(processes.map(ends))
  await cluster?.stop()
  fs.rmSync(folder, { recursive: true, force: true })
})

test('what one web process asks for is done by a worker and seen at the other web process', async () => {
  const [first = '', second = ''] = webs
  // the study that came with the demo is computed first
  await eventually(
    () => runOf(second, cookie, studyId),
    ({ state }) => state === 'done',
    90,
  )
  const runId = await askToCompute(first, cookie, server, studyId)
  const done = await eventually(
    () => runOf(second, cookie, studyId),
    (run) => run.runId === runId && run.state === 'done',
    90,
  )
  expect(done.done).toBe(done.of)
  expect(done.of).toBeGreaterThan(0)
  const page = await fetch(new URL(`/studies/${studyId}/results`, second), { headers: { cookie } })
  expect(page.status).toBe(200)
  expect(await page.text()).toContain('Results belong to the records as they stand.')
  const { n } = (await observe(`select count(*)::int as n from pg_stat_activity where usename = 'breakaway'`)) ?? {}
  expect(n).toBeLessThan(90)
}, 200_000)

test('the job of a worker killed in the middle of it is done by the other worker, once', async () => {
  const [first = '', second = ''] = webs
  const [victim, other] = workers
  // held still, it cannot take the job; so it is known who has it
  other?.kill('SIGSTOP')
  const runId = await askToCompute(first, cookie, server, studyId)
  const running = () => observe(`select state, attempt from study_run where id = '${runId}'`)
  await eventually(running, (run) => run?.state === 'running', 60)
  victim?.kill('SIGKILL')
  expect(await running()).toEqual({ state: 'running', attempt: 1 })
  // the time after which a silent job counts as lost passes at once
  await observe(`update pgboss.job set started_on = now() - interval '1 day' where state = 'active'`)
  other?.kill('SIGCONT')
  const done = await eventually(
    () => runOf(second, cookie, studyId),
    (run) => run.runId === runId && run.state === 'done',
    120,
  )
  expect(done.done).toBe(done.of)
  expect(await running()).toEqual({ state: 'done', attempt: 2 })
}, 240_000)
