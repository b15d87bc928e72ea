import type { LiteElement } from 'mathjax-full/js/adaptors/lite/Element.js'
import { liteAdaptor } from 'mathjax-full/js/adaptors/liteAdaptor.js'
import { RegisterHTMLHandler } from 'mathjax-full/js/handlers/html.js'
import { TeX } from 'mathjax-full/js/input/tex.js'
import 'mathjax-full/js/input/tex/ams/AmsConfiguration.js'
import { mathjax } from 'mathjax-full/js/mathjax.js'
import { SVG } from 'mathjax-full/js/output/svg.js'
import { plainPath } from './plain-path'

/** A shape of a formula with the matrix that places it, in units of the view box. */
export interface FormulaShape {
  d: string
  matrix: readonly [number, number, number, number, number, number]
  /** Part of the view box that shows it: x, y, width, height; null for all. Stretched rules are longer than what shows. */
  clip: Clip | null
}

type Clip = readonly [number, number, number, number]

/** A formula as filled shapes; sizes in ex of the text around it. */
export interface Formula {
  shapes: readonly FormulaShape[]
  viewBox: readonly [number, number, number, number]
  /** Width and height in ex. */
  width: number
  height: number
}

const adaptor = liteAdaptor()
let converter: ReturnType<typeof mathjax.document> | null = null

const convert = (tex: string) => {
  if (!converter) {
    RegisterHTMLHandler(adaptor)
    converter = mathjax.document('', {
      InputJax: new TeX({ packages: ['base', 'ams'] }),
      OutputJax: new SVG({ fontCache: 'none' }),
    })
  }
  return converter.convert(tex, { display: true })
}

type Matrix = FormulaShape['matrix']

const multiply = ([a, b, c, d, e, f]: Matrix, [p, q, r, s, t, u]: Matrix): Matrix => [
  a * p + c * q,
  b * p + d * q,
  a * r + c * s,
  b * r + d * s,
  a * t + c * u + e,
  b * t + d * u + f,
]

const numbers = (text: string): number[] =>
  text
    .split(/[\s,]+/)
    .filter(Boolean)
    .map(Number)

/** The matrix of a `transform` attribute; only what the converter writes is read. */
const transformOf = (text: string): Matrix => {
  let matrix: Matrix = [1, 0, 0, 1, 0, 0]
  for (const [, name, list = ''] of text.matchAll(/(\w+)\(([^)]*)\)/g)) {
    const [a = 0, b] = numbers(list)
    if (name === 'translate') matrix = multiply(matrix, [1, 0, 0, 1, a, b ?? 0])
    else if (name === 'scale') matrix = multiply(matrix, [a, 0, 0, b ?? a, 0, 0])
    else throw new Error(`A formula uses the transform ${name}, which is not read.`)
  }
  return matrix
}

const attribute = (node: LiteElement, name: string): string => String(adaptor.getAttribute(node, name) ?? '')

const boxOf = (node: LiteElement): readonly [number, number, number, number] => {
  const number = (name: string) => Number(attribute(node, name) || 0)
  return [number('x'), number('y'), number('width'), number('height')]
}

const nestedMatrix = (node: LiteElement): Matrix => {
  const [vx = 0, vy = 0, vw = 1, vh = 1] = numbers(attribute(node, 'viewBox'))
  const [x, y, width, height] = boxOf(node)
  return multiply([1, 0, 0, 1, x, y], multiply([width / vw, 0, 0, height / vh, 0, 0], [1, 0, 0, 1, -vx, -vy]))
}

/** A box under a matrix that does not turn it. */
const mapped = ([a, , , d, e, f]: Matrix, [x, y, width, height]: Clip): Clip => {
  const [left, right] = [a * x + e, a * (x + width) + e].sort((p, q) => p - q)
  const [top, bottom] = [d * y + f, d * (y + height) + f].sort((p, q) => p - q)
  return [left!, top!, right! - left!, bottom! - top!]
}

const isElement = (node: unknown): node is LiteElement =>
  typeof node === 'object' && node !== null && 'attributes' in node && 'children' in node

const collect = (node: LiteElement, matrix: Matrix, clip: Clip | null, shapes: FormulaShape[]): void => {
  const own = multiply(matrix, transformOf(attribute(node, 'transform')))
  const kind = adaptor.kind(node)
  if (kind === 'path') shapes.push({ d: plainPath(attribute(node, 'd')), matrix: own, clip })
  if (kind === 'rect') {
    const [x, y, width, height] = boxOf(node)
    shapes.push({ d: `M${x} ${y}h${width}v${height}h${-width}Z`, matrix: own, clip })
  }
  const nested = kind === 'svg'
  const inner = nested ? multiply(own, nestedMatrix(node)) : own
  const shown = nested ? mapped(own, boxOf(node)) : clip
  for (const child of node.children) if (isElement(child)) collect(child, inner, shown, shapes)
}

const known = new Map<string, Formula>()

/** Typesets a formula once a process; throws when the source is not valid TeX. */
export const typeset = (tex: string): Formula => {
  const found = known.get(tex)
  if (found) return found
  const container = convert(tex)
  const svg = adaptor.firstChild(container)
  if (!isElement(svg)) throw new Error('The converter gave no picture.')
  if (adaptor.outerHTML(svg).includes('data-mjx-error')) throw new Error(`A formula cannot be typeset: ${tex}`)
  const [x = 0, y = 0, w = 0, h = 0] = numbers(attribute(svg, 'viewBox'))
  const shapes: FormulaShape[] = []
  for (const child of svg.children) if (isElement(child)) collect(child, [1, 0, 0, 1, 0, 0], null, shapes)
  const ex = (name: string) => Number.parseFloat(attribute(svg, name))
  const formula: Formula = { shapes, viewBox: [x, y, w, h], width: ex('width'), height: ex('height') }
  known.set(tex, formula)
  return formula
}
