import 'server-only'
import type { CaseResult, CaseSeries } from '@/lib/engine/case-result'
import type { ReportDecision, ReportInput, RevisionTableRow } from '@/lib/report/report-input'
import { changeSentence } from '@/lib/study/diff/change-sentence'
import { diffInputs } from '@/lib/study/diff/diff-inputs'
import { diffVerdicts } from '@/lib/study/diff/diff-verdicts'
import { readFrozenStudy } from '@/lib/study/read/read-frozen-study'
import type { Tx } from '../db'
import { commentSheetOf } from '../reviews/comment-sheet'
import { loadGround } from '../reviews/ground'
import { waiversOf } from '../reviews/waive'
import { revisionState } from '../revisions/subject'
import { unpackSeries } from '../series'
import { loadSummary } from '../studies/run-state'

const decisionWords: Record<string, string> = {
  'send-for-check': 'Sent for check',
  'accept-check': 'Check accepted',
  'accept-review': 'Review accepted',
  'close-review': 'Review closed',
}

/** Everything that a revision's report is rendered from, as it was frozen and decided. The same rows give the same report. */
export async function reportInputOf(tx: Tx, revisionId: string, draft: boolean): Promise<ReportInput> {
  const row = await tx.revision.findFirstOrThrow({
    where: { id: revisionId },
    omit: { document: false },
    include: { run: { select: { id: true, result: true } }, decisions: { orderBy: { at: 'asc' } } },
  })
  const people = await tx.user.findMany({
    where: { id: { in: [row.checkedById, row.reviewAcceptedById].filter((id) => id !== null) } },
    select: { id: true, name: true },
  })
  const nameOf = (id: string | null) => people.find((person) => person.id === id)?.name ?? null
  const since = row.decisions.findLastIndex(({ move }) => move === 'send-for-check')
  return {
    document: readFrozenStudy(row.document),
    frozenDocument: row.document,
    result: await loadResult(tx, row.run),
    revision: {
      number: String(row.number),
      state: revisionState(row.state),
      purpose: row.purpose ?? '',
      frozenAt: row.frozenAt.toISOString(),
      documentHash: row.documentHash,
      inputHash: row.inputHash,
      auditHead: row.auditHead,
      people: {
        prepared: row.frozenByName,
        checked: nameOf(row.checkedById),
        approved: nameOf(row.reviewAcceptedById),
      },
      table: await revisionTable(tx, row),
      decisions: row.decisions.slice(Math.max(since, 0)).flatMap(({ move, personName, at, note }): ReportDecision[] => {
        const what = decisionWords[move]
        return what ? [{ what, who: personName, at: at.toISOString(), note }] : []
      }),
      waivers: await waiversOf(tx, revisionId),
      comments: await commentSheetOf(tx, revisionId),
    },
    draft,
  }
}

async function loadResult(tx: Tx, run: Parameters<typeof loadSummary>[1]): Promise<ReportInput['result']> {
  const { cases, ...verdicts } = await loadSummary(tx, run)
  const stored = await tx.caseRun.findMany({ where: { runId: run.id }, select: { caseId: true, series: true } })
  const withSeries: CaseResult[] = []
  for (const summary of cases) {
    const packed = stored.find((one) => one.caseId === summary.caseId)?.series
    const series: CaseSeries = packed ? await unpackSeries(packed) : { time: [], busVoltage: {}, motors: {} }
    withSeries.push({ ...summary, series })
  }
  return { ...verdicts, cases: withSeries }
}

interface TableSource {
  id: string
  studyId: string
  number: number
  purpose: string | null
  note: string
  frozenAt: Date
  closedAt: Date | null
}

/** What the author says changed, and what did change against the revision that went out before. */
async function changesOf(tx: Tx, { id, note }: TableSource, formerId: string | null): Promise<string> {
  if (formerId === null) return note
  const [before, after] = [await loadGround(tx, formerId), await loadGround(tx, id)]
  const found = changeSentence(diffInputs(before.document, after.document), diffVerdicts(before, after))
  return note === '' ? found : `${note} ${found}`
}

/** The revisions that went out before, and this one last. */
async function revisionTable(tx: Tx, row: TableSource): Promise<RevisionTableRow[]> {
  const before = await tx.revision.findMany({
    where: { studyId: row.studyId, number: { lt: row.number }, issuedAt: { not: null } },
    orderBy: { number: 'asc' },
    select: { id: true, number: true, issuedAt: true, purpose: true, note: true, frozenAt: true },
  })
  return [
    ...before.map(({ number, issuedAt, purpose, note, frozenAt }) => ({
      number: String(number),
      date: (issuedAt ?? frozenAt).toISOString(),
      purpose: purpose ?? '',
      changes: note,
    })),
    {
      number: String(row.number),
      date: (row.closedAt ?? row.frozenAt).toISOString(),
      purpose: row.purpose ?? '',
      changes: await changesOf(tx, row, before.at(-1)?.id ?? null),
    },
  ]
}
