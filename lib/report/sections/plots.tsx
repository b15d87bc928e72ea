import type { ReactElement } from 'react'
import type { CaseFigure } from '@/lib/drawing/case-figure'
import { currentPlot } from '@/lib/drawing/current-plot'
import { frequencyPlot } from '@/lib/drawing/frequency-plot'
import type { Scene } from '@/lib/drawing/scene'
import { mostSeries } from '@/lib/drawing/series-style'
import { speedPlot } from '@/lib/drawing/speed-plot'
import { timeCurrentPlot } from '@/lib/drawing/time-current-plot'
import { torqueSpeedPlot } from '@/lib/drawing/torque-speed-plot'
import { transientPlots } from '@/lib/drawing/transient-plots'
import { limitedBuses, voltagePlot } from '@/lib/drawing/voltage-plot'
import { caseSentence } from '@/lib/study/words/case-sentence'
import { caseOutcomeSentence } from '@/lib/study/words/outcome-words'
import { busTag, motorTag } from '@/lib/study/words/tags'
import { stack } from '../paper/block'
import { sceneBlock } from '../paper/scene-pdf'
import { paragraph, typedText } from '../paper/text-block'
import { chapter, type ReportContext, subsection } from '../report-context'
import { dense, pt, small } from '../theme'
import { type CaseRun, runsOf } from '../values/roles'
import type { Section } from './section'

const figure = (context: ReportContext, scene: Scene, words: string): ReactElement => {
  const { paper, width, numbers } = context
  const caption = `**${context.words.results.plots.figure(numbers.figure())}** ${words}`
  return stack(
    [sceneBlock(paper, scene, { width }), ...paragraph(paper, caption, { width, ...dense, above: 1, below: 9 })],
    { together: true },
  )
}

/** The place to look at first: that of the supply, then those that a limit names. */
const overview = (shown: CaseFigure): readonly string[] => {
  const named = shown.document.limits.flatMap(({ place }) => (place.kind === 'bus' ? [place.bus] : []))
  const limited = limitedBuses(shown)
  const rank = (id: string) => (id === shown.result.supply?.busId ? 0 : named.includes(id) ? 1 : 2)
  const depth = (id: string) => {
    const place = shown.result.places.find(({ busId }) => busId === id)
    return place ? place.deepest.voltage / place.nominal : 1
  }
  return limited.toSorted((a, b) => rank(a) - rank(b) || depth(a) - depth(b)).slice(0, mostSeries)
}

/** Buses that get a plot of their own with their limit lines: those that a limit names. */
const ownPlots = (shown: CaseFigure): readonly string[] => {
  const named = shown.document.limits.flatMap(({ place }) => (place.kind === 'bus' ? [place.bus] : []))
  return limitedBuses(shown).filter((id) => named.includes(id))
}

const plotsOf = (context: ReportContext, { record, result }: CaseRun): readonly ReactElement[] => {
  const { paper, input, words, width } = context
  const { document } = input
  const { plots: say } = words.results
  const head = [
    subsection(context, `plots-${record.id}`, record.tag),
    ...typedText(paper, `${caseSentence(record, document)}.`, { width, ...small, ink: 'soft' }),
  ]
  if (!result || result.series.time.length === 0) {
    const why = result ? caseOutcomeSentence(result.outcome, (id) => busTag(document, id)) : '–'
    return [...head, ...paragraph(paper, say.notComputed(why), { width })]
  }
  const shown: CaseFigure = { document, result, verdicts: input.result.verdicts }
  const size = { width: width / pt, height: 55 }
  const frequency = frequencyPlot(shown, { ...size, height: 46 })
  const started = result.motors.filter(({ start }) => start !== null).map(({ motorId }) => motorId)
  return [
    ...head,
    ...ownPlots(shown).map((id) =>
      figure(context, voltagePlot(shown, { ...size, busIds: [id] }), say.voltage(busTag(document, id))),
    ),
    figure(context, voltagePlot(shown, { ...size, busIds: overview(shown) }), say.places),
    ...(frequency ? [figure(context, frequency, say.frequency)] : []),
    figure(context, speedPlot(shown, { ...size, height: 46 }), say.speed),
    figure(context, currentPlot(shown, { ...size, height: 46 }), say.current),
    ...started.flatMap((motorId) => {
      const scene = timeCurrentPlot(shown, { ...size, height: 90, motorId })
      return scene === null ? [] : [figure(context, scene, words.protection.figure(motorTag(document, motorId)))]
    }),
    ...started.map((motorId) =>
      figure(context, torqueSpeedPlot(shown, { ...size, motorId }), say.torque(motorTag(document, motorId))),
    ),
    ...transientPlots(shown, { ...size, height: 46 }).map((scene, i) => figure(context, scene, say.transient[i] ?? '')),
  ]
}

/** The plots of each design case. */
export const plots: Section = (context) => {
  const { paper, input, words, width } = context
  const { plots: say } = words.results
  const runs = runsOf(input, ['design'])
  return [
    chapter(context, 'plots', say.title),
    ...paragraph(paper, runs.length === 0 ? say.none : say.intro, { width }),
    ...runs.flatMap((run) => plotsOf(context, run)),
  ]
}
