import type { ReactNode } from 'react'

/** Something that a comment can be about; it is pointed at, found and counted by the text of its anchor. */
export function Anchored({ on, children }: { on: string | undefined; children: ReactNode }) {
  return on === undefined ? children : <span data-anchor={on}>{children}</span>
}
