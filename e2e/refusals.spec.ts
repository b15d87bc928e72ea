import { signIn } from './pages/session'
import { expect, test } from './support/test'

test('a wrong password is refused without saying which part is wrong', async ({ page, consoleErrors }) => {
  await page.goto('/sign-in')
  await page.getByLabel('E-mail address').fill('a.lindqvar@harrowgate-quill.example')
  await page.getByLabel('Password').fill('certainly-not-it')
  await page.getByRole('button', { name: 'Sign in' }).click()
  await expect(page.getByText('Address and password do not belong together')).toBeVisible()
  // the browser itself notes the refused answer; nothing else may stand there
  expect(consoleErrors.filter((text) => !text.includes('401'))).toEqual([])
  consoleErrors.length = 0
})

test('without signing in every page of the work leads to the sign-in page', async ({ page }) => {
  for (const address of ['/projects', '/profile']) {
    await page.goto(address)
    await page.waitForURL(/\/sign-in/)
  }
})

test('a study that is not there is answered with one sentence', async ({ page, consoleErrors }) => {
  await signIn(page, 'Lindqvar')
  const answer = await page.goto('/studies/00000000-0000-4000-8000-000000000000/cases')
  expect(answer?.status()).toBe(404)
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible()
  consoleErrors.length = 0
})

test('an upload of 100 MB is refused while it comes in', async ({ page, request }) => {
  await page.goto('/verify')
  const answer = await request.post('/verify/check', {
    headers: { 'content-type': 'application/pdf', origin: new URL(page.url()).origin },
    data: Buffer.alloc(100 * 1024 * 1024),
    failOnStatusCode: false,
  })
  expect(answer.status()).toBe(413)
})

test('a file that is no report is told so', async ({ page }) => {
  await page.goto('/verify')
  await page
    .getByLabel('Drop the PDF here, or choose it')
    .setInputFiles({ name: 'letter.pdf', mimeType: 'application/pdf', buffer: Buffer.from('This is not a PDF.') })
  await expect(page.getByRole('heading', { name: 'Cannot be read', level: 2 })).toBeVisible({ timeout: 20_000 })
})

test('pages carry the headers that keep foreign script out', async ({ request }) => {
  const answer = await request.get('/sign-in')
  const policy = answer.headers()['content-security-policy'] ?? ''
  const scripts = policy.split(';').find((part) => part.trim().startsWith('script-src')) ?? ''
  expect(scripts).toContain("'nonce-")
  expect(scripts).not.toContain("'unsafe-inline'")
  expect(policy).toContain("frame-ancestors 'none'")
  expect(answer.headers()['x-content-type-options']).toBe('nosniff')
})
