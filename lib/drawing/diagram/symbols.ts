import { line, mm, path, type SceneItem, text } from '../scene'

/*
 * Graphical symbols, drawn by this project after the descriptions in IEC 60617: two linked circles for a transformer,
 * sealing ends for a cable, a circle with a letter for a machine, two plates for a capacitor, an arrow for a load.
 * Each lies on the line at height y with its left end at x and is `symbolWidth` long.
 */

export const symbolWidth = 10
const stroke = { stroke: 'ink', width: 0.3 } as const
const middle = symbolWidth / 2

const circle = (x: number, y: number, r: number): string =>
  `M${mm(x - r)} ${mm(y)}a${r} ${r} 0 1 0 ${mm(2 * r)} 0a${r} ${r} 0 1 0 ${mm(-2 * r)} 0Z`

const wire = (from: number, to: number, y: number): string =>
  line([
    [from, y],
    [to, y],
  ])

export const transformerSymbol = (x: number, y: number): readonly SceneItem[] => {
  const r = 2
  const [left, right] = [x + middle - 1.25, x + middle + 1.25]
  return [
    path(wire(x, left - r, y) + wire(right + r, x + symbolWidth, y), stroke),
    path(circle(left, y, r) + circle(right, y, r), stroke),
  ]
}

export const lineSymbol = (x: number, y: number, kind: 'cable' | 'overhead'): readonly SceneItem[] => {
  const end = (from: number, to: number) =>
    line(
      [
        [from, y - 1],
        [from, y + 1],
        [to, y],
      ],
      true,
    )
  const ends = kind === 'cable' ? end(x + 1.4, x + 3) + end(x + symbolWidth - 1.4, x + symbolWidth - 3) : ''
  const mast = (at: number) =>
    line([
      [at - 0.9, y + 0.9],
      [at + 0.9, y - 0.9],
    ])
  const masts = kind === 'overhead' ? mast(x + middle - 1.6) + mast(x + middle) + mast(x + middle + 1.6) : ''
  return [
    path(wire(x, x + symbolWidth, y), stroke),
    ...(ends ? [path(ends, { fill: 'ink' })] : []),
    ...(masts ? [path(masts, { ...stroke, width: 0.2 })] : []),
  ]
}

/** A machine: M for a motor, G for a generator; emphasised where it starts. */
export const motorSymbol = (x: number, y: number, emphasis: boolean, letter: 'M' | 'G' = 'M'): readonly SceneItem[] => {
  const r = 3
  const at = x + symbolWidth - r - 0.6
  return [
    path(wire(x, at - r, y), stroke),
    path(circle(at, y, r), { ...stroke, width: emphasis ? 0.6 : 0.3, fill: 'sheet' }),
    text(at, y + 0.2, letter, { size: 2.8, anchor: 'middle', weight: 'semibold' }),
    text(at, y + 2.2, '3~', { size: 1.9, anchor: 'middle' }),
  ]
}

export const capacitorSymbol = (x: number, y: number): readonly SceneItem[] => {
  const plate = (at: number) =>
    line([
      [at, y - 1.7],
      [at, y + 1.7],
    ])
  const earth = [1.3, 0.8, 0.35]
    .map((half, i) =>
      line([
        [x + 8 + i * 0.6, y - half],
        [x + 8 + i * 0.6, y + half],
      ]),
    )
    .join('')
  return [
    path(wire(x, x + 4.6, y) + wire(x + 5.8, x + 8, y) + earth, stroke),
    path(plate(x + 4.6) + plate(x + 5.8), { ...stroke, width: 0.45 }),
  ]
}

export const loadSymbol = (x: number, y: number): readonly SceneItem[] => [
  path(wire(x, x + 7.4, y), stroke),
  path(
    line(
      [
        [x + 7, y - 1.3],
        [x + 9.4, y],
        [x + 7, y + 1.3],
      ],
      true,
    ),
    { fill: 'ink' },
  ),
]

/** End of a branch that goes on at another bus. */
export const tieSymbol = (x: number, y: number): readonly SceneItem[] => [
  path(wire(x, x + 1.6, y), stroke),
  path(
    line(
      [
        [x + 1.6, y - 1.4],
        [x + 3.4, y - 1.4],
        [x + 4.8, y],
        [x + 3.4, y + 1.4],
        [x + 1.6, y + 1.4],
      ],
      true,
    ),
    {
      ...stroke,
      width: 0.2,
      fill: 'sheet',
    },
  ),
]

/** Beginning of a sheet that goes on from another bus. */
export const comingSymbol = (x: number, y: number): readonly SceneItem[] => [
  path(
    line(
      [
        [x, y - 1.4],
        [x + 1.8, y - 1.4],
        [x + 3.2, y],
        [x + 1.8, y + 1.4],
        [x, y + 1.4],
      ],
      true,
    ),
    { ...stroke, width: 0.2, fill: 'sheet' },
  ),
  path(wire(x + 3.2, x + symbolWidth, y), stroke),
]

/** A generator that supplies the plant: a circle with its letter. */
export const generatorSymbol = (x: number, y: number): readonly SceneItem[] => {
  const r = 3
  const at = x + r
  return [
    path(wire(at + r, x + symbolWidth, y), stroke),
    path(circle(at, y, r), stroke),
    text(at, y + 0.2, 'G', { size: 2.8, anchor: 'middle', weight: 'semibold' }),
    text(at, y + 2.2, '3~', { size: 1.9, anchor: 'middle' }),
  ]
}

/** The supply: a source behind its impedance. */
export const sourceSymbol = (x: number, y: number): readonly SceneItem[] => {
  const r = 3
  const at = x + r
  const wave = `M${mm(at - 1.6)} ${mm(y)}q0.8 -2 1.6 0t1.6 0`
  return [
    path(wire(at + r, x + symbolWidth, y), stroke),
    path(circle(at, y, r), stroke),
    path(wave, { ...stroke, width: 0.25 }),
  ]
}
