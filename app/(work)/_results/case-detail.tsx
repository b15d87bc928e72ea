import { Anchored } from '@/app/(work)/_comments/anchored'
import type { CaseSeries } from '@/lib/engine/case-result'
import { printAnchor } from '@/lib/study/anchors/anchor'
import { caseSentence } from '@/lib/study/words/case-sentence'
import { Notice } from '@/lib/ui/notice'
import { CasePlots } from './case-plots'
import { FlickerTable } from './flicker-table'
import { GeneratorTable } from './generator-table'
import { HeatTable, ProtectionTable } from './protection-table'
import { canBeDrawn, caseResult, type Results } from './results'
import { CaseSentences, RunCounters } from './run-notes'
import { ChangeOverTable, RunningTable, SupplyTable } from './running-table'
import { StartTable } from './start-table'
import { TransientTable } from './transient-table'
import { VoltageTable } from './voltage-table'

interface CaseDetailProps {
  results: Results
  caseId: string
  /** Null where the case has none, because it could not be computed. */
  series: CaseSeries | null
}

/** One case: what happened in sentences, its figures, then every number with its reference. */
export function CaseDetail({ results, caseId, series }: CaseDetailProps) {
  const { document, summary } = results
  const record = document.cases.find(({ id }) => id === caseId)
  const result = caseResult(results, caseId)
  if (!record) return null
  const drawn = result && series && series.time.length > 0 && canBeDrawn(results, result)
  return (
    <section id="case" aria-labelledby="case-title" className="flex scroll-mt-4 flex-col gap-3">
      <div>
        <h2 id="case-title" className="m-0 text-title font-semibold">
          <Anchored on={printAnchor({ kind: 'case', caseId })}>Case {record.tag}</Anchored>
        </h2>
        <p className="m-0 max-w-4xl text-soft">
          {caseSentence(record, document)}.{record.reason ? ` ${record.reason}` : ''}
        </p>
      </div>
      {result ? null : (
        <Notice tone="caution">
          This case was added after the last computation: compute the cases again to see it here.
        </Notice>
      )}
      {result ? (
        <>
          <CaseSentences document={document} result={result} />
          {drawn ? (
            <CasePlots figure={{ document, result: { ...result, series }, verdicts: summary.verdicts }} />
          ) : (
            <Notice>There are no curves of this case to draw.</Notice>
          )}
          <TransientTable document={document} result={result} />
          <StartTable document={document} result={result} />
          <ProtectionTable document={document} result={result} />
          <HeatTable results={results} result={result} />
          <ChangeOverTable document={document} result={result} />
          <GeneratorTable result={result} />
          <RunningTable document={document} result={result} />
          <VoltageTable document={document} caseId={caseId} places={result.places} />
          <FlickerTable document={document} result={result} />
          <SupplyTable document={document} result={result} />
          <RunCounters result={result} engineVersion={summary.engineVersion} />
        </>
      ) : null}
    </section>
  )
}
