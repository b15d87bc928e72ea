import type { LiveAction } from './action'
import type { Role } from './role'

/** Who may do what to live records: one row an action, the roles that may, and what the others are told. */
export const liveRules: Record<LiveAction, { roles: readonly Role[]; otherwise: string }> = {
  'create-project': {
    roles: ['engineer', 'administrator'],
    otherwise: 'Only an engineer or an administrator starts a project.',
  },
  'manage-members': { roles: ['administrator'], otherwise: 'Only an administrator changes members and their roles.' },
  'manage-certificates': {
    roles: ['administrator'],
    otherwise: 'Only an administrator decides which signing certificates the organisation trusts.',
  },
  'read-plant': {
    roles: ['engineer', 'checker', 'approver', 'administrator'],
    otherwise: 'Live plant records are for the project team; ask for a revision that is out for review.',
  },
  'edit-plant': { roles: ['engineer'], otherwise: 'Only an engineer of the project changes plant records.' },
  'read-study': {
    roles: ['engineer', 'checker', 'approver', 'administrator'],
    otherwise: 'A study in work is for the project team; ask for a revision that is out for review.',
  },
  'edit-study': { roles: ['engineer'], otherwise: 'Only an engineer of the project changes a study.' },
  compute: {
    roles: ['engineer', 'checker', 'approver'],
    otherwise: 'Only an engineer, a checker or an approver of the project computes cases.',
  },
  freeze: { roles: ['engineer'], otherwise: 'Only an engineer of the project freezes a revision.' },
}
