import Link from 'next/link'
import type { ReactNode } from 'react'

/** Opens the case below on the same page. */
export function CaseLink({ caseId, children, title }: { caseId: string; children: ReactNode; title?: string }) {
  return (
    <Link prefetch={false} href={`?case=${caseId}#case`} className="link" title={title}>
      {children}
    </Link>
  )
}
