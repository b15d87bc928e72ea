'use client'

import { useRouter } from 'next/navigation'
import { answered } from '@/app/_action/outcome'
import { Confirm } from '@/lib/ui/confirm'
import { withdraw } from './actions'

/** Takes back an invitation that nobody has accepted. */
export function WithdrawButton(props: { projectId: string; invitationId: string; name: string }) {
  const router = useRouter()
  const confirm = async () => {
    const outcome = await answered(() => withdraw(props.projectId, props.invitationId))
    if (!outcome.ok) return outcome.message
    router.refresh()
    return null
  }
  return (
    <Confirm
      trigger="Withdraw invitation"
      title={`Withdraw the invitation of ${props.name}`}
      confirm="Withdraw invitation"
      onConfirm={confirm}
    >
      <p className="m-0">The link that was sent stops working at once.</p>
    </Confirm>
  )
}
