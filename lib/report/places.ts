import type { Place } from './paper/paper'

/** The part of a laid-out node that is read; boxes are relative to their parent. */
export interface LaidOutNode {
  props?: object
  box?: { left?: number; top?: number; width?: number; height?: number }
  children?: readonly LaidOutNode[]
}

/** Where every named node stands: on the first page that it occurs on, in points from the top left of that page. */
export const findPlaces = (layout: LaidOutNode): ReadonlyMap<string, Place> => {
  const places = new Map<string, Place>()
  const walk = (node: LaidOutNode, page: number, left: number, top: number) => {
    const { box, props } = node
    const [x, y] = [left + (box?.left ?? 0), top + (box?.top ?? 0)]
    const id = props && 'id' in props && typeof props.id === 'string' ? props.id : null
    if (id !== null && !places.has(id))
      places.set(id, { page, left: x, top: y, width: box?.width ?? 0, height: box?.height ?? 0 })
    for (const child of node.children ?? []) walk(child, page, x, y)
  }
  for (const [i, page] of (layout.children ?? []).entries())
    for (const child of page.children ?? []) walk(child, i + 1, 0, 0)
  return places
}
