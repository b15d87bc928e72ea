import path from 'node:path'
import { defineConfig } from 'vitest/config'

const root = path.resolve(import.meta.dirname, '..')

export default defineConfig({
  root,
  resolve: { alias: { '@': root, 'server-only': path.join(root, 'lib/start/empty.ts') } },
  test: {
    include: ['test/**/*.test.ts', 'test/**/*.test.tsx'],
    testTimeout: 60_000,
    hookTimeout: 120_000,
    pool: 'threads',
    globalSetup: [path.join(root, 'test/support/stop-cluster.ts')],
  },
})
