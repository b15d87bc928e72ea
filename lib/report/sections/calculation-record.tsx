import { formatNumber } from '@/lib/quantity/format-number'
import { dataTable } from '../paper/data-table'
import { paragraph } from '../paper/text-block'
import { appendix } from '../report-context'
import { printInstant } from '../values/dates'
import { computedRuns, roles, runsOf } from '../values/roles'
import type { Section } from './section'

/** `3.1 · 10⁻¹²` as marked-up wording. */
const scientific = (value: number): string => {
  if (value === 0) return '0'
  const [mantissa = '0', exponent = '0'] = value.toExponential(1).split('e')
  return `${mantissa}\u2009·\u200910^{${Number(exponent) < 0 ? '−' : ''}${Math.abs(Number(exponent))}}`
}

/** By what the calculation can be repeated: version, hashes, and the counters of every run. */
export const calculationRecord: Section = (context) => {
  const { paper, input, words, width } = context
  const { record: say } = words.results
  const { revision, document, result } = input
  const whole = (value: number) => formatNumber(value, { decimals: 0 })
  const facts = [
    [say.engine, result.engineVersion],
    [say.format, `${document.format} ${document.formatVersion}`],
    [say.documentHash, revision.documentHash],
    [say.inputHash, revision.inputHash],
    [say.auditHead, revision.auditHead ?? say.noAudit],
    [say.frozen, printInstant(revision.frozenAt, words)],
  ]
  return [
    appendix(context, 'record', say.title),
    ...paragraph(paper, say.intro, { width }),
    ...paragraph(paper, say.recompute, { width }),
    dataTable(paper, {
      width,
      columns: [
        { head: say.fact, width: 150, fixed: true },
        { head: say.value, width: 1 },
      ],
      rows: facts.map(([name = '', value = '']) => [{ text: name, ink: 'soft' as const }, value]),
    }),
    dataTable(paper, {
      width,
      columns: [
        { head: say.heads.case, width: 40, fixed: true },
        { head: say.heads.steps, width: 1, align: 'right' },
        { head: say.heads.rejected, width: 1, align: 'right' },
        { head: say.heads.evaluations, width: 1, align: 'right' },
        { head: say.heads.network, width: 1.1, align: 'right' },
        { head: say.heads.mismatch, width: 1.2, align: 'right' },
        { head: say.heads.error, width: 1.2, align: 'right' },
      ],
      rows: computedRuns(runsOf(input, roles)).map(({ record, result: { counters } }) => [
        { text: record.tag, weight: 'semibold' as const },
        whole(counters.steps),
        whole(counters.rejected),
        whole(counters.evaluations),
        whole(counters.networkIterations),
        { text: scientific(counters.largestMismatch), markup: true },
        formatNumber(counters.largestErrorRatio, { decimals: 3 }),
      ]),
    }),
  ]
}
