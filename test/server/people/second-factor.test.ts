import { beforeEach, expect, test } from 'vitest'
import { now } from '@/lib/server/clock'
import { database } from '@/lib/server/db'
import { enterAsJob } from '@/lib/server/enter'
import { createAccount } from '@/lib/server/people/create-account'
import { demo } from '@/prisma/seed/seed-demo'
import { codeOf } from '../support/authenticator'
import { Browser } from '../support/browser'
import { useDemo } from '../support/demo'

useDemo()

const password = 'a password of my own'
let count = 0
let email = ''
let userId = ''

// each test has a member of the demo's organisation for itself
beforeEach(async () => {
  count += 1
  email = `s${count}@newcomers.example`
  await database().$transaction(async (tx) => {
    const account = await createAccount(tx, { name: 'S. Example', email, password, initialPassword: false }, now())
    userId = account.userId
    await enterAsJob(tx, demo.organisationId)
    const { organisationId } = demo
    await tx.membership.create({ data: { organisationId, userId, role: 'member', addedAt: now() } })
  })
})

const signedIn = async () => {
  const browser = new Browser()
  expect((await browser.post('/sign-in/email', { email, password })).status).toBe(200)
  return browser
}

/** Sets the second factor as the profile page does; the answer is what the app scans, and the recovery codes. */
async function withSecondFactor() {
  const browser = await signedIn()
  const { status, body } = await browser.post('/two-factor/enable', { password })
  expect(status).toBe(200)
  const address = String(body.totpURI)
  expect((await browser.post('/two-factor/verify-totp', { code: codeOf(address) })).status).toBe(200)
  return { browser, address, recovery: body.backupCodes as string[] }
}

const eventsOf = (person: string) =>
  database().$transaction(async (tx) => {
    await enterAsJob(tx, demo.organisationId)
    const rows = await tx.auditEvent.findMany({ where: { subjectId: person }, orderBy: { sequence: 'asc' } })
    return rows.map(({ action, payload }) => [action, (payload as { secondFactor?: string }).secondFactor])
  })

test('with a second factor the password alone opens nothing', async () => {
  await withSecondFactor()
  const browser = new Browser()
  const { body } = await browser.post('/sign-in/email', { email, password })
  expect(body).toMatchObject({ twoFactorRedirect: true })
  expect(await browser.person()).toBeNull()
})

test('the code of the app completes the sign-in, and each step is written down', async () => {
  const { address } = await withSecondFactor()
  const browser = new Browser()
  await browser.post('/sign-in/email', { email, password })
  expect((await browser.post('/two-factor/verify-totp', { code: codeOf(address, 1) })).status).toBe(200)
  expect(await browser.person()).toBe(email)
  expect(await eventsOf(userId)).toEqual([
    ['signed-in', undefined],
    ['second-factor-set', undefined],
    ['signed-in', 'authenticator app'],
  ])
})

test('a code that was used is refused when it is used again', async () => {
  const { address } = await withSecondFactor()
  const code = codeOf(address, 1)
  const first = new Browser()
  await first.post('/sign-in/email', { email, password })
  expect((await first.post('/two-factor/verify-totp', { code })).status).toBe(200)
  const second = new Browser()
  await second.post('/sign-in/email', { email, password })
  expect((await second.post('/two-factor/verify-totp', { code })).status).toBe(401)
  expect(await second.person()).toBeNull()
})

test('a recovery code opens once', async () => {
  const { recovery } = await withSecondFactor()
  expect(recovery).toHaveLength(10)
  const code = recovery[0]!
  const first = new Browser()
  await first.post('/sign-in/email', { email, password })
  expect((await first.post('/two-factor/verify-backup-code', { code })).status).toBe(200)
  const second = new Browser()
  await second.post('/sign-in/email', { email, password })
  expect((await second.post('/two-factor/verify-backup-code', { code })).status).toBe(401)
  expect(await second.person()).toBeNull()
  expect((await eventsOf(userId)).at(-1)).toEqual(['signed-in', 'recovery code'])
})

test('guessing codes ends the sign-in after five and locks the second step after ten', async () => {
  const { address } = await withSecondFactor()
  const statuses: number[] = []
  for (let round = 0; round < 3; round += 1) {
    const browser = new Browser()
    await browser.post('/sign-in/email', { email, password })
    for (let guess = 0; guess < 6; guess += 1) {
      const { status } = await browser.post('/two-factor/verify-totp', { code: `00000${guess}${round}`.slice(-6) })
      statuses.push(status)
    }
    expect(await browser.person()).toBeNull()
  }
  expect(statuses.slice(0, 6)).toEqual([401, 401, 401, 401, 401, 400])
  expect(statuses.at(-1)).toBe(429)
  const owner = new Browser()
  await owner.post('/sign-in/email', { email, password })
  expect((await owner.post('/two-factor/verify-totp', { code: codeOf(address, 1) })).status).toBe(429)
})

test('a code without the password before it opens nothing, nor does a forged second step', async () => {
  const { address } = await withSecondFactor()
  const browser = new Browser()
  expect((await browser.post('/two-factor/verify-totp', { code: codeOf(address, 1) })).status).toBe(401)
  browser.cookies.set('better-auth.two_factor', encodeURIComponent(`2fa-${'x'.repeat(20)}.${'A'.repeat(43)}=`))
  expect((await browser.post('/two-factor/verify-totp', { code: codeOf(address, 1) })).status).toBe(401)
  expect(await browser.person()).toBeNull()
})

test('no browser is excepted from the second step', async () => {
  const { address } = await withSecondFactor()
  const browser = new Browser()
  await browser.post('/sign-in/email', { email, password })
  const { status } = await browser.post('/two-factor/verify-totp', { code: codeOf(address, 1), trustDevice: true })
  expect(status).toBe(400)
  expect(await browser.person()).toBeNull()
})

test('taking the second factor away needs the password, which cannot be guessed at a browser left open', async () => {
  const { browser } = await withSecondFactor()
  const tries: number[] = []
  for (let guess = 0; guess < 7; guess += 1) {
    tries.push((await browser.post('/two-factor/disable', { password: `guess number ${guess}` })).status)
  }
  expect(tries).toEqual([400, 400, 400, 400, 400, 429, 429])
  await database().signInDelay.deleteMany({})
  expect((await browser.post('/two-factor/disable', { password })).status).toBe(200)
  expect((await eventsOf(userId)).at(-1)).toEqual(['second-factor-removed', undefined])
})

test('secret and recovery codes are not readable in the database', async () => {
  const { address, recovery } = await withSecondFactor()
  const kept = JSON.stringify(await database().twoFactor.findMany())
  expect(kept).not.toContain(new URL(address).searchParams.get('secret'))
  for (const code of recovery) expect(kept).not.toContain(code)
})
