import fs from 'node:fs'
import path from 'node:path'
import { expect, test } from 'vitest'
import { ensureSecrets } from '@/lib/start/secrets.mjs'
import { ownFolder } from '../support/own-folder'

const given = 'a-secret-of-at-least-thirty-two-characters'

test('the first start makes secrets that only their owner can read', () => {
  const folder = path.join(ownFolder(), 'secrets')
  const secrets = ensureSecrets(folder, {})
  expect(secrets.BETTER_AUTH_SECRET).toHaveLength(43)
  expect(secrets.CA_WRAP_SECRET).not.toBe(secrets.BETTER_AUTH_SECRET)
  expect(fs.statSync(folder).mode & 0o777).toBe(0o700)
  expect(fs.statSync(path.join(folder, 'application.json')).mode & 0o777).toBe(0o600)
})

test('later starts find the same secrets', () => {
  const folder = path.join(ownFolder(), 'secrets')
  expect(ensureSecrets(folder, {})).toEqual(ensureSecrets(folder, {}))
})

test('what the environment gives wins and is not written down', () => {
  const folder = path.join(ownFolder(), 'secrets')
  expect(ensureSecrets(folder, { BETTER_AUTH_SECRET: given }).BETTER_AUTH_SECRET).toBe(given)
  expect(fs.readFileSync(path.join(folder, 'application.json'), 'utf8')).not.toContain(given)
})

test('with all secrets in the environment no file is made', () => {
  const folder = path.join(ownFolder(), 'secrets')
  ensureSecrets(folder, { BETTER_AUTH_SECRET: given, CA_WRAP_SECRET: given })
  expect(fs.existsSync(folder)).toBe(false)
})

test('a short secret is refused', () => {
  expect(() => ensureSecrets(ownFolder(), { CA_WRAP_SECRET: 'short' })).toThrow('CA_WRAP_SECRET is too short')
})

test('a secrets file that others can read is refused with the remedy', () => {
  const folder = ownFolder()
  ensureSecrets(folder, {})
  const file = path.join(folder, 'application.json')
  fs.chmodSync(file, 0o644)
  expect(() => ensureSecrets(folder, {})).toThrow(`run "chmod 600 ${file}"`)
})

test('a damaged secrets file is never replaced by new secrets', () => {
  const folder = ownFolder()
  const file = path.join(folder, 'application.json')
  fs.writeFileSync(file, '{"BETTER_AUTH_SECRET": "cut o', { mode: 0o600 })
  expect(() => ensureSecrets(folder, {})).toThrow('restore the file from a backup')
  expect(fs.readFileSync(file, 'utf8')).toBe('{"BETTER_AUTH_SECRET": "cut o')
})
