import { test as base, expect } from '@playwright/test'

/** Every test fails on an error in the console or an uncaught exception: that is the check of the content security policy too. */
export const test = base.extend<{ consoleErrors: string[] }>({
  consoleErrors: [
    async ({ context }, use) => {
      const errors: string[] = []
      context.on('console', (message) => {
        if (message.type() === 'error') errors.push(`${message.page()?.url() ?? ''}: ${message.text()}`)
      })
      context.on('weberror', (error) => errors.push(error.error().message))
      await use(errors)
      expect(errors, 'errors in the console').toEqual([])
    },
    { auto: true },
  ],
})

export { expect }
