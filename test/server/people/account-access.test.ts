import { beforeEach, expect, test, vi } from 'vitest'
import { now } from '@/lib/server/clock'
import { database } from '@/lib/server/db'
import { createAccount } from '@/lib/server/people/create-account'
import { endSession, ownSessions } from '@/lib/server/people/sessions'
import { Browser } from '../support/browser'
import { useServer } from '../support/server'

useServer()

const password = 'a password of my own'
let count = 0
let email = ''
let userId = ''

beforeEach(async () => {
  count += 1
  email = `r${count}@newcomers.example`
  const account = { name: 'R. Example', email, password, initialPassword: false }
  ;({ userId } = await database().$transaction((tx) => createAccount(tx, account, now())))
})

const signedIn = async () => {
  const browser = new Browser()
  expect((await browser.post('/sign-in/email', { email, password })).status).toBe(200)
  return browser
}

/** What is printed while something is done: a local installation without a mail program prints its messages. */
async function printedBy(work: () => Promise<unknown>): Promise<string> {
  const written: string[] = []
  const spy = vi.spyOn(process.stdout, 'write').mockImplementation((text) => written.push(String(text)) > 0)
  try {
    await work()
    // the message is not waited for by the request that it belongs to
    await new Promise((resolve) => setTimeout(resolve, 50))
  } finally {
    spy.mockRestore()
  }
  return written.join('')
}

const resetToken = async (): Promise<string> => {
  const printed = await printedBy(() => new Browser().post('/request-password-reset', { email }))
  const found = printed.match(/\/new-password\/([\w-]+)/)
  expect(found, printed).not.toBeNull()
  return found![1]!
}

test('a forgotten password is replaced by the link that was sent, once, and every session ends', async () => {
  const before = await signedIn()
  const token = await resetToken()
  const chosen = 'another password of mine'
  expect((await new Browser().post('/reset-password', { token, newPassword: chosen })).status).toBe(200)
  expect(await before.person()).toBeNull()
  expect((await new Browser().post('/sign-in/email', { email, password })).status).toBe(401)
  expect((await new Browser().post('/sign-in/email', { email, password: chosen })).status).toBe(200)
  expect((await new Browser().post('/reset-password', { token, newPassword: 'a third one, replayed' })).status).toBe(
    400,
  )
})

test('the link of a reset cannot be read from the database', async () => {
  const token = await resetToken()
  expect(JSON.stringify(await database().verification.findMany())).not.toContain(token)
})

test('asking for a new password is answered alike whether there is an account or not', async () => {
  let known: unknown
  await printedBy(async () => {
    known = await new Browser().post('/request-password-reset', { email })
  })
  const unknown = await new Browser().post('/request-password-reset', { email: 'nobody@newcomers.example' })
  expect(unknown).toEqual(known)
  const printed = await printedBy(() =>
    new Browser().post('/request-password-reset', { email: 'nobody@newcomers.example' }),
  )
  expect(printed).toBe('')
})

test('an unknown address and a wrong password are refused alike, and both cost one hash', async () => {
  const tries = { known: email, unknown: `un${email}` }
  const times: Record<string, number> = {}
  for (const [name, address] of Object.entries(tries)) {
    const before = performance.now()
    const { status, body } = await new Browser().post('/sign-in/email', {
      email: address,
      password: 'not the password',
    })
    times[name] = performance.now() - before
    expect({ status, code: body.code }).toEqual({ status: 401, code: 'INVALID_EMAIL_OR_PASSWORD' })
  }
  // the hash takes tens of milliseconds; without it an unknown address would be answered in a fraction of that
  expect(times.unknown).toBeGreaterThan(times.known! / 4)
})

test('wrong passwords are slowed down by account, known or not, and a forged address in a header helps nobody', async () => {
  for (const address of [email, 'nobody-at-all@newcomers.example']) {
    const statuses: number[] = []
    for (let guess = 0; guess < 7; guess += 1) {
      const forged = { 'x-forwarded-for': `198.51.100.${guess}` }
      const guessed = { email: address, password: `guess ${guess}` }
      const { status } = await new Browser().post('/sign-in/email', guessed, forged)
      statuses.push(status)
    }
    expect(statuses, address).toEqual([401, 401, 401, 401, 401, 429, 429])
  }
})

