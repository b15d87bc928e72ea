/** A signed-in person. */
export interface Actor {
  userId: string
  name: string
  email: string
  /** The organisation that a command without a project means; the person's first one where it is left out. */
  organisationId?: string
  /** True until the password that an administrator handed over is replaced. */
  initialPassword?: boolean
}

/** Whoever comes by a link and has no account, or is not signed in. */
export const linkHolder = (words: string): Actor => ({ userId: '', name: words, email: '' })
