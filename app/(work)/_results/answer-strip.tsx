import { assumptions } from '@/lib/study/assumptions'
import { caseTag } from '@/lib/study/words/tags'
import { Verdict } from '@/lib/ui/verdict'
import { answerFacts, governingSentence } from './answer-facts'
import { CaseLink } from './case-link'
import type { Results } from './results'

const counted = (count: number, one: string, many: string): string => `${count} ${count === 1 ? one : many}`

/** The answer first: the verdict, the limit that governs, and the figures that are checked with a pocket calculator. */
export function AnswerStrip({ results }: { results: Results }) {
  const { document, summary } = results
  const { word, counts } = summary.overall
  const listed = assumptions(document)
  const assumed = listed.filter(({ kind }) => kind === 'assumed' || kind === 'not-stated').length
  const unsourced = listed.filter(({ kind }) => kind === 'unsourced').length
  return (
    <section aria-labelledby="answer" className="border-2 border-ink bg-sheet">
      <div className="px-4 py-3">
        <h2 id="answer" className="m-0 mb-1 text-title font-semibold">
          The design <Verdict word={word} strong />
        </h2>
        <p className="m-0 max-w-5xl">
          {governingSentence(results) ?? 'No limit could be assessed: see the reasons in the matrix below.'}
        </p>
        <p className="m-0 mt-1 text-dense text-soft">
          Over the design cases and the limits in use: {counts.meets} meet, {counts.close} close, {counts.fails} fail,{' '}
          {counts['not-assessed']} not assessed. {counted(assumed, 'input is assumed', 'inputs are assumed')};{' '}
          {counted(unsourced, 'has no source', 'have no source')}.
        </p>
      </div>
      <dl className="m-0 grid grid-cols-1 border-t border-rule sm:grid-cols-2 xl:grid-cols-4">
        {answerFacts(results).map(({ label, value, more, caseId }) => (
          <div key={label} className="border-b border-hair px-4 py-2 xl:border-r xl:border-b-0 xl:last:border-r-0">
            <dt className="text-label font-semibold text-soft">{label}</dt>
            <dd className="m-0">
              <span className="block font-semibold">{value}</span>
              <span className="block text-dense">{more}</span>
              <span className="block text-dense text-soft">
                case <CaseLink caseId={caseId}>{caseTag(document, caseId)}</CaseLink>
              </span>
            </dd>
          </div>
        ))}
      </dl>
    </section>
  )
}
