import type { ReactElement } from 'react'
import { type ModelRow, modelComparison } from '@/lib/study/model-comparison'
import { modelSentence, modelWords } from '@/lib/study/words/model-words'
import { dataTable, type Row } from '../../paper/data-table'
import { paragraph } from '../../paper/text-block'
import { type ReportContext, subsection } from '../../report-context'
import { current, dash, decimals, percent, seconds } from '../../values/figures'
import { computedRuns, roles, runsOf } from '../../values/roles'

const printed: Record<ModelRow['quantity'], (value: number) => string> = {
  time: (value) => `${seconds(value, 3)} s`,
  voltage: (value) => `${decimals(value, 1)} V`,
  current: (value) => `${current(value)} A`,
  torque: (value) => `${decimals(value / 1e3, 3)} kN·m`,
  part: (value) => `${percent(value, 1)} %`,
}

const shown = (value: number | null, quantity: ModelRow['quantity']): string =>
  value === null ? dash : printed[quantity](value)

/** Cases by another than the quasi-static model: what that model gives, beside the quasi-static figure; nothing where there are none. */
export const modelsTable = (context: ReportContext): readonly ReactElement[] => {
  const { paper, input, words, width } = context
  const say = words.results.models
  const runs = computedRuns(runsOf(input, roles)).filter(({ result }) => result.model !== 'quasi-static')
  if (runs.length === 0) return []
  const right = 'right' as const
  return [
    subsection(context, 'results-models', say.title),
    ...paragraph(paper, say.intro, { width }),
    ...runs.flatMap(({ record, result }) => [
      ...paragraph(paper, `**${record.tag}** ${modelSentence(result)}`, { width }),
      dataTable(paper, {
        width,
        columns: [
          { head: say.heads.figure, width: 2.4 },
          { head: modelWords[result.model], width: 1, align: right },
          { head: modelWords['quasi-static'], width: 1, align: right },
          { head: say.heads.difference, width: 0.8, align: right },
        ],
        rows: modelComparison(input.document, result).map(
          ({ name, quantity, own, steady }): Row => [
            name,
            shown(own, quantity),
            shown(steady, quantity),
            own === null || steady === null || steady === 0 ? dash : `${percent(own / steady - 1, 1)} %`,
          ],
        ),
      }),
    ]),
  ]
}
