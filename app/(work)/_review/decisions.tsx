import type { Outcome } from '@/app/_action/outcome'
import type { RevisionAction } from '@/lib/policy/action'
import * as actions from './actions'
import { Decision, type DecisionWords } from './decision'

type Decided = Extract<
  RevisionAction,
  | 'send-for-check'
  | 'accept-check'
  | 'reject-check'
  | 'accept-review'
  | 'reject-review'
  | 'close-review'
  | 'back-to-draft'
  | 'issue'
  | 'withdraw'
>

interface Offer extends DecisionWords {
  /** Binds the revision to a server action: only such functions reach the browser. */
  of: (revisionId: string) => (text: string) => Promise<Outcome<unknown>>
}

const note = 'Note'
const reason = 'Reason'

const offers: Record<Decided, Offer> = {
  'send-for-check': {
    verb: 'Send for check',
    title: 'Send this revision for check?',
    explain: 'The checker ticks inputs against their sources and may send it back with a reason.',
    text: note,
    tone: 'main',
    of: (id) => actions.send.bind(null, id),
  },
  'accept-check': {
    verb: 'Accept check',
    title: 'Accept the check?',
    explain:
      'You have checked inputs against their sources. The revision goes out for review, and you will sign as its checker.',
    text: note,
    tone: 'main',
    of: (id) => actions.decideOnCheck.bind(null, id, true),
  },
  'reject-check': {
    verb: 'Send back to preparer',
    title: 'Send this revision back?',
    explain: 'It becomes a draft again; the frozen attempt stays readable.',
    text: reason,
    textNeeded: true,
    of: (id) => actions.decideOnCheck.bind(null, id, false),
  },
  'accept-review': {
    verb: 'Accept review',
    title: 'Accept the review?',
    explain: 'The review stays open until it is closed with the purpose of issue.',
    text: note,
    tone: 'main',
    of: (id) => actions.decideOnReview.bind(null, id, true),
  },
  'reject-review': {
    verb: 'Reject review',
    title: 'Reject the review?',
    explain: 'The revision becomes a draft again; the frozen attempt stays readable.',
    text: reason,
    textNeeded: true,
    of: (id) => actions.decideOnReview.bind(null, id, false),
  },
  'close-review': {
    verb: 'Close review',
    title: 'Close the review?',
    explain:
      'The final report is rendered with empty signature fields. Preparer, checker and approver then sign exactly those bytes.',
    text: 'Purpose of issue',
    textNeeded: true,
    oneLine: true,
    tone: 'main',
    of: (id) => actions.close.bind(null, id),
  },
  'back-to-draft': {
    verb: 'Take back to draft',
    title: 'Take this revision back to draft?',
    explain: 'Signatures given in this round end with it. The frozen attempt stays readable.',
    text: reason,
    textNeeded: true,
    of: (id) => actions.takeBack.bind(null, id),
  },
  issue: {
    verb: 'Issue revision',
    title: 'Issue this revision?',
    explain: 'The file that all three have signed is released unaltered. A revision issued before is superseded by it.',
    text: note,
    tone: 'main',
    of: (id) => actions.issue.bind(null, id),
  },
  withdraw: {
    verb: 'Withdraw revision',
    title: 'Withdraw this revision?',
    explain:
      'It must no longer be relied on. Its file stays as it is; that it is withdrawn is said wherever it can be downloaded or verified.',
    text: reason,
    textNeeded: true,
    tone: 'danger',
    of: (id) => actions.withdraw.bind(null, id),
  },
}

const isDecided = (action: RevisionAction): action is Decided => Object.hasOwn(offers, action)

interface DecisionsProps {
  revisionId: string
  allowed: readonly RevisionAction[]
  purposes: readonly string[]
}

/** The decisions that the person may take on the revision now. */
export function Decisions({ revisionId, allowed, purposes }: DecisionsProps) {
  // An accepted review is closed next; accepting it twice says nothing.
  const closing = allowed.includes('close-review')
  const decided = allowed.filter(isDecided).filter((action) => !(closing && action === 'accept-review'))
  if (decided.length === 0) return null
  return (
    <div className="flex flex-wrap gap-2">
      {decided.map((action) => {
        const { of, ...words } = offers[action]
        return (
          <Decision
            key={action}
            {...words}
            offers={action === 'close-review' ? purposes : undefined}
            decide={of(revisionId)}
          />
        )
      })}
    </div>
  )
}
