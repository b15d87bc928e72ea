import type { ReactNode } from 'react'

/** Nothing here yet: says so and names the one next step. */
export function EmptyState({ title, children }: { title: string; children?: ReactNode }) {
  return (
    <div className="border border-hair bg-sheet px-4 py-6">
      <p className="m-0 font-semibold">{title}</p>
      {children ? <div className="mt-1 max-w-xl text-soft">{children}</div> : null}
    </div>
  )
}
