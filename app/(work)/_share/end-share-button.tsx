'use client'

import { useRouter } from 'next/navigation'
import { answered } from '@/app/_action/outcome'
import { Confirm } from '@/lib/ui/confirm'
import { end } from './actions'

/** Ends a link. */
export function EndShareButton(props: { revisionId: string; shareId: string; recipient: string }) {
  const router = useRouter()
  const confirm = async () => {
    const outcome = await answered(() => end(props.revisionId, props.shareId))
    if (!outcome.ok) return outcome.message
    router.refresh()
    return null
  }
  return (
    <Confirm
      trigger="End link"
      tone="danger"
      title={`End the link for ${props.recipient}`}
      confirm="End link"
      onConfirm={confirm}
    >
      <p className="m-0">It stops working at once. What was downloaded stays with whoever has it.</p>
    </Confirm>
  )
}
