import { lightInk } from './ink'
import type { Scene } from './scene'
import { fontFamily, sceneNodes } from './scene-nodes'

const escaped = (value: string): string =>
  value.replace(/&/g, '&amp;').replace(/</g, '&lt;').replace(/>/g, '&gt;').replace(/"/g, '&quot;')

const attribute = (name: string): string => name.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`)

const element = (tag: string, properties: Record<string, string | number>, text: string | null): string => {
  const attributes = Object.entries(properties)
    .map(([name, value]) => ` ${attribute(name)}="${escaped(String(value))}"`)
    .join('')
  return text === null ? `<${tag}${attributes}/>` : `<${tag}${attributes}>${escaped(text)}</${tag}>`
}

/** A scene as a stand-alone SVG file in the light colours, one element a line. */
export const sceneToSvg = (scene: Scene): string =>
  [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${scene.width}mm" height="${scene.height}mm" viewBox="0 0 ${scene.width} ${scene.height}" role="img" font-family="${escaped(fontFamily)}">`,
    `<title>${escaped(scene.title)}</title>`,
    `<desc>${escaped(scene.description)}</desc>`,
    element('rect', { width: scene.width, height: scene.height, fill: lightInk.sheet }, null),
    ...sceneNodes(scene, (ink) => lightInk[ink]).map((node) => element(node.tag, node.properties, node.text)),
    '</svg>',
    '',
  ].join('\n')
