import fs from 'node:fs'
import path from 'node:path'
import { renderReport } from '@/lib/report/render-report'
import type { ReportInput } from '@/lib/report/report-input'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { runDocument } from '@/lib/study/run-document'
import { documentHash } from '@/lib/study/study-hashes'

const folder = path.resolve(import.meta.dirname, '../../../.data/test/report')

/** What a frozen revision of a document is printed from; every date is fixed. */
export async function reportInput(document: StudyDocument, draft: boolean): Promise<ReportInput> {
  return {
    document,
    result: runDocument(document),
    draft,
    revision: {
      number: '1',
      state: draft ? 'in-review' : 'review-closed',
      purpose: 'For approval by the utility',
      frozenAt: '2026-05-20T08:00:00Z',
      documentHash: await documentHash(document),
      inputHash: '1'.repeat(64),
      auditHead: draft ? null : '2'.repeat(64),
      people: { prepared: 'A. Lindqvar', checked: 'R. Obede', approved: 'S. Tharow' },
      table: [
        { number: '1', date: '2026-05-20T08:00:00Z', purpose: 'For approval by the utility', changes: 'First issue.' },
      ],
      decisions: [],
      waivers: [],
    },
  }
}

/** Renders a report into a file of the test folder and returns its path. */
export async function reportFile(name: string, input: ReportInput): Promise<string> {
  fs.mkdirSync(folder, { recursive: true })
  const file = path.join(folder, `${name}.pdf`)
  fs.writeFileSync(file, await renderReport(input))
  return file
}
