import { expect, test } from 'vitest'
import { liveActions } from '@/lib/policy/action'
import { can } from '@/lib/policy/can'
import { roles } from '@/lib/policy/role'

test('each role may do to live records exactly what the table says', () => {
  const table = Object.fromEntries(
    liveActions.map((action) => [
      action,
      roles.filter((role) => can({ userId: 'u', roles: [role] }, action).allowed).join(' '),
    ]),
  )
  expect(table).toEqual({
    'create-project': 'engineer administrator',
    'manage-members': 'administrator',
    'manage-certificates': 'administrator',
    'read-plant': 'engineer checker approver administrator',
    'edit-plant': 'engineer',
    'read-study': 'engineer checker approver administrator',
    'edit-study': 'engineer',
    compute: 'engineer checker approver',
    freeze: 'engineer',
  })
})

test('somebody without a role may do nothing', () => {
  expect(liveActions.filter((action) => can({ userId: 'u', roles: [] }, action).allowed)).toEqual([])
})
