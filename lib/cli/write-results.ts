import { writeFile } from 'node:fs/promises'
import path from 'node:path'
import type { CaseFigure } from '../drawing/case-figure'
import { currentPlot } from '../drawing/current-plot'
import type { Scene } from '../drawing/scene'
import { sceneToSvg } from '../drawing/scene-to-svg'
import { singleLineDiagram } from '../drawing/single-line-diagram'
import { speedPlot } from '../drawing/speed-plot'
import { torqueSpeedPlot } from '../drawing/torque-speed-plot'
import { limitedBuses, voltagePlot } from '../drawing/voltage-plot'
import type { StudyResult } from '../engine/study-run'
import { resultsCsv, seriesCsv } from '../exchange/results-csv'
import { resultsJson } from '../exchange/results-json'
import type { StudyDocument } from '../study/document/study-document'
import { summarise } from '../study/summary'

interface OutputFile {
  name: string
  text: string
}

const svg = (name: string, scene: Scene): OutputFile => ({ name: `${name}.svg`, text: sceneToSvg(scene) })

/** The figures of one case: voltage at each bus with a limit, speed, current, and torque against speed of each motor started. */
const plotsOf = (figure: CaseFigure): OutputFile[] => {
  const { caseId, motors, series } = figure.result
  if (series.time.length === 0) return []
  return [
    ...limitedBuses(figure).map((id) => svg(`${caseId}-voltage-${id}`, voltagePlot(figure, { busIds: [id] }))),
    svg(`${caseId}-speed`, speedPlot(figure)),
    svg(`${caseId}-current`, currentPlot(figure)),
    ...motors
      .filter(({ start }) => start !== null)
      .map(({ motorId }) => svg(`${caseId}-torque-${motorId}`, torqueSpeedPlot(figure, { motorId }))),
  ]
}

const filesOf = (document: StudyDocument, result: StudyResult): OutputFile[] => {
  const summary = summarise(result)
  const diagram = singleLineDiagram(document)
  return [
    { name: 'results.json', text: `${resultsJson(document, summary)}\n` },
    ...resultsCsv(document, summary),
    ...(diagram ? [svg('single-line-diagram', diagram)] : []),
    ...result.cases.flatMap((one) => [
      seriesCsv(document, one.caseId, one.series),
      ...plotsOf({ document, result: one, verdicts: result.verdicts }),
    ]),
  ]
}

/** Writes results (JSON, CSV) and plots (SVG) of a computed study into a folder; returns the names written. */
export async function writeResults(folder: string, document: StudyDocument, result: StudyResult): Promise<string[]> {
  const files = filesOf(document, result)
  for (const { name, text } of files) await writeFile(path.join(folder, name), text)
  return files.map(({ name }) => name)
}
