import path from 'node:path'
import { defineConfig } from '@playwright/test'

const root = path.resolve(import.meta.dirname, '..')
const port = Number(process.env.E2E_PORT ?? 4310)

/** The application is served by the same launcher as for people, on a database of its own that is thrown away afterwards. */
export default defineConfig({
  testDir: import.meta.dirname,
  outputDir: path.join(root, '.data/test/browser'),
  fullyParallel: false,
  workers: 1,
  timeout: 120_000,
  expect: { timeout: 15_000 },
  forbidOnly: true,
  reporter: [['list']],
  use: {
    baseURL: `http://127.0.0.1:${port}`,
    viewport: { width: 1280, height: 720 },
    actionTimeout: 20_000,
    navigationTimeout: 30_000,
    acceptDownloads: true,
    trace: 'off',
    screenshot: 'only-on-failure',
    launchOptions: {
      executablePath: process.env.CHROMIUM,
      args: [
        '--no-sandbox',
        '--disable-gpu',
        '--disable-quic',
        '--no-first-run',
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
      ],
    },
  },
  webServer: {
    command: 'node lib/start/serve-for-tests.mjs',
    cwd: root,
    url: `http://127.0.0.1:${port}/api/health`,
    timeout: 300_000,
    gracefulShutdown: { signal: 'SIGTERM', timeout: 15_000 },
    env: { PORT: String(port), DEMO_SECRETS_FILE: path.join(root, '.data/test/people.json') },
    stdout: 'ignore',
    stderr: 'pipe',
  },
})
