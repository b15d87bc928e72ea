import type { ReactNode } from 'react'

export type NoticeTone = 'plain' | 'good' | 'caution' | 'bad'

const looks: Record<NoticeTone, string> = {
  plain: 'border-rule',
  good: 'border-meets',
  caution: 'border-close',
  bad: 'border-fails',
}

/** A sentence that the reader must not miss; a refusal is announced at once. */
export function Notice({ tone = 'plain', children }: { tone?: NoticeTone; children: ReactNode }) {
  return (
    <div
      role={tone === 'bad' ? 'alert' : 'status'}
      className={`border-l-4 bg-sheet px-3 py-2 text-body text-ink ${looks[tone]}`}
    >
      {children}
    </div>
  )
}
