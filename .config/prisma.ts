import path from 'node:path'
import { defineConfig } from 'prisma/config'

const root = path.resolve(import.meta.dirname, '..')

// The command line looks for its native engine before each command; the stand-in answers in its place.
process.env.PRISMA_SCHEMA_ENGINE_BINARY ??= path.join(root, 'lib/start/migrate/prisma-schema-engine.mjs')

export default defineConfig({
  schema: path.join(root, 'prisma/schema'),
  migrations: { path: path.join(root, 'prisma/migrations') },
  datasource: { url: process.env.DATABASE_URL ?? 'postgresql://localhost/breakaway' },
})
