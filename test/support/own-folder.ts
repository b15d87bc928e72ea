import crypto from 'node:crypto'
import fs from 'node:fs'
import { onTestFinished } from 'vitest'
import { inRoot } from '@/lib/start/root.mjs'

/**
 * A folder for one test, gone afterwards. It lies inside the project and not among the system's temporary files, whose
 * folders are closed to the account that the embedded server runs as under root.
 */
export function ownFolder(): string {
  const folder = inRoot('.data', 'test', `own-${crypto.randomUUID()}`)
  fs.mkdirSync(folder, { recursive: true })
  onTestFinished(() => fs.rmSync(folder, { recursive: true, force: true }))
  return folder
}
