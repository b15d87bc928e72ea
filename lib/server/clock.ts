import 'server-only'

/** The server's one clock. Everything that a transaction writes carries the one instant at which it began. */
export const now = (): Date => new Date()
