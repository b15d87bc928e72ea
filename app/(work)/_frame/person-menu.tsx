'use client'

import Link from 'next/link'
import { useState } from 'react'
import { Button } from '@/lib/ui/button'

/** What waits for who is signed in, the way to their own page, and out. */
export function PersonMenu({ name, unread }: { name: string; unread: number }) {
  const [failed, setFailed] = useState(false)
  const signOut = async () => {
    const answer = await fetch('/api/auth/sign-out', {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: '{}',
    }).catch(() => null)
    if (answer?.ok) window.location.assign('/sign-in')
    else setFailed(true)
  }
  return (
    <div className="flex shrink-0 items-center gap-2 text-dense">
      <Link prefetch={false} href="/inbox" className="link">
        Inbox{unread > 0 ? ` (${unread})` : ''}
      </Link>
      <Link prefetch={false} href="/profile" className="link">
        {name}
      </Link>
      <Button tone="quiet" className="text-dense" onClick={signOut}>
        Sign out
      </Button>
      {failed ? (
        <span role="alert" className="text-fails">
          Not signed out: try again.
        </span>
      ) : null}
    </div>
  )
}
