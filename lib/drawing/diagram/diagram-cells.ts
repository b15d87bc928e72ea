import type { SceneItem } from '../scene'
import type { BusLabel } from './bus-label'
import type { ValueSheet } from './value-sheet'

/** A symbol with its value sheet in one row of one column; `through` where the line goes on to the next bus. */
export interface Cell {
  depth: number
  row: number
  symbol: (x: number, y: number) => readonly SceneItem[]
  sheet: ValueSheet
  through: boolean
}

export interface Bar {
  depth: number
  firstRow: number
  lastRow: number
  label: BusLabel
}

/** A diagram as cells and bars on a grid, before any millimetre is known. */
export interface DiagramGrid {
  cells: readonly Cell[]
  bars: readonly Bar[]
  rows: number
}
