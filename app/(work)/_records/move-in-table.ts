import type { KeyboardEvent } from 'react'

const steps: Record<string, readonly [number, number]> = {
  ArrowUp: [-1, 0],
  ArrowDown: [1, 0],
  ArrowLeft: [0, -1],
  ArrowRight: [0, 1],
}

/** Arrow keys go from cell to cell, over those that cannot be typed into. */
export const moveInTable = (event: KeyboardEvent<HTMLElement>): void => {
  const step = steps[event.key]
  const cell = event.currentTarget.closest('td,th')
  const table = cell?.closest('table')
  if (
    !step ||
    !(cell instanceof HTMLTableCellElement) ||
    !(cell.parentElement instanceof HTMLTableRowElement) ||
    !table
  )
    return
  event.preventDefault()
  let row = cell.parentElement.rowIndex
  let column = cell.cellIndex
  for (;;) {
    row += step[0]
    column += step[1]
    const next = table.rows[row]?.cells[column]
    if (!next) return
    const target = next.querySelector<HTMLElement>('[data-cell]')
    if (!target) continue
    target.focus()
    return
  }
}
