import { paragraph } from '../../paper/text-block'
import { appendix, chapter, subsection } from '../../report-context'
import { small } from '../../theme'
import { computedRuns, runsOf } from '../../values/roles'
import type { Section } from '../section'
import { changeOverTable } from './change-over-table'
import { flickerTable } from './flicker-table'
import { generatorTable } from './generator-table'
import { modelsTable } from './models-table'
import { notices } from './notices'
import { openRanges } from './open-ranges'
import { peaksTable } from './peaks-table'
import { heatTable, protectionTable } from './protection-tables'
import { runningTable } from './running-table'
import { energyTable, startTable } from './start-tables'
import { supplyTable } from './supply-table'
import { voltageTable } from './voltage-tables'

/** Starts of all cases; voltages and running machines of the design cases. The others' are in an appendix. */
export const results: Section = (context) => {
  const { paper, input, words, width } = context
  const { results: say } = words
  const design = computedRuns(runsOf(input, ['design']))
  return [
    chapter(context, 'results', say.title),
    ...paragraph(paper, say.intro, { width }),
    subsection(context, 'results-starts', say.starts.title),
    ...startTable(context),
    subsection(context, 'results-change-overs', say.changeOvers.title),
    ...changeOverTable(context),
    subsection(context, 'results-voltages', say.voltages.title),
    ...paragraph(paper, say.voltages.note, { width, ...small, ink: 'soft' }),
    ...design.map((run) => voltageTable(context, run)),
    subsection(context, 'results-running', say.running.title),
    ...runningTable(context, ['design']),
    ...modelsTable(context),
    ...generatorTable(context),
    ...peaksTable(context),
    ...protectionTable(context),
    ...heatTable(context),
    ...flickerTable(context),
    subsection(context, 'results-ranges', say.ranges.title),
    ...openRanges(context),
    subsection(context, 'results-notices', say.notices.title),
    ...notices(context),
  ]
}

/** Voltages and running machines of all other cases, energies and supply of all. */
export const fullTables: Section = (context) => {
  const { paper, input, words, width } = context
  const { results: say } = words
  const others = computedRuns(runsOf(input, ['comparison', 'sensitivity']))
  return [
    appendix(context, 'tables', say.fullTables),
    subsection(context, 'tables-energy', say.starts.energy),
    energyTable(context),
    subsection(context, 'tables-supply', say.starts.power),
    supplyTable(context),
    subsection(context, 'tables-voltages', say.voltages.rest),
    ...paragraph(paper, say.voltages.note, { width, ...small, ink: 'soft' }),
    ...others.map((run) => voltageTable(context, run)),
    subsection(context, 'tables-running', say.running.rest),
    ...runningTable(context, ['comparison', 'sensitivity']),
  ]
}
