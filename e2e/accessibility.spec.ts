import AxeBuilder from '@axe-core/playwright'
import type { Page } from '@playwright/test'
import { signIn } from './pages/session'
import { openStudy } from './pages/study'
import { expect, test } from './support/test'

const problems = async (page: Page) => {
  const { violations } = await new AxeBuilder({ page }).analyze()
  return violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => target.join(' ')).join(', ')}`)
}

test('pages without an account have no accessibility violation', async ({ page }) => {
  for (const address of ['/sign-in', '/verify']) {
    await page.goto(address)
    await expect(page.getByRole('heading', { level: 1 })).toBeVisible()
    expect(await problems(page), address).toEqual([])
  }
})

/** Every page of the work, from the records to the issue. */
async function addressesOf(page: Page): Promise<string[]> {
  const study = await openStudy(page)
  await page.goto('/projects')
  await page.getByRole('link', { name: 'Open plant records' }).first().click()
  await page.waitForURL(/\/plant\//)
  const plant = new URL(page.url()).pathname.replace(/\/[^/]+$/, '')
  const parts = ['cases', 'cases/limits', 'cases/schedules', 'cases/settings', 'results', 'review', 'issue']
  return [
    '/projects',
    '/profile',
    '/inbox',
    plant.replace(/plant$/, 'members'),
    plant.replace(/plant$/, 'timeline'),
    ...['bus', 'supply', 'motor', 'driven-load'].map((kind) => `${plant}/${kind}`),
    ...parts.map((part) => `${study}/${part}`),
  ]
}

test('the pages of the work have no accessibility violation', async ({ page }) => {
  test.setTimeout(360_000)
  await signIn(page, 'Lindqvar')
  for (const address of await addressesOf(page)) {
    await page.goto(address)
    await expect(page.getByRole('heading', { level: 1 }).first()).toBeVisible()
    expect(await problems(page), address).toEqual([])
  }
})

test('the pages of the work fit a narrow screen', async ({ page }) => {
  await signIn(page, 'Lindqvar')
  const addresses = await addressesOf(page)
  await page.setViewportSize({ width: 390, height: 800 })
  for (const address of addresses) {
    await page.goto(address)
    await expect(page.getByRole('heading', { level: 1 }).first()).toBeVisible()
    const wider = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)
    expect(wider, address).toBeLessThanOrEqual(1)
  }
})
