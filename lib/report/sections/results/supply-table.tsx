import type { ReactElement } from 'react'
import { formatNumber } from '@/lib/quantity/format-number'
import { dataTable, type Row } from '../../paper/data-table'
import type { ReportContext } from '../../report-context'
import { complexMega, dash, decimals } from '../../values/figures'
import { computedRuns, roles, runsOf } from '../../values/roles'

const ohms = ({ re, im }: { re: number; im: number }): string =>
  `${formatNumber(re, { decimals: 3 })} + j\u2009${formatNumber(im, { decimals: 3 })}`

/** What the supply delivers, with its voltage and impedance. */
export const supplyTable = ({ paper, input, words, width }: ReportContext): ReactElement => {
  const { powerHeads: heads } = words.results.starts
  const rows = roles.flatMap((role): readonly Row[] => {
    const runs = computedRuns(runsOf(input, [role]))
    if (runs.length === 0) return []
    return [
      { title: words.records.cases.roles[role] },
      ...runs.map(({ record, result: { supply } }) => [
        { text: record.tag, weight: 'semibold' as const },
        supply ? decimals(supply.emf / 1000, 3) : dash,
        supply ? ohms(supply.impedance) : dash,
        supply ? complexMega(supply.powerBefore) : dash,
        supply?.powerFirst ? complexMega(supply.powerFirst) : dash,
      ]),
    ]
  })
  return dataTable(paper, {
    width,
    columns: [
      { head: heads.case, width: 40, fixed: true },
      { head: heads.emf, width: 0.8, align: 'right' },
      { head: heads.impedance, width: 1.2, align: 'right' },
      { head: heads.before, width: 1.2, align: 'right' },
      { head: heads.first, width: 1.2, align: 'right' },
    ],
    rows,
  })
}
