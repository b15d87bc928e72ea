import type { FieldIssue } from '@/lib/errors'
import type { Role } from '@/lib/policy/role'
import type { StudyDocument, StudyHead, StudySettings, StudyTexts } from '@/lib/study/document/study-document'
import type { RevisionState } from '@/lib/study/states'
import type { StudySummary } from '@/lib/study/summary'
import type { PlantRows, StudyRows } from '../row'

/** How far the last computation of a study has come. */
export interface RunProgress {
  state: 'none' | 'queued' | 'running' | 'done' | 'failed' | 'stopped'
  runId: string | null
  done: number
  of: number
  /** Why the last computation failed, as one sentence. */
  failure: string | null
  requestedBy: string | null
  finishedAt: string | null
}

/** The same with the last results there are, whatever is running now. */
export interface RunState extends RunProgress {
  result: StudySummary | null
  /** True when records have changed since those results were computed. */
  stale: boolean
}

export interface RevisionLine {
  revisionId: string
  number: number
  attempt: number
  state: RevisionState
  frozenAt: string
  frozenBy: string
  purpose: string | null
}

/** A study in work as its pages show it. */
export interface StudyView {
  /** Place in the project's chain of events that this view stands at; whoever follows starts from here. */
  sequence: number
  studyId: string
  projectId: string
  organisationId: string
  /** Name of the project and of its client, as the project says now. */
  project: { name: string; client: string }
  head: StudyHead
  settings: StudySettings
  texts: StudyTexts
  frequency: StudyDocument['frequency']
  numberStyle: 'point' | 'comma'
  version: number
  rows: StudyRows
  plant: PlantRows
  /** The whole document when it is complete, else null with the reasons in `problems`; those of a nameplate that no motor can have come beside it. */
  document: StudyDocument | null
  problems: FieldIssue[]
  /** State of the newest revision; null before the first freeze. */
  state: RevisionState | null
  revisions: RevisionLine[]
  roles: readonly Role[]
  may: { edit: boolean; compute: boolean; freeze: boolean }
  run: RunState
}
