import fs from 'node:fs'
import path from 'node:path'
import { pause } from '@/lib/start/pause.mjs'

/** How far a computation has come, as a web process tells it. */
export interface RunAnswer {
  state: 'none' | 'queued' | 'running' | 'done' | 'failed' | 'stopped'
  runId?: string
  done: number
  of: number
}

/** A person signed in; the cookie is good at every web process of the same database. */
export async function signIn(address: string, person: { email: string; password: string }): Promise<string> {
  const answer = await fetch(new URL('/api/auth/sign-in/email', address), {
    method: 'POST',
    headers: { 'content-type': 'application/json', origin: address },
    body: JSON.stringify({ email: person.email, password: person.password }),
  })
  if (!answer.ok) throw new Error(`signing in answers ${answer.status}: ${await answer.text()}`)
  return answer.headers
    .getSetCookie()
    .map((cookie) => cookie.split(';')[0])
    .join('; ')
}

/** The number that a build gave to a server action. */
function actionNumber(server: string, name: string): string {
  const file = path.join(path.dirname(server), '.next/server/server-reference-manifest.json')
  const { node } = JSON.parse(fs.readFileSync(file, 'utf8')) as { node: Record<string, { exportedName?: string }> }
  const found = Object.entries(node).find(([, { exportedName }]) => exportedName === name)
  if (!found) throw new Error(`the build has no action ${name}`)
  return found[0]
}

/** Presses "Compute cases" on the page of the cases: the same request that a browser sends. */
export async function askToCompute(address: string, cookie: string, server: string, studyId: string): Promise<string> {
  const answer = await fetch(new URL(`/studies/${studyId}/cases`, address), {
    method: 'POST',
    headers: {
      cookie,
      origin: address,
      'next-action': actionNumber(server, 'computeCases'),
      accept: 'text/x-component',
      'content-type': 'text/plain;charset=UTF-8',
    },
    body: JSON.stringify([studyId]),
  })
  const text = await answer.text()
  const runId = /"ok":true,"value":\{"runId":"([^"]+)"/.exec(text)?.[1]
  if (!runId) throw new Error(`asking to compute answers ${answer.status}: ${text.slice(0, 500)}`)
  return runId
}

export async function runOf(address: string, cookie: string, studyId: string): Promise<RunAnswer> {
  const answer = await fetch(new URL(`/studies/${studyId}/run`, address), { headers: { cookie } })
  if (!answer.ok) throw new Error(`the run answers ${answer.status}`)
  return answer.json()
}

/** Asks again and again until the answer is the one waited for. */
export async function eventually<T>(ask: () => Promise<T>, isIt: (answer: T) => boolean, seconds: number): Promise<T> {
  const until = Date.now() + seconds * 1000
  for (;;) {
    const answer = await ask()
    if (isIt(answer)) return answer
    if (Date.now() > until) throw new Error(`after ${seconds} s it is still ${JSON.stringify(answer)}`)
    await pause(50)
  }
}
