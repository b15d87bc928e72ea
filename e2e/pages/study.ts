import type { Page } from '@playwright/test'
import { person } from '../support/people'
import { expect } from '../support/test'

const title = 'Motor-starting study: pump motors M1 to M4 on the 33 kV rural line'

/** Opens the demo study from the list of projects and returns its address without the last part. */
export async function openStudy(page: Page): Promise<string> {
  await page.goto('/projects')
  await page.getByRole('link', { name: title }).click()
  await page.waitForURL(/\/studies\/[^/]+\//)
  const address = new URL(page.url()).pathname.match(/^\/studies\/[^/]+/)?.[0]
  if (!address) throw new Error(`No study at ${page.url()}.`)
  return address
}

/** Computes the cases and waits until results belong to the records as they stand. */
export async function computeCases(page: Page, study: string): Promise<void> {
  await page.goto(`${study}/results`)
  await page.getByRole('button', { name: 'Compute cases' }).click()
  await expect(page.getByText('Results belong to the records as they stand.')).toBeVisible({ timeout: 90_000 })
}

/** Takes a decision: opens its dialog, types the text that goes with it, confirms. */
export async function decide(page: Page, verb: string, field?: { label: string; text: string }): Promise<void> {
  await page.getByRole('button', { name: verb }).click()
  const dialog = page.getByRole('alertdialog').or(page.getByRole('dialog'))
  if (field) await dialog.getByLabel(field.label).fill(field.text)
  await dialog.getByRole('button', { name: verb }).click()
  await expect(dialog).toBeHidden()
}

/** Freezes a revision on the page of the review and opens it: the newest stands first, once the list has it. */
export async function freeze(page: Page, note: string): Promise<void> {
  const rows = page.getByRole('row')
  const before = await rows.count()
  await decide(page, 'Freeze revision', { label: 'What this revision is about', text: note })
  await expect(rows).toHaveCount(before === 0 ? 2 : before + 1)
  await rows.nth(1).getByRole('link').click()
  await page.waitForURL(/\/revisions\//)
}

/** Waives whatever holds up the closing of the review, each with a reason. */
export async function waiveAll(page: Page): Promise<void> {
  const holdUps = page.getByRole('region', { name: 'Before the review is closed' })
  await expect(holdUps).toBeVisible()
  for (;;) {
    const left = await holdUps.getByRole('button', { name: 'Waive' }).count()
    if (left === 0) return
    await holdUps.getByRole('button', { name: 'Waive' }).first().click()
    const dialog = page.getByRole('alertdialog')
    await dialog.getByLabel('Reason').fill('Known, and agreed with the utility.')
    await dialog.getByRole('button', { name: 'Waive' }).click()
    await expect(dialog).toBeHidden()
    await expect(holdUps.getByRole('button', { name: 'Waive' })).toHaveCount(left - 1)
  }
}

/** Signs with the person's key file and passphrase, in this browser. */
export async function sign(page: Page, name: string, label: string): Promise<void> {
  const { passphrase, keyFile } = person(name)
  if (!passphrase || !keyFile) throw new Error(`${name} has no signing key.`)
  await page.getByRole('button', { name: label }).click()
  await page.getByLabel('Key file').setInputFiles(keyFile)
  await page.getByLabel('Passphrase of your signing key').fill(passphrase)
  await page.getByRole('button', { name: label }).click()
  await expect(page.getByText('Signed. The signature stands in the report.')).toBeVisible({ timeout: 30_000 })
}
