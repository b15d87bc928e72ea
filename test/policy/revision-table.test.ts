import { expect, test } from 'vitest'
import { type RevisionAction, revisionActions } from '@/lib/policy/action'
import { can } from '@/lib/policy/can'
import type { PolicyActor } from '@/lib/policy/role'
import type { RevisionSubject } from '@/lib/policy/subject'

/** One letter a person; capital letters are the people of this revision, small ones others with the same role. */
const people: Record<string, PolicyActor> = {
  P: { userId: 'preparer', roles: ['engineer'] },
  e: { userId: 'other-engineer', roles: ['engineer'] },
  C: { userId: 'checker', roles: ['checker'] },
  c: { userId: 'other-checker', roles: ['checker'] },
  A: { userId: 'approver', roles: ['approver'] },
  a: { userId: 'other-approver', roles: ['approver'] },
  m: { userId: 'commenter', roles: ['commenter'] },
  l: { userId: 'client', roles: ['client'] },
  s: { userId: 'administrator', roles: ['administrator'] },
  // Everything at once, to show that no role lifts the rule of the second pair of eyes.
  X: { userId: 'preparer', roles: ['engineer', 'checker', 'approver', 'administrator'] },
}

const fresh: RevisionSubject = {
  state: 'draft',
  preparedBy: 'preparer',
  checkedBy: null,
  reviewAccepted: false,
  signed: [],
  approvedBy: null,
}
const checked: RevisionSubject = { ...fresh, state: 'in-review', checkedBy: 'checker' }
const closed: RevisionSubject = { ...checked, state: 'review-closed', reviewAccepted: true }
const allSigned: RevisionSubject = { ...closed, signed: ['prepared', 'checked', 'approved'], approvedBy: 'approver' }

const moments: Record<string, RevisionSubject> = {
  draft: fresh,
  'in check': { ...fresh, state: 'in-check' },
  'in review': checked,
  accepted: { ...checked, reviewAccepted: true },
  'round 0': closed,
  'round 1': { ...closed, signed: ['prepared'] },
  'round 2': { ...closed, signed: ['prepared', 'checked'] },
  'round 3': allSigned,
  issued: { ...allSigned, state: 'issued' },
  superseded: { ...allSigned, state: 'superseded' },
  withdrawn: { ...allSigned, state: 'withdrawn' },
}

const who = (action: RevisionAction, subject: RevisionSubject) =>
  Object.entries(people)
    .filter(([, actor]) => can(actor, action, subject).allowed)
    .map(([letter]) => letter)
    .join('') || '-'

const row = (cells: readonly string[]) =>
  cells
    .map((cell, i) => cell.padEnd(i === 0 ? 16 : 11))
    .join('')
    .trimEnd()

test('each person may do at each moment of a revision exactly what the table says', () => {
  const table = [
    row(['', ...Object.keys(moments)]),
    ...revisionActions.map((action) => row([action, ...Object.values(moments).map((moment) => who(action, moment))])),
  ].join('\n')
  expect(`\n${table}\n`).toBe(`
                draft      in check   in review  accepted   round 0    round 1    round 2    round 3    issued     superseded withdrawn
read-revision   PeCcAasX   PeCcAasX   PeCcAamsX  PeCcAamsX  PeCcAamsX  PeCcAamsX  PeCcAamsX  PeCcAamsX  PeCcAamlsX PeCcAamlsX PeCcAamlsX
read-comments   PeCcAasX   PeCcAasX   PeCcAamsX  PeCcAamsX  PeCcAamsX  PeCcAamsX  PeCcAamsX  PeCcAamsX  PeCcAamsX  PeCcAamsX  PeCcAamsX
comment         -          PeCcX      PeCcAamX   PeCcAamX   -          -          -          -          -          -          -
respond-comment PeCcAaX    PeCcAaX    PeCcAaX    PeCcAaX    -          -          -          -          -          -          -
close-comment   PeCcAasX   PeCcAasX   PeCcAamsX  PeCcAamsX  -          -          -          -          -          -          -
tick-input      -          Cc         -          -          -          -          -          -          -          -          -
waive           -          -          Aa         Aa         -          -          -          -          -          -          -
send-for-check  PX         -          -          -          -          -          -          -          -          -          -
accept-check    -          Cc         -          -          -          -          -          -          -          -          -
reject-check    -          Cc         -          -          -          -          -          -          -          -          -
accept-review   -          -          Aa         Aa         -          -          -          -          -          -          -
reject-review   -          -          Aa         Aa         -          -          -          -          -          -          -
close-review    -          -          -          Aa         -          -          -          -          -          -          -
back-to-draft   -          PCcAaX     PCcAaX     PCcAaX     PCcAaX     PCcAaX     PCcAaX     -          -          -          -
sign-prepared   -          -          -          -          PX         -          -          -          -          -          -
sign-checked    -          -          -          -          -          C          -          -          -          -          -
sign-approved   -          -          -          -          -          -          Aa         -          -          -          -
issue           -          -          -          -          -          -          -          A          -          -          -
withdraw        -          -          -          -          -          -          -          AasX       AasX       -          -
download-report PeCcAasX   PeCcAasX   PeCcAamsX  PeCcAamsX  PeCcAamsX  PeCcAamsX  PeCcAamsX  PeCcAamsX  PeCcAamlsX PeCcAamlsX PeCcAamlsX
share-report    -          -          -          -          -          -          -          -          PeAasX     -          -
end-share       -          -          -          -          -          -          -          -          PeAasX     PeAasX     PeAasX
`)
})

test('whoever checked a revision does not approve it, even with the role of an approver', () => {
  const both: PolicyActor = { userId: 'checker', roles: ['checker', 'approver'] }
  const subject: RevisionSubject = { ...closed, signed: ['prepared', 'checked'] }
  expect(can(both, 'sign-approved', subject)).toEqual({
    allowed: false,
    reason: 'Whoever checked a revision does not approve it.',
  })
})

test('a preparer who lost the role of an engineer no longer signs as the preparer', () => {
  expect(can({ userId: 'preparer', roles: ['client'] }, 'sign-prepared', closed).allowed).toBe(false)
})

test('every refusal is a sentence that the person can read', () => {
  for (const subject of Object.values(moments))
    for (const action of revisionActions)
      for (const actor of Object.values(people)) {
        const answer = can(actor, action, subject)
        if (!answer.allowed) expect(answer.reason).toMatch(/^[A-Z].*\.$/)
      }
})

test('asking about a revision without naming one is a bug', () => {
  const loose = can as (actor: PolicyActor, action: string) => unknown
  expect(() => loose({ userId: 'preparer', roles: ['engineer'] }, 'issue')).toThrow(RangeError)
})
