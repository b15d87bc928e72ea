import type { CaseResult } from '@/lib/engine/case-result'
import type { StudyResult } from '@/lib/engine/study-run'
import type { StudyDocument } from '@/lib/study/document/study-document'
import type { RevisionState, SignOffRole } from '@/lib/study/states'

/** One line of the revision table on the cover. */
export interface RevisionTableRow {
  number: string
  /** ISO 8601, UTC. */
  date: string
  purpose: string
  /** What changed against the revision before, in a sentence. */
  changes: string
}

/** A decision that was taken on this revision before its review was closed. */
export interface ReportDecision {
  /** For example `Check accepted`. */
  what: string
  who: string
  /** ISO 8601, UTC. */
  at: string
  note: string
}

/** A limit that is waived, or a departure from it, with who accepted it. */
export interface ReportWaiver {
  /** Record of the limits sheet that it is about; null where it is about something else. */
  limitId: string | null
  what: string
  reason: string
  who: string
  at: string
}

/** A comment of the review with how it was settled, as the comment sheet prints it. */
export interface ReportComment {
  number: number
  /** What it is about, in words, with the value of its time where it has one. */
  about: string
  /** `error`, `request`, `question` or `editorial`. */
  kind: string
  text: string
  who: string
  at: string
  /** Answers and replies in their order. */
  thread: readonly { what: string; who: string; at: string; text: string }[]
  /** `open`, `answered` or `closed`. */
  state: string
}

/** What the frozen revision adds to study and result; every date in the report comes from here, never from the clock. */
export interface ReportRevision {
  number: string
  state: RevisionState
  purpose: string
  /** ISO 8601, UTC. */
  frozenAt: string
  /** SHA-256 of the canonical document, hexadecimal. */
  documentHash: string
  /** SHA-256 of what the engine reads, hexadecimal. */
  inputHash: string
  /** Head of the project's audit chain when the review was closed; null before. */
  auditHead: string | null
  /** Names as they will sign; null while nobody is named. */
  people: Record<SignOffRole, string | null>
  table: readonly RevisionTableRow[]
  decisions: readonly ReportDecision[]
  waivers: readonly ReportWaiver[]
  /** Comments that stand in this revision; absent where the report is made without a review. */
  comments?: readonly ReportComment[]
}

/** The engine's result for one motor alone at standstill, everything else switched off (see `reducedCase`). */
export interface HandCheckResult {
  caseId: string
  motorId: string
  result: CaseResult
}

export interface ReportInput {
  document: StudyDocument
  /** The bytes in which it was frozen and hashed, which go into the file as they are; absent: those of `document`. */
  frozenDocument?: Uint8Array
  /** As `runDocument` computes it: its overall verdict is that of the design cases. */
  result: StudyResult
  revision: ReportRevision
  /** A draft carries a watermark and no signature fields. */
  draft: boolean
  /** Absent: computed when the report is rendered. Null: the appendix says that the program's figures are missing. */
  handCheck?: HandCheckResult | null
}
