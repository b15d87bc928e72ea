import type { Role } from '@/lib/policy/role'

/** A person of the invented demo. */
export interface CastMember {
  id: string
  name: string
  email: string
  role: Role
  /** What they are, for the table of sign-ins. */
  words: string
  /** Members of the organisation sign with keys of their own; the others are guests of the project. */
  member: boolean
  signs: boolean
}

/** Everybody in the demo; people, firms and addresses are invented. */
export const cast: readonly CastMember[] = [
  {
    id: 'demo-lindqvar',
    name: 'A. Lindqvar',
    email: 'a.lindqvar@harrowgate-quill.example',
    role: 'engineer',
    words: 'engineer, prepares',
    member: true,
    signs: true,
  },
  {
    id: 'demo-obede',
    name: 'R. Obede',
    email: 'r.obede@harrowgate-quill.example',
    role: 'checker',
    words: 'checker',
    member: true,
    signs: true,
  },
  {
    id: 'demo-tharow',
    name: 'S. Tharow',
    email: 's.tharow@harrowgate-quill.example',
    role: 'approver',
    words: 'approver, issues',
    member: true,
    signs: true,
  },
  {
    id: 'demo-hollin',
    name: 'D. Hollin',
    email: 'd.hollin@ostrand-rural.example',
    role: 'commenter',
    words: 'commenter, Ostrand Rural Distribution',
    member: false,
    signs: false,
  },
  {
    id: 'demo-wennick',
    name: 'P. Wennick',
    email: 'p.wennick@velmoor-water.example',
    role: 'client',
    words: 'client, Velmoor Water Board',
    member: false,
    signs: false,
  },
  {
    id: 'demo-quarrie',
    name: 'M. Quarrie',
    email: 'm.quarrie@harrowgate-quill.example',
    role: 'administrator',
    words: 'administrator',
    member: true,
    signs: false,
  },
]
