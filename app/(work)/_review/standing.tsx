import Link from 'next/link'
import type { RevisionView } from '@/lib/server/revisions/view'
import type { RevisionState } from '@/lib/study/states'
import { Moment } from '@/lib/ui/moment'
import { Notice, type NoticeTone } from '@/lib/ui/notice'

const tones: Record<RevisionState, NoticeTone> = {
  draft: 'plain',
  'in-check': 'plain',
  'in-review': 'plain',
  'review-closed': 'plain',
  issued: 'good',
  superseded: 'caution',
  withdrawn: 'bad',
}

const open: Partial<Record<RevisionState, string>> = {
  draft: 'A frozen draft: it is sent for check by the engineer who froze it.',
  'in-check': 'The checker compares inputs with their sources, and accepts or sends back.',
  'in-review': 'Out for review: the approver accepts it, then closes the review with the purpose of issue.',
  'review-closed':
    'The review is closed: preparer, checker and approver sign the final report in this order, then it is issued.',
}

const inSentence = (text: string): string => `${text[0]?.toLowerCase()}${text.slice(1)}`

/** Where a revision stands, in a sentence, with the revision to use instead. */
export function Standing({ revision, hrefOf }: { revision: RevisionView; hrefOf: (revisionId: string) => string }) {
  const { state, number, purpose, issuedAt, supersededAt, withdrawn, issuedRevision } = revision
  const instead = issuedRevision ? (
    <>
      {' '}
      In force is{' '}
      <Link prefetch={false} className="link" href={hrefOf(issuedRevision.revisionId)}>
        revision {issuedRevision.number}
      </Link>
      .
    </>
  ) : null
  return (
    <Notice tone={tones[state]}>
      {open[state]}
      {state === 'issued' && issuedAt ? (
        <>
          Revision {number} is issued{purpose ? `, ${inSentence(purpose)}` : ''}, on <Moment at={issuedAt} />. It is the
          one in force.
        </>
      ) : null}
      {state === 'superseded' ? (
        <>
          Superseded
          {supersededAt ? (
            <>
              {' '}
              on <Moment at={supersededAt} />
            </>
          ) : null}
          : no longer to be used for new work. The signed file stays as it was.{instead}
        </>
      ) : null}
      {state === 'withdrawn' && withdrawn ? (
        <>
          Withdrawn on <Moment at={withdrawn.at} />: {withdrawn.reason} It must not be relied on.{instead}
        </>
      ) : null}
    </Notice>
  )
}