test('twenty guesses at once are no way around the delay', async () => {
  const answers = await Promise.all(
    Array.from({ length: 20 }, (_, guess) =>
      new Browser().post('/sign-in/email', { email, password: `guess number ${guess}` }),
    ),
  )
  expect(answers.filter(({ status }) => status === 401).length).toBeLessThanOrEqual(5)
})

test('signing in makes a new session, whatever session a browser brought along', async () => {
  const planted = new Browser()
  planted.cookies.set('better-auth.session_token', encodeURIComponent(`${'x'.repeat(32)}.${'A'.repeat(43)}=`))
  expect(await planted.person()).toBeNull()
  await planted.post('/sign-in/email', { email, password })
  expect(planted.sessionToken).not.toBe('x'.repeat(32))
  const first = planted.sessionToken
  await planted.post('/sign-in/email', { email, password })
  expect(planted.sessionToken).not.toBe(first)
})

test('a session that ended is not brought back by its cookie', async () => {
  const browser = await signedIn()
  const copy = new Browser()
  for (const [name, value] of browser.cookies) copy.cookies.set(name, value)
  expect(await copy.person()).toBe(email)
  await browser.post('/sign-out', {})
  expect(await copy.person()).toBeNull()
})

test('a request from another site, or from nowhere, with the cookie of a session is refused', async () => {
  const own = await signedIn()
  for (const origin of ['https://elsewhere.example', 'null', null]) {
    const foreign = new Browser(origin)
    for (const [name, value] of own.cookies) foreign.cookies.set(name, value)
    const { status } = await foreign.post('/change-password', {
      currentPassword: password,
      newPassword: 'taken over now',
    })
    expect(status, String(origin)).toBe(403)
  }
  expect((await new Browser().post('/sign-in/email', { email, password })).status).toBe(200)
})

test('the person sees where they are signed in and ends one session or all others', async () => {
  const [here, there, elsewhere] = [await signedIn(), await signedIn(), await signedIn()]
  const actor = { userId, name: 'R. Example', email }
  const lines = await ownSessions(actor, here.sessionToken!)
  expect(lines.map(({ here: present, client }) => [present, client])).toEqual([
    [false, 'Firefox on Linux'],
    [false, 'Firefox on Linux'],
    [true, 'Firefox on Linux'],
  ])
  for (const browser of [here, there, elsewhere]) expect(JSON.stringify(lines)).not.toContain(browser.sessionToken)
  await endSession(actor, here.sessionToken!, { sessionId: lines[0]!.sessionId })
  expect(await elsewhere.person()).toBeNull()
  expect(await endSession(actor, here.sessionToken!, { sessionId: null })).toEqual({ ended: 1 })
  expect([await here.person(), await there.person()]).toEqual([email, null])
})

test('nobody ends a session of somebody else', async () => {
  const browser = await signedIn()
  const [line] = await ownSessions({ userId, name: '', email }, browser.sessionToken!)
  const other = { userId: 'somebody-else', name: 'O. Else', email: 'o.else@newcomers.example' }
  await expect(endSession(other, 'none', { sessionId: line!.sessionId })).rejects.toMatchObject({ code: 'not-found' })
  expect(await browser.person()).toBe(email)
})

test('what hands out or ends sessions by their secrets is shut over HTTP', async () => {
  const browser = await signedIn()
  for (const path of [
    '/revoke-session',
    '/revoke-sessions',
    '/revoke-other-sessions',
    '/update-user',
    '/sign-up/email',
  ])
    expect((await browser.post(path, { token: browser.sessionToken ?? '' })).status, path).toBe(404)
})

test('a password of great length is refused before it is hashed', async () => {
  const token = await resetToken()
  const { status, body } = await new Browser().post('/reset-password', { token, newPassword: 'x'.repeat(129) })
  expect({ status, code: body.code }).toEqual({ status: 400, code: 'PASSWORD_TOO_LONG' })
})
