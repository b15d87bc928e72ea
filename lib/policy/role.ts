/** What a person may be in a project; one person may hold several. The administrator's role spans the organisation. */
export const roles = ['engineer', 'checker', 'approver', 'commenter', 'client', 'administrator'] as const

export type Role = (typeof roles)[number]

/** Who acts, with the roles that count for the subject. */
export interface PolicyActor {
  userId: string
  roles: readonly Role[]
}
