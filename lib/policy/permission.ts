/** Allowed, or the sentence that tells the person why not. */
export type Permission = { allowed: true } | { allowed: false; reason: string }

export const allowed: Permission = { allowed: true }

export const denied = (reason: string): Permission => ({ allowed: false, reason })

/** The first refusal, or allowed. */
export const all = (...permissions: readonly Permission[]): Permission =>
  permissions.find((one) => !one.allowed) ?? allowed
