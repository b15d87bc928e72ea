import { expect, test } from 'vitest'
import { nextSignature, nextState, type RevisionState, revisionMoves, revisionStates } from '@/lib/study/states'

test('a revision goes from draft to issued by way of check and review', () => {
  let state: RevisionState = 'draft'
  const seen: RevisionState[] = []
  for (const move of ['send-for-check', 'accept-check', 'accept-review', 'close-review', 'issue'] as const) {
    const next = nextState(state, move)
    if (next === null) throw new Error(`${move} does not exist in ${state}`)
    state = next
    seen.push(state)
  }
  expect(seen).toEqual(['in-check', 'in-review', 'in-review', 'review-closed', 'issued'])
})

test('nothing leads back from issued, superseded or withdrawn to a state in work', () => {
  const after = (['issued', 'superseded', 'withdrawn'] as const).flatMap((state) =>
    revisionMoves.flatMap((move) => nextState(state, move) ?? []),
  )
  expect([...new Set(after)].sort()).toEqual(['superseded', 'withdrawn'])
})

test('every state but the first can be reached', () => {
  const reached = new Set(
    revisionMoves.flatMap((move) => revisionStates.flatMap((state) => nextState(state, move) ?? [])),
  )
  expect(revisionStates.filter((state) => !reached.has(state))).toEqual([])
})

test('signatures are due in the order prepared, checked, approved', () => {
  expect(nextSignature([])).toBe('prepared')
  expect(nextSignature(['prepared'])).toBe('checked')
  expect(nextSignature(['prepared', 'checked'])).toBe('approved')
  expect(nextSignature(['prepared', 'checked', 'approved'])).toBeNull()
})
