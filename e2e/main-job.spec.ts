import fs from 'node:fs'
import AxeBuilder from '@axe-core/playwright'
import type { Page } from '@playwright/test'
import { atAnotherDesk, signIn } from './pages/session'
import { computeCases, decide, freeze, openStudy, sign, waiveAll } from './pages/study'
import { person } from './support/people'
import { expect, test } from './support/test'

const verdictOf = async (page: Page, name: string, bytes: Buffer): Promise<void> => {
  await page.goto('/verify')
  await page
    .getByLabel('Drop the PDF here, or choose it')
    .setInputFiles({ name, mimeType: 'application/pdf', buffer: bytes })
}

const heading = (page: Page, words: string) => page.getByRole('heading', { name: words, level: 2 })

test('an engineer computes, three people sign, the client downloads and anyone verifies', async ({ browser, page }) => {
  test.setTimeout(420_000)
  await signIn(page, 'Lindqvar')
  const study = await openStudy(page)
  let revision = ''

  await test.step('the cases are computed and the governing limit is named', async () => {
    await computeCases(page, study)
    await expect(page.getByText(/R1\b.*PCC/).first()).toBeVisible()
    await expect(page.getByText(/3\.48/).first()).toBeVisible()
  })

  await test.step('the preparer freezes a revision and sends it for check', async () => {
    await page.goto(`${study}/review`)
    await freeze(page, 'First issue.')
    revision = new URL(page.url()).pathname
    await decide(page, 'Send for check')
    await expect(page.getByRole('button', { name: 'Accept check' })).toHaveCount(0)
  })

  const checker = await atAnotherDesk(browser, 'Obede')
  const approver = await atAnotherDesk(browser, 'Tharow')

  await test.step('the checker accepts, the approver accepts and closes the review', async () => {
    await checker.goto(revision)
    await decide(checker, 'Accept check', { label: 'Note', text: 'Inputs ticked against letter OR-1147.' })
    await approver.goto(revision)
    await decide(approver, 'Accept review')
    await waiveAll(approver)
    await decide(approver, 'Close review', { label: 'Purpose of issue', text: 'For approval by the utility' })
    await expect(approver.getByText('The report is being rendered')).toBeVisible()
    await expect(approver.getByText('The report is being rendered')).toBeHidden({ timeout: 90_000 })
    await expect(approver.getByRole('link', { name: 'Download report' })).toBeVisible()
  })

  await test.step('a wrong passphrase is refused in one sentence and nothing is signed', async () => {
    await page.goto(revision)
    await page.getByRole('button', { name: 'Sign as preparer' }).click()
    await page.getByLabel('Key file').setInputFiles(person('Lindqvar').keyFile ?? '')
    await page.getByLabel('Passphrase of your signing key').fill('not this one')
    await page.getByRole('button', { name: 'Sign as preparer' }).click()
    await expect(page.getByText(/passphrase/i).last()).toBeVisible()
    await page.reload()
    await expect(page.getByRole('button', { name: 'Sign as preparer' })).toBeVisible()
  })

  await test.step('prepared, checked and approved sign the same bytes, each with their own key', async () => {
    await page.getByRole('button', { name: 'Sign as preparer' }).click()
    await page.getByLabel('Passphrase of your signing key').fill(person('Lindqvar').passphrase ?? '')
    await page.getByRole('button', { name: 'Sign as preparer' }).click()
    await expect(page.getByText('Signed. The signature stands in the report.')).toBeVisible({ timeout: 30_000 })
    await checker.goto(revision)
    await sign(checker, 'Obede', 'Sign as checker')
    await approver.goto(revision)
    await sign(approver, 'Tharow', 'Sign as approver')
    await approver.goto(revision)
    await decide(approver, 'Issue revision')
  })

  const client = await atAnotherDesk(browser, 'Wennick')
  const signed = await test.step('the client sees the issued report and downloads it', async () => {
    await openReport(client)
    const download = client.waitForEvent('download')
    await client.getByRole('link', { name: 'Download report' }).click()
    return fs.readFileSync(await (await download).path())
  })

  await test.step('a link hands the same file to somebody without an account, once, by a passphrase', async () => {
    await approver.goto(`${study}/issue`)
    await approver.getByLabel('Recipient').fill('R. Ondry, records office')
    await approver.getByLabel('Most downloads').fill('1')
    await approver.getByRole('textbox', { name: /^Passphrase/ }).fill('three blue herons')
    await approver.getByRole('button', { name: 'Share with client' }).click()
    const link = new URL(await approver.getByLabel('Link to the report').inputValue()).pathname
    const visitor = await (await browser.newContext()).newPage()
    await visitor.goto(link)
    expect((await new AxeBuilder({ page: visitor }).analyze()).violations.map(({ id }) => id)).toEqual([])
    await visitor.getByLabel('Passphrase').fill('three red herons')
    await visitor.getByRole('button', { name: 'Download report' }).click()
    await expect(visitor.getByText(/passphrase does not fit/)).toBeVisible()
    await visitor.getByLabel('Passphrase').fill('three blue herons')
    const download = visitor.waitForEvent('download')
    await visitor.getByRole('button', { name: 'Download report' }).click()
    expect(fs.readFileSync(await (await download).path()).equals(signed)).toBe(true)
    await visitor.goto(link)
    await expect(visitor.getByRole('button', { name: 'Download report' })).toHaveCount(0)
    await approver.reload()
    await expect(approver.getByRole('cell', { name: '1 of 1' })).toBeVisible()
    await visitor.context().close()
  })

  await test.step('anyone verifies it without an account, and recomputes it in the browser', async () => {
    const context = await browser.newContext()
    const visitor = await context.newPage()
    await verdictOf(visitor, 'report.pdf', signed)
    await expect(heading(visitor, 'Valid')).toBeVisible({ timeout: 30_000 })
    for (const name of ['A. Lindqvar', 'R. Obede', 'S. Tharow'])
      await expect(visitor.getByText(name).first()).toBeVisible()
    await visitor.getByRole('button', { name: /Recompute/ }).click()
    await expect(visitor.getByText(/agree|same/i).first()).toBeVisible({ timeout: 60_000 })

    const flipped = Buffer.from(signed)
    const at = Math.floor(flipped.length / 3)
    flipped.writeUInt8(flipped.readUInt8(at) ^ 1, at)
    await verdictOf(visitor, 'flipped.pdf', flipped)
    await expect(heading(visitor, 'Changed')).toBeVisible({ timeout: 30_000 })

    await verdictOf(visitor, 'longer.pdf', Buffer.concat([signed, Buffer.from('\n% one more line\n')]))
    await expect(heading(visitor, 'Changed')).toBeVisible({ timeout: 30_000 })
    await context.close()
  })
})

async function openReport(page: Page): Promise<void> {
  await page.goto('/projects')
  await page.getByRole('link', { name: /Motor-starting study/ }).click()
  await page.waitForURL(/\/reports\//)
}
