import AxeBuilder from '@axe-core/playwright'
import type { Page } from '@playwright/test'
import { codeOf } from '../test/server/support/authenticator'
import { atAnotherDesk, signIn } from './pages/session'
import { expect, test } from './support/test'

const password = 'several words of my own'

const problems = async (page: Page) => {
  const { violations } = await new AxeBuilder({ page }).analyze()
  return violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => target.join(' ')).join(', ')}`)
}

/** An administrator makes an invitation; the answer is its link. */
async function invite(page: Page, email: string): Promise<string> {
  await page.goto('/projects')
  await page.getByRole('link', { name: 'Members' }).first().click()
  await expect(page.getByRole('heading', { name: /^Members of/, level: 1 })).toBeVisible()
  await page.getByLabel('Name', { exact: true }).fill('N. Newcomer')
  await page.getByLabel('E-mail address').fill(email)
  await page.getByRole('group', { name: 'Roles in the project' }).getByLabel('engineer, prepares').check()
  await page.getByRole('button', { name: 'Make invitation link' }).click()
  return page.getByLabel('Link of the invitation').inputValue()
}

test('somebody joins by an invitation, sets a second factor and signs in with it', async ({ page, browser }) => {
  const email = 'n.newcomer@harrowgate-quill.example'
  await signIn(page, 'Quarrie')
  const link = await invite(page, email)
  expect(await problems(page)).toEqual([])

  const desk = await (await browser.newContext()).newPage()
  await desk.goto(new URL(link).pathname)
  await expect(desk.getByRole('heading', { name: /^Invitation to/, level: 1 })).toBeVisible()
  expect(await problems(desk)).toEqual([])
  await desk.getByLabel('Password', { exact: true }).fill(password)
  await desk.getByLabel('Password again').fill(password)
  await desk.getByRole('button', { name: 'Join project' }).click()
  await expect(desk.getByRole('heading', { name: 'Projects', level: 1 })).toBeVisible()

  await desk.goto('/profile')
  const factor = desk.getByRole('region', { name: 'Second factor' })
  await factor.getByRole('button', { name: 'Set second factor' }).click()
  await factor.getByLabel('Your password').fill(password)
  await factor.getByRole('button', { name: 'Set second factor' }).click()
  const address = (await factor.getByRole('link', { name: 'open the app on this device' }).getAttribute('href')) ?? ''
  await factor.getByLabel('Code that the app shows now').fill(codeOf(address))
  await factor.getByRole('button', { name: 'Confirm code' }).click()
  await expect(factor.getByRole('list', { name: 'Recovery codes' }).getByRole('listitem')).toHaveCount(10)
  await expect(factor.getByText('asks for a code of your authenticator app')).toBeVisible()
  expect(await problems(desk)).toEqual([])

  const other = await (await browser.newContext()).newPage()
  await other.goto('/sign-in')
  await other.getByLabel('E-mail address').fill(email)
  await other.getByLabel('Password').fill(password)
  await other.getByRole('button', { name: 'Sign in' }).click()
  await other.getByLabel('Code of the authenticator app').fill(codeOf(address, 1))
  expect(await problems(other)).toEqual([])
  await other.getByRole('button', { name: 'Sign in' }).click()
  await expect(other.getByRole('heading', { name: 'Projects', level: 1 })).toBeVisible()

  await desk.reload()
  const sessions = desk.getByRole('region', { name: 'Where you are signed in' })
  await expect(sessions.getByRole('row')).toHaveCount(3)
  await sessions.getByRole('button', { name: 'End all other sessions' }).click()
  await expect(sessions.getByRole('row')).toHaveCount(2)
  await other.goto('/projects')
  await other.waitForURL(/\/sign-in/)

  await page.reload()
  await expect(page.getByRole('rowheader', { name: 'N. Newcomer' })).toBeVisible()
})

test('a used or mistyped invitation is one page that says what to do', async ({ page, consoleErrors }) => {
  const answer = await page.goto(`/join/${'x'.repeat(43)}`)
  expect(answer?.status()).toBe(404)
  await expect(page.getByRole('heading', { name: 'This invitation leads nowhere', level: 1 })).toBeVisible()
  expect((await page.goto(`/share/${'x'.repeat(43)}`))?.status()).toBe(404)
  await expect(page.getByRole('heading', { name: 'This link leads nowhere', level: 1 })).toBeVisible()
  consoleErrors.length = 0
})

test('whoever forgot the password asks for a link and is told the same whatever the address', async ({ page }) => {
  await page.goto('/sign-in')
  await page.getByRole('link', { name: 'Forgot the password' }).click()
  await expect(page.getByRole('heading', { name: 'Choose a new password', level: 1 })).toBeVisible()
  await page.getByLabel('E-mail address').fill('nobody@elsewhere.example')
  expect(await problems(page)).toEqual([])
  await page.getByRole('button', { name: 'Send link' }).click()
  await expect(page.getByText('If there is an account for this address')).toBeVisible()
})

test('an engineer sees the members and changes none', async ({ browser }) => {
  const page = await atAnotherDesk(browser, 'Lindqvar')
  await page.getByRole('link', { name: 'Members' }).first().click()
  await expect(page.getByRole('rowheader', { name: 'R. Obede' })).toBeVisible()
  await expect(page.getByRole('button', { name: 'Change part' })).toHaveCount(0)
  await expect(page.getByRole('heading', { name: 'Invite somebody' })).toHaveCount(0)
})
