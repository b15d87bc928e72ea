import type { StudyDocument } from '@/lib/study/document/study-document'
import { diagramGrid } from './diagram/diagram-grid'
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

/** Null while there is nothing to draw: a diagram starts at a supply. */
export const singleLineDiagram = (document: StudyDocument, options: DiagramOptions = {}): Scene | null => {
  const one = document.cases.find((each) => each.id === options.caseId)
  const supplyId = options.supplyId ?? one?.supply
  const supply = document.plant.supplies.find((each) => each.id === supplyId) ?? document.plant.supplies[0]
  const known = supply && document.plant.buses.some((bus) => bus.id === supply.bus)
  if (!supply || !known) return null
  const detail = options.detail ?? 'full'
  const { width, height, items } = placeGrid(diagramGrid({ document, supply, one, detail }), detail)
  const { plant } = document
  const count = (n: number, noun: string) => `${n} ${noun}${n === 1 ? '' : 's'}`
  return {
    width: mm(width),
    height: mm(height),
    title: `Single-line diagram, supply condition ${supply.tag}`,
    description: [
      count(plant.buses.length, 'bus').replace('buss', 'buse'),
      count(plant.transformers.length, 'transformer'),
      count(plant.lines.length, 'line'),
      count(plant.motors.length, 'motor'),
      count(plant.loads.length, 'static load'),
      count(plant.capacitors.length, 'capacitor'),
    ].join(', '),
    items,
  }
}
