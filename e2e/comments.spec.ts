import AxeBuilder from '@axe-core/playwright'
import type { Page } from '@playwright/test'
import { atAnotherDesk, signIn } from './pages/session'
import { computeCases, decide, freeze, openStudy } from './pages/study'
import { expect, test } from './support/test'

const problems = async (page: Page) => {
  const { violations } = await new AxeBuilder({ page }).analyze()
  return violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => target.join(' ')).join(', ')}`)
}

const comments = (page: Page) => page.getByRole('region', { name: /^Comments/ })
const connected = (page: Page) => expect(page.locator('[data-live="on"]')).toBeAttached()

test('a checker points at a number, the preparer sees it at once and answers, the checker closes it', async ({
  browser,
  page,
  consoleErrors,
}) => {
  test.setTimeout(240_000)
  await signIn(page, 'Lindqvar')
  const study = await openStudy(page)
  await computeCases(page, study)
  await page.goto(`${study}/review`)
  await freeze(page, 'For the review.')
  const revision = new URL(page.url()).pathname
  await decide(page, 'Send for check')
  await connected(page)

  const checker = await atAnotherDesk(browser, 'Obede')
  await checker.goto(revision)
  await connected(checker)
  await expect(page.getByRole('list', { name: 'Also looking' }).getByText('R. Obede')).toBeVisible()

  await test.step('inputs are ticked against their sources', async () => {
    const inputs = checker.getByRole('region', { name: 'Inputs and their sources', exact: true })
    await inputs.getByText('Motor M1').first().click()
    await inputs.getByLabel(/^Motor M1, rated power/).check()
    await checker.reload()
    await expect(inputs.getByText(/^1 of \d+ inputs ticked/)).toBeVisible()
    await connected(checker)
  })

  await test.step('a value is pointed at with the keyboard and commented on', async () => {
    const form = checker.getByRole('form', { name: 'New comment' })
    await form.getByRole('button', { name: 'Point at it' }).click()
    const value = checker.locator('[data-anchor*="/voltage/deepest"]').first()
    await value.focus()
    await checker.keyboard.press('Enter')
    await expect(form.getByLabel('About')).toContainText('Pointed at')
    await form.getByText('error', { exact: true }).click()
    await form.getByLabel('Comment').fill('The dip is given without its reference.')
    await form.getByRole('combobox', { name: /^For/ }).selectOption({ label: 'A. Lindqvar' })
    const started = Date.now()
    await form.getByRole('button', { name: 'Make comment' }).click()
    await expect(comments(page).getByText('The dip is given without its reference.')).toBeVisible()
    test.info().annotations.push({ type: 'reached the other browser', description: `${Date.now() - started} ms` })
    await expect(checker.locator('[data-comments="1"]').first()).toBeAttached()
    expect(await problems(checker)).toEqual([])
  })

  await test.step('the preparer finds it in the inbox and answers', async () => {
    await page.goto('/inbox')
    await expect(page.getByText(/R. Obede handed you/)).toBeVisible()
    expect(await problems(page)).toEqual([])
    await page.getByRole('link', { name: 'comment 1' }).click()
    await page.waitForURL(/\/revisions\//)
    await connected(page)
    await comments(page).getByRole('button', { name: 'Accept comment 1' }).click()
    await comments(page).getByLabel('What was done').fill('Of the voltage before the start; said in the table.')
    await comments(page).getByRole('button', { name: 'Accept comment' }).click()
    await expect(comments(checker).getByText('said in the table', { exact: false })).toBeVisible()
    await expect(comments(page).getByRole('button', { name: 'Close comment 1' })).toHaveCount(0)
  })

  await test.step('only its author closes it, and the page of the other follows', async () => {
    await comments(checker).getByRole('button', { name: 'Close comment 1' }).click()
    await comments(checker).getByRole('button', { name: 'Close comment', exact: true }).click()
    await expect(comments(page).getByText('R. Obede closed it')).toBeVisible()
  })

  await test.step('a decision of the one shows at the other without a reload', async () => {
    await decide(checker, 'Accept check')
    await expect(page.getByText('check accepted')).toBeVisible()
  })

  await test.step('a page that lost its connection catches up', async () => {
    await page.context().setOffline(true)
    const form = checker.getByRole('form', { name: 'New comment' })
    await form.getByLabel('Comment').fill('Made while the other was away.')
    await form.getByRole('button', { name: 'Make comment' }).click()
    await expect(comments(checker).getByText('Made while the other was away.')).toBeVisible()
    await page.context().setOffline(false)
    await expect(comments(page).getByText('Made while the other was away.')).toBeVisible({ timeout: 20_000 })
    // the browser itself reports the connection that the test took away
    for (const error of consoleErrors.splice(0)) expect(error).toContain('ERR_INTERNET_DISCONNECTED')
  })
  await checker.context().close()
  await decide(page, 'Take back to draft', { label: 'Reason', text: 'The walk ends here.' })
  await expect(page.getByText('taken back to draft')).toBeVisible()
})
