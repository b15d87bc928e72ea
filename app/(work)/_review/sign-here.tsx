'use client'

import Link from 'next/link'
import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { SignButton } from '@/app/(account)/_signing/sign-button'
import type { SignOffRole } from '@/lib/study/states'
import { Notice } from '@/lib/ui/notice'
import { complete, prepare } from './actions'

const labels: Record<SignOffRole, string> = {
  prepared: 'Sign as preparer',
  checked: 'Sign as checker',
  approved: 'Sign as approver',
}

interface SignHereProps {
  revisionId: string
  /** As what the person who looks is the next to sign; null where they are not. */
  due: SignOffRole | null
  /** Public key of that person's listed certificate, base64; null where there is none. */
  spki: string | null
}

/** The button of whoever is due; once pressed to the end, the table above shows the signature. */
export function SignHere({ revisionId, due, spki }: SignHereProps) {
  const router = useRouter()
  const [signed, setSigned] = useState(false)
  if (signed) return <Notice tone="good">Signed. The signature stands in the report.</Notice>
  if (!due) return null
  if (!spki)
    return (
      <p className="m-0">
        You are the next to sign, and have no signing key yet:{' '}
        <Link prefetch={false} href="/profile" className="link">
          make your signing key
        </Link>{' '}
        first. A key made after the round has begun counts from the next round on.
      </p>
    )
  return (
    <SignButton
      label={labels[due]}
      spki={spki}
      prepare={() => prepare(revisionId, due)}
      complete={(answer) => complete(revisionId, answer)}
      onSigned={() => {
        setSigned(true)
        router.refresh()
      }}
    />
  )
}
