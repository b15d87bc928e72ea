import type { SharedReport } from '@/lib/server/share/open-share'
import { Moment } from '@/lib/ui/moment'
import { Notice } from '@/lib/ui/notice'

/** Whether the report still stands; the signed file itself is never altered to say so. */
export function ShareStanding({ shared }: { shared: SharedReport }) {
  const { state, number, purpose, issuedAt, supersededAt, withdrawn, inForce } = shared
  const instead = inForce === null ? '' : ` In force is revision ${inForce}: ask whoever sent this link for it.`
  if (state === 'withdrawn')
    return (
      <Notice tone="bad">
        Withdrawn
        {withdrawn ? (
          <>
            {' '}
            on <Moment at={withdrawn.at} />: {withdrawn.reason}
          </>
        ) : null}{' '}
        It must not be relied on.{instead}
      </Notice>
    )
  if (state === 'superseded')
    return (
      <Notice tone="caution">
        Superseded
        {supersededAt ? (
          <>
            {' '}
            on <Moment at={supersededAt} />
          </>
        ) : null}
        : no longer to be used for new work. The signed file stays as it was.{instead}
      </Notice>
    )
  return (
    <Notice tone="good">
      Revision {number} is issued{purpose ? ` (${purpose})` : ''}
      {issuedAt ? (
        <>
          , on <Moment at={issuedAt} />
        </>
      ) : null}
      . It is the one in force.
    </Notice>
  )
}
