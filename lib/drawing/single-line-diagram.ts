import type { StudyDocument } from '@/lib/study/document/study-document'
import { diagramGrid, type GridContext } from './diagram/diagram-grid'
import { diagramSheets } from './diagram/diagram-sheets'
import { networkTrees } from './diagram/network-tree'
import { placeGrid } from './diagram/place-grid'
import type { Detail } from './diagram/value-sheet'
import { mm, type Scene } from './scene'

export interface DiagramOptions {
  /** Supply condition drawn at the source; that of the case, else the first of the records. */
  supplyId?: string
  /** Case whose switching is told beside motors and capacitors; the records alone when absent. */
  caseId?: string
  /** `full` gives every device a framed sheet of values; `brief` one line, for plants with many rows. */
  detail?: Detail
}

const count = (n: number, one: string, many = `${one}s`) => `${n} ${n === 1 ? one : many}`

const inWords = ({ plant }: StudyDocument): string =>
  [
    count(plant.buses.length, 'bus', 'buses'),
    count(plant.transformers.length, 'transformer'),
    count(plant.lines.length, 'line'),
    count(plant.motors.length, 'motor'),
    count(plant.loads.length, 'static load'),
    count(plant.capacitors.length, 'capacitor'),
  ].join(', ')

/**
 * The plant as single-line diagrams of at most so many rows each: the first begins at the source, the others go on from a
 * bus of an earlier one. Empty while there is nothing to draw: a diagram starts at a supply.
 */
export const singleLineSheets = (
  document: StudyDocument,
  { mostRows, ...options }: DiagramOptions & { mostRows: number },
): readonly Scene[] => {
  const one = document.cases.find((each) => each.id === options.caseId)
  const supplyId = options.supplyId ?? one?.supply
  const supply = document.plant.supplies.find((each) => each.id === supplyId) ?? document.plant.supplies[0]
  if (!supply || !document.plant.buses.some((bus) => bus.id === supply.bus)) return []
  const detail = options.detail ?? 'full'
  const context: GridContext = { document, supply, one, detail }
  return diagramSheets(networkTrees(document.plant, supply.bus), mostRows).map((sheet) => {
    const { width, height, items } = placeGrid(diagramGrid(context, sheet), detail)
    const part = sheet.from === null ? '' : `, ${sheet.trees.map(({ bus }) => bus.tag).join(', ')}`
    const title = `Single-line diagram, supply condition ${supply.tag}${part}`
    return { width: mm(width), height: mm(height), title, description: inWords(document), items }
  })
}

/** The whole plant as one single-line diagram; null while there is nothing to draw. */
export const singleLineDiagram = (document: StudyDocument, options: DiagramOptions = {}): Scene | null =>
  singleLineSheets(document, { ...options, mostRows: Number.POSITIVE_INFINITY })[0] ?? null
