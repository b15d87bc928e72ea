import { expect, test } from 'vitest'
import { satisfies } from '@/lib/start/packages.mjs'

const wanted = {
  packages: {
    '': {},
    'node_modules/next': { version: '16.4.6' },
    'node_modules/other-platform': { version: '1.0.0', optional: true },
  },
}

test('an installation with the versions of the lock file is kept, without the packages of other platforms', () => {
  expect(satisfies(wanted, { packages: { 'node_modules/next': { version: '16.4.6' } } })).toBe(true)
})

test('another version asks for an installation', () => {
  expect(satisfies(wanted, { packages: { 'node_modules/next': { version: '16.4.5' } } })).toBe(false)
})

test('a missing package asks for an installation', () => {
  expect(satisfies(wanted, { packages: {} })).toBe(false)
})

test('an optional package of another version asks for an installation', () => {
  const installed = { 'node_modules/next': { version: '16.4.6' }, 'node_modules/other-platform': { version: '0.9.0' } }
  expect(satisfies(wanted, { packages: installed })).toBe(false)
})
