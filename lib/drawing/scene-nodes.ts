import type { Ink } from './ink'
import type { Scene, SceneItem } from './scene'

/** One SVG element in the spelling of React properties, without children other than text. */
export interface SvgNode {
  tag: 'path' | 'rect' | 'text'
  properties: Record<string, string | number>
  text: string | null
}

export const fontFamily = "'Source Sans 3', 'Source Sans Pro', 'Noto Sans', sans-serif"

const nodeOf = (item: SceneItem, colour: (ink: Ink) => string): SvgNode => {
  const paint = (ink: Ink | null) => (ink === null ? 'none' : colour(ink))
  switch (item.kind) {
    case 'path':
      return {
        tag: 'path',
        text: null,
        properties: {
          d: item.d,
          fill: paint(item.fill),
          ...(item.stroke && {
            stroke: paint(item.stroke),
            strokeWidth: item.width,
            strokeLinejoin: 'round',
            ...(item.dash.length > 0 && { strokeDasharray: item.dash.join(' ') }),
          }),
        },
      }
    case 'rect':
      return {
        tag: 'rect',
        text: null,
        properties: {
          x: item.x,
          y: item.y,
          width: item.width,
          height: item.height,
          fill: paint(item.fill),
          ...(item.stroke && { stroke: paint(item.stroke), strokeWidth: item.strokeWidth }),
        },
      }
    case 'text':
      return {
        tag: 'text',
        text: item.text,
        properties: {
          x: item.x,
          y: item.y,
          fontSize: item.size,
          fill: paint(item.ink),
          ...(item.anchor !== 'start' && { textAnchor: item.anchor }),
          ...(item.weight === 'semibold' && { fontWeight: 600 }),
        },
      }
  }
}

/** The elements of a scene with each ink turned into a colour. */
export const sceneNodes = (scene: Scene, colour: (ink: Ink) => string): readonly SvgNode[] =>
  scene.items.map((item) => nodeOf(item, colour))
