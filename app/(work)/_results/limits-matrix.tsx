import { Anchored } from '@/app/(work)/_comments/anchored'
import type { Verdict as VerdictRow } from '@/lib/engine/criteria/rule'
import { printAnchor } from '@/lib/study/anchors/anchor'
import type { LimitRecord } from '@/lib/study/document/limit-record'
import { caseSentence } from '@/lib/study/words/case-sentence'
import { formatVerdict } from '@/lib/study/words/format-verdict'
import { limitedQuantity, limitSentence, limitValuePhrase, placePhrase } from '@/lib/study/words/limit-sentence'
import { notAssessedReasons } from '@/lib/study/words/verdict-words'
import { ScrollRegion } from '@/lib/ui/scroll-region'
import { Verdict, VerdictMark } from '@/lib/ui/verdict'
import { CaseLink } from './case-link'
import { margins, type Results } from './results'

const roles = { design: '', sensitivity: 'sensitivity', comparison: 'comparison' } as const

/** Every limit against every case: word, value and what is left; the governing one framed. */
export function LimitsMatrix({ results }: { results: Results }) {
  const { document, summary } = results
  const { governing } = summary.overall
  const cases = document.cases.filter(({ id }) => summary.cases.some(({ caseId }) => caseId === id))
  return (
    <section aria-labelledby="limits">
      <h2 id="limits" className="m-0 mb-1 text-title font-semibold">
        Limits matrix
      </h2>
      <ScrollRegion label="Limits matrix, table" className="w-fit max-w-full border border-hair bg-sheet">
        <table className="dense">
          <caption className="sr-only">
            Verdict, value and margin of every limit in every case. The margin is what is left inside the limit, or how
            far the value is beyond it.
          </caption>
          <thead>
            <tr>
              <th scope="col" className="left-0 z-[1] bg-sheet md:sticky">
                Limit
              </th>
              {cases.map((record) => (
                <th key={record.id} scope="col" className="min-w-26">
                  <CaseLink caseId={record.id} title={`${caseSentence(record, document)}.`}>
                    {record.tag}
                  </CaseLink>
                  {roles[record.role] ? <span className="block font-normal">{roles[record.role]}</span> : null}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {document.limits.map((rule) => (
              <tr key={rule.id}>
                <th
                  scope="row"
                  className="left-0 z-[1] w-72 min-w-56 bg-sheet font-normal md:sticky"
                  title={`${limitSentence(rule, document)}.`}
                >
                  <span className="font-semibold">{rule.tag}</span> {placePhrase(rule, document)},{' '}
                  {limitedQuantity(rule, document)}, {limitValuePhrase(rule)}
                </th>
                {cases.map((record) => {
                  const row = summary.verdicts.find(({ ruleId, caseId }) => ruleId === rule.id && caseId === record.id)
                  const governs = governing?.ruleId === rule.id && governing.caseId === record.id
                  return (
                    <td
                      key={record.id}
                      className={governs ? 'bg-tint outline-2 -outline-offset-2 outline-ink' : undefined}
                    >
                      <Anchored on={printAnchor({ kind: 'verdict', limitId: rule.id, caseId: record.id })}>
                        {row ? <Cell results={results} rule={rule} row={row} governs={governs} /> : <NotApplicable />}
                      </Anchored>
                    </td>
                  )
                })}
              </tr>
            ))}
          </tbody>
        </table>
      </ScrollRegion>
      <p className="m-0 mt-1 flex flex-wrap gap-x-4 text-label text-soft">
        <span>
          <Verdict word="meets" /> inside the limit
        </span>
        <span>
          <Verdict word="close" /> inside by less than the margin in the settings
        </span>
        <span>
          <Verdict word="fails" /> beyond the limit
        </span>
        <span>
          <Verdict word="not-assessed" /> for the reason given
        </span>
        <span>framed: governs the verdict</span>
        <span>n/a: the limit does not apply to that case</span>
      </p>
    </section>
  )
}

const NotApplicable = () => (
  <span className="text-soft" title="The limit does not apply to this case.">
    n/a
  </span>
)

interface CellProps {
  results: Results
  rule: LimitRecord
  row: VerdictRow
  governs: boolean
}

function Cell({ results, rule, row, governs }: CellProps) {
  const { value, margin, unit } = formatVerdict(row, rule.quantity, margins(results.document))
  const reason = row.reason ? notAssessedReasons[row.reason] : undefined
  if (!row.inUse)
    return (
      <span className="text-soft" title="The limit is written for another number of starts than is intended.">
        <span className="block whitespace-nowrap">{value === null ? '–' : `${value}\u2009${unit}`}</span>
        <span className="block whitespace-nowrap">
          <VerdictMark word={row.word} /> {row.word === 'not-assessed' ? 'not assessed' : row.word}
        </span>
        <span className="block">class not in use</span>
      </span>
    )
  return (
    <>
      {value === null ? null : (
        <span className="block font-semibold whitespace-nowrap">
          {value}
          {'\u2009'}
          {unit}
        </span>
      )}
      <span className={value === null ? 'block min-w-36' : 'block whitespace-nowrap'}>
        <Verdict word={row.word} reason={reason} />
        {margin === null || value === null ? null : (
          <span className="text-soft">
            {margin.startsWith('\u2212') ? ` by ${margin.slice(1)}` : `, ${margin} left`}
          </span>
        )}
      </span>
      {row.circuits ? <span className="block text-soft">worst of {row.circuits} circuits</span> : null}
      {governs ? <span className="block font-semibold">governs</span> : null}
    </>
  )
}
