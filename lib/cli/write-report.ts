import { writeFile } from 'node:fs/promises'
import path from 'node:path'
import { renderReport } from '../compute/render'
import type { StudyResult } from '../engine/study-run'
import type { ReportRevision } from '../report/report-input'
import type { StudyDocument } from '../study/document/study-document'
import { documentHash, inputHash } from '../study/study-hashes'
import { studyRunInput } from '../study/to-engine/study-run-input'

/** A study that was computed from a file has no revision: its report is a draft without sign-offs. */
const draftOf = async (document: StudyDocument, date: string): Promise<ReportRevision> => ({
  number: 'draft',
  state: 'draft',
  purpose: 'Computed from a study file',
  frozenAt: `${date}T00:00:00Z`,
  documentHash: await documentHash(document),
  inputHash: await inputHash(studyRunInput(document)),
  auditHead: null,
  people: { prepared: null, checked: null, approved: null },
  table: [],
  decisions: [],
  waivers: [],
})

/** Renders the report of a study file into a folder as `report.pdf`. */
export async function writeReport(
  folder: string,
  document: StudyDocument,
  result: StudyResult,
  { date, entry }: { date: string; entry: string },
): Promise<void> {
  const { pdf } = await renderReport(
    { document, result, revision: await draftOf(document, date), draft: true },
    { entry },
  )
  await writeFile(path.join(folder, 'report.pdf'), pdf)
}
