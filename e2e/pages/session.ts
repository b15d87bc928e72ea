import type { Browser, Page } from '@playwright/test'
import { person } from '../support/people'
import { expect } from '../support/test'

/** Signs a demo person in on a page and waits for their projects. */
export async function signIn(page: Page, name: string): Promise<void> {
  const { email, password } = person(name)
  await page.goto('/sign-in')
  await page.getByLabel('E-mail address').fill(email)
  await page.getByLabel('Password').fill(password)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await expect(page.getByRole('heading', { name: 'Projects', level: 1 })).toBeVisible()
}

/** A browser of their own for another person, as at another desk. */
export async function atAnotherDesk(browser: Browser, name: string): Promise<Page> {
  const context = await browser.newContext()
  const page = await context.newPage()
  await signIn(page, name)
  return page
}
