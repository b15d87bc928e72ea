import type { Page } from '@playwright/test'
import { atAnotherDesk, signIn } from './pages/session'
import { expect, test } from './support/test'

const buses = async (page: Page): Promise<void> => {
  await page.goto('/projects')
  await page.getByRole('link', { name: 'Open plant records' }).first().click()
  await page.waitForURL(/\/plant\//)
}

test('a value is kept as typed and shown as understood; nonsense is refused beside its field', async ({ page }) => {
  await signIn(page, 'Lindqvar')
  await buses(page)
  await page.getByRole('button', { name: 'Add bus' }).first().click()
  await page.getByLabel('Tag', { exact: true }).fill('TEST BUS')
  const voltage = page.getByLabel(/Nominal/).first()
  for (const [typed, sentence] of [
    ['eleven kV', /number|voltage|read/i],
    ['-11 kV', /negative|above|greater|positive/i],
    ['11', /unit/i],
    ['11 kg', /unit|voltage/i],
  ] as const) {
    await voltage.fill(typed)
    await voltage.blur()
    await expect(page.getByText(sentence).first()).toBeVisible()
    await expect(voltage).toHaveValue(typed)
  }
  await voltage.fill('11 kV')
  await page.locator('form').getByRole('button', { name: 'Add bus' }).click()
  await expect(page.getByRole('row', { name: /TEST BUS/ })).toBeVisible()
})

test('what was typed survives a reload', async ({ page }) => {
  await signIn(page, 'Lindqvar')
  await buses(page)
  await page.getByRole('button', { name: 'Add bus' }).first().click()
  await page.getByLabel('Tag', { exact: true }).fill('HALF TYPED')
  await page.reload()
  await expect(page.getByLabel('Tag', { exact: true })).toHaveValue('HALF TYPED')
})

test('a stale save names whose change it met and keeps both texts', async ({ browser, page }) => {
  await signIn(page, 'Lindqvar')
  await buses(page)
  const other = await atAnotherDesk(browser, 'Lindqvar')
  await buses(other)
  for (const desk of [page, other])
    await desk
      .getByRole('cell', { name: 'S33', exact: true })
      .or(desk.getByRole('rowheader', { name: 'S33', exact: true }))
      .getByText('S33')
      .click()
  await page.getByLabel('Name').fill('Station, first desk')
  await page.locator('form').getByRole('button', { name: /^Save/ }).click()
  await expect(page.getByText('Station, first desk').first()).toBeVisible()
  await other.getByLabel('Name').fill('Station, second desk')
  await other.locator('form').getByRole('button', { name: /^Save/ }).click()
  await expect(other.getByText(/A\. Lindqvar/).first()).toBeVisible()
  await expect(other.getByText('Station, first desk').first()).toBeVisible()
  await expect(other.getByLabel('Name').first()).toHaveValue('Station, second desk')
})

test('a session that ended while typing is said, and the text is there after signing in again', async ({
  page,
  consoleErrors,
}) => {
  await signIn(page, 'Lindqvar')
  await buses(page)
  const address = page.url()
  await page.getByRole('button', { name: 'Add bus' }).first().click()
  await page.getByLabel('Tag', { exact: true }).fill('LATE BUS')
  await page
    .getByLabel(/Nominal/)
    .first()
    .fill('6.6 kV')
  await page.context().clearCookies()
  await page.locator('form').getByRole('button', { name: 'Add bus' }).click()
  await expect(page.getByText(/session has ended/).first()).toBeVisible()
  await signIn(page, 'Lindqvar')
  await page.goto(address)
  await page.getByRole('button', { name: 'Add bus' }).first().click()
  await expect(page.getByLabel('Tag', { exact: true })).toHaveValue('LATE BUS')
  await page.locator('form').getByRole('button', { name: 'Add bus' }).click()
  await expect(page.getByRole('row', { name: /LATE BUS/ })).toBeVisible()
  consoleErrors.length = 0
})
