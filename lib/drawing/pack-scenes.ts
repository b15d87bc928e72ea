import type { Scene } from './scene'

/** A scene and where its top left corner stands on a sheet, in mm. */
export interface PlacedScene {
  scene: Scene
  x: number
  y: number
}

/**
 * Puts scenes on as few sheets of a size (mm) as their order allows: side by side, then in a row below, then on the
 * next sheet. A scene larger than the sheet has one of its own.
 *
 * @param gap least distance between two scenes, mm
 */
export const packScenes = (
  scenes: readonly Scene[],
  size: { width: number; height: number },
  gap: number,
): readonly (readonly PlacedScene[])[] => {
  const sheets: PlacedScene[][] = []
  let sheet: PlacedScene[] = []
  let [x, y, rowHeight] = [0, 0, 0]
  for (const scene of scenes) {
    if (x > 0 && x + scene.width > size.width) [x, y, rowHeight] = [0, y + rowHeight + gap, 0]
    if (sheet.length > 0 && y + scene.height > size.height) {
      sheets.push(sheet)
      sheet = []
      ;[x, y, rowHeight] = [0, 0, 0]
    }
    sheet.push({ scene, x, y })
    x += scene.width + gap
    rowHeight = Math.max(rowHeight, scene.height)
  }
  if (sheet.length > 0) sheets.push(sheet)
  return sheets
}
