import fs from 'node:fs'
import path from 'node:path'
import { afterAll, beforeAll } from 'vitest'
import { readKeyFile } from '@/app/(account)/_signing/key-file'
import { openSigningKey } from '@/app/(account)/_signing/signing-key'
import type { Role } from '@/lib/policy/role'
import { inRoot } from '@/lib/start/root.mjs'
import { seedDemo } from '@/prisma/seed/seed-demo'
import { memberAs } from './cast-actor'
import { useServer } from './server'

/** The server on a database of this test file with the demo in it, and the demo people's own signing keys. */
export function useDemo(): { url: () => string; keyOf: (role: Role) => Promise<CryptoKey> } {
  const { url } = useServer()
  const folder = inRoot('.data', 'test', `own-${crypto.randomUUID()}`)
  const secrets = path.join(folder, 'demo-people.json')
  beforeAll(async () => {
    await seedDemo(secrets)
  })
  afterAll(() => fs.rmSync(folder, { recursive: true, force: true }))
  const keyOf = async (role: Role) => {
    const { people } = JSON.parse(fs.readFileSync(secrets, 'utf8'))
    const { keyFile, passphrase } = people.find((one: { email: string }) => one.email === memberAs(role).email)
    return openSigningKey(readKeyFile(fs.readFileSync(keyFile, 'utf8')), passphrase)
  }
  return { url, keyOf }
}
