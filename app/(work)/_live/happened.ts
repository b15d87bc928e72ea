/** What the server says has happened in the project of the page. */
export interface Happened {
  sequence: number
  action: string
  by: string
  subject: { kind: string; id: string }
  revisionId: string | null
  /** Whether the same person did it, here or at another desk. */
  own: boolean
}

const listeners = new Set<(happened: Happened) => void>()

/** Tells every part of the page that follows. */
export const tellHappened = (happened: Happened): void => {
  for (const listener of listeners) listener(happened)
}

/** Follows what happens in the project of the page until the answer is called. */
export const onHappened = (listener: (happened: Happened) => void): (() => void) => {
  listeners.add(listener)
  return () => {
    listeners.delete(listener)
  }
}
