import { expect, test } from 'vitest'
import { peopleTable } from '@/lib/start/demo.mjs'
import { inRoot } from '@/lib/start/root.mjs'

test('the demo people are printed in columns, those without a signing key too', () => {
  const keyFile = inRoot('.secrets', 'a.key.json')
  const lines = peopleTable([
    { name: 'A. Preparer', role: 'engineer', email: 'a@example.org', password: 'p1', passphrase: 'to sign', keyFile },
    { name: 'B', email: 'b@example.org', password: 'p2' },
  ])
  expect(lines).toEqual([
    'name         role      sign-in        password  signing passphrase  signing key',
    'A. Preparer  engineer  a@example.org  p1        to sign             .secrets/a.key.json',
    'B                      b@example.org  p2',
  ])
})
