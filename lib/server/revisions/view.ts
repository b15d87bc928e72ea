import type { RevisionAction } from '@/lib/policy/action'
import type { Role } from '@/lib/policy/role'
import type { RevisionMove, RevisionState, SignOffRole } from '@/lib/study/states'
import type { StudySummary } from '@/lib/study/summary'

export interface DecisionLine {
  move: RevisionMove | 'freeze'
  person: string
  note: string
  at: string
}

export interface SignoffLine {
  role: SignOffRole
  person: string
  at: string
  /** Fingerprint of the certificate. */
  certificate: string
}

/** Who may sign as what; null while nobody in particular is expected. */
export interface ExpectedSigner {
  role: SignOffRole
  person: string | null
  userId: string | null
  /** Whether that person has a certificate on the list. */
  hasCertificate: boolean
}

export interface ReportFileFacts {
  sha256: string
  pages: number
  bytes: number
}

export type RenderState = 'none' | 'queued' | 'running' | 'done' | 'failed'

/** A live record that is not as it was at the freeze. */
export interface Moved {
  kind: string
  id: string
  tag: string
  change: 'added' | 'changed' | 'removed'
  by: string | null
  at: string | null
}

/** A frozen revision as its page shows it. */
export interface RevisionView {
  /** Place in the project's chain of events that this view stands at; whoever follows starts from here. */
  sequence: number
  revisionId: string
  studyId: string
  projectId: string
  organisationId: string
  title: string
  documentNumber: string
  number: number
  attempt: number
  state: RevisionState
  purpose: string | null
  note: string
  frozenAt: string
  preparedBy: string
  documentHash: string
  inputHash: string
  engineVersion: string
  decisions: DecisionLine[]
  signoffs: SignoffLine[]
  expectedSigners: ExpectedSigner[]
  /** The file that is shown now: the draft, the final one, or the one with the signatures given so far. */
  report: ReportFileFacts | null
  renderState: RenderState
  renderFailure: string | null
  /** When signing began; null outside a round. */
  roundStartedAt: string | null
  preIssueChecks: unknown
  allowed: readonly RevisionAction[]
  roles: readonly Role[]
  summary: StudySummary
  movedSince: Moved[]
  issuedAt: string | null
  supersededAt: string | null
  withdrawn: { at: string; reason: string } | null
  /** The revision that is issued now, if it is another one. */
  issuedRevision: { revisionId: string; number: number } | null
}
