import { expect, test } from 'vitest'
import { peopleTable } from '@/lib/start/demo.mjs'

test('the demo people are printed in columns, those without a signing key too', () => {
  const lines = peopleTable([
    { name: 'A. Preparer', role: 'engineer', email: 'a@example.org', password: 'p1', passphrase: 'four words to sign' },
    { name: 'B', email: 'b@example.org', password: 'p2' },
  ])
  expect(lines).toEqual([
    'name         role      sign-in        password  signing passphrase',
    'A. Preparer  engineer  a@example.org  p1        four words to sign',
    'B                      b@example.org  p2',
  ])
})
