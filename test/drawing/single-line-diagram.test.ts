import { readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, test } from 'vitest'
import { textBox } from '@/lib/drawing/box'
import type { RectItem, Scene } from '@/lib/drawing/scene'
import { sceneToSvg } from '@/lib/drawing/scene-to-svg'
import { type DiagramOptions, singleLineDiagram, singleLineSheets } from '@/lib/drawing/single-line-diagram'
import { type StudyDocument, studyDocument } from '@/lib/study/document/study-document'
import { largePlant } from '../support/large-plant'
import { reportDocument } from '../support/report-document'
import { overlappingTexts, runsThrough, segments, texts, textsOutside } from './support/scene-geometry'

const demo = studyDocument.parse(
  JSON.parse(readFileSync(path.resolve(import.meta.dirname, '../../lib/cli/examples/velmoor.json'), 'utf8')),
)

const drawn = (document: StudyDocument, options: DiagramOptions = {}): Scene => {
  const scene = singleLineDiagram(document, options)
  if (!scene) throw new Error('nothing was drawn')
  return scene
}

const sheets = (scene: Scene): readonly RectItem[] => scene.items.filter((item) => item.kind === 'rect')

/** Long level wires and upright bars; the strokes of symbols are shorter. */
const wires = (scene: Scene) =>
  segments(scene).filter(({ x1, y1, x2, y2, width }) => y1 === y2 && width === 0.3 && Math.abs(x2 - x1) > 2)
const bars = (scene: Scene) => segments(scene).filter(({ width }) => width === 0.9)

const plants: Record<string, StudyDocument> = {
  'the demo': demo,
  'a plant of 5 buses': reportDocument,
  'a plant of 30 buses with loops': largePlant(4, 6),
  'a plant of 62 buses with loops': largePlant(6, 9),
}

describe.each(Object.keys(plants))('the single-line diagram of %s', (name) => {
  const document = plants[name]!

  test.each(['full', 'brief'] as const)('has no label over another, %s', (detail) => {
    const scene = drawn(document, { detail })
    expect(overlappingTexts(scene)).toEqual([])
    expect(textsOutside(scene)).toEqual([])
  })

  test('has no wire through a label or a value sheet', () => {
    const scene = drawn(document)
    const boxes = [...texts(scene).map(textBox), ...sheets(scene)]
    const through = wires(scene).filter((wire) => boxes.some((box) => runsThrough(wire, box)))
    expect(through).toEqual([])
  })

  test('has no wire across a bus bar: wires end on bars', () => {
    const scene = drawn(document)
    const across = wires(scene).filter((wire) =>
      bars(scene).some((bar) => {
        const [left, right] = [Math.min(wire.x1, wire.x2), Math.max(wire.x1, wire.x2)]
        const level = wire.y1 > Math.min(bar.y1, bar.y2) && wire.y1 < Math.max(bar.y1, bar.y2)
        return level && left < bar.x1 - 0.1 && right > bar.x1 + 0.1
      }),
    )
    expect(across).toEqual([])
  })

  test('has no value sheet over another', () => {
    const all = sheets(drawn(document))
    const clashes = all.flatMap((a, i) =>
      all
        .slice(i + 1)
        .filter((b) => a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height),
    )
    expect(clashes).toEqual([])
  })

  test('names every bus, branch and device', () => {
    const words = texts(drawn(document))
      .map((item) => item.text)
      .join('\n')
    const { buses, transformers, lines, motors, loads, capacitors } = document.plant
    for (const { tag } of [...buses, ...transformers, ...lines, ...motors, ...loads, ...capacitors])
      expect(words).toContain(tag)
  })

  test('has its value sheets in columns: no more left edges than there are columns', () => {
    const scene = drawn(document)
    const edges = new Set(sheets(scene).map((sheet) => sheet.x))
    const columns = new Set(bars(scene).map((bar) => bar.x1)).size + 1
    expect(edges.size).toBeLessThanOrEqual(columns)
  })
})

describe('the single-line diagram', () => {
  test('is drawn as it was', async () => {
    await expect(sceneToSvg(drawn(reportDocument))).toMatchFileSnapshot('../golden/drawing/single-line-diagram.svg')
    await expect(sceneToSvg(drawn(demo))).toMatchFileSnapshot('../golden/drawing/single-line-diagram-velmoor.svg')
  })

  test('marks an induction generator as one', () => {
    const letters = (document: StudyDocument) =>
      texts(drawn(document))
        .filter(({ text }) => text === 'G' || text === 'M')
        .map(({ text }) => text)
    const [first, ...others] = demo.plant.motors
    const changed = {
      ...demo,
      plant: { ...demo.plant, motors: [{ ...first!, role: 'generator' as const }, ...others] },
    }
    expect(letters(demo)).not.toContain('G')
    expect(letters(changed).filter((letter) => letter === 'G').length).toBe(1)
    expect(letters(changed).length).toBe(letters(demo).length)
  })

  test('starts at the source on the left and flows to the right', () => {
    const at = (tag: string) => texts(drawn(demo)).find((item) => item.text === tag && item.weight === 'semibold')!.x
    expect(at('PCC')).toBeLessThan(at('S33'))
    expect(at('S33')).toBeLessThan(at('MV'))
    expect(at('MV')).toBeLessThan(at('LV'))
    expect(at('LV')).toBeLessThan(at('B1'))
  })

  test('of a case says what starts, what runs and which capacitors are in', () => {
    const words = texts(drawn(reportDocument, { caseId: 'k-at' })).map((item) => item.text)
    expect(words).toContain('starts: AT 65 %')
    expect(words).toContain('runs before the start')
    expect(words).toContain('in service')
  })

  test('tells a branch that closes a loop at both of its ends', () => {
    const words = texts(drawn(largePlant(4, 6))).map((item) => item.text)
    expect(words).toContain('TIE-B2 to B2')
    expect(words).toContain('TIE-B2 to B1')
    expect(words).toContain('see B1')
  })

  test('draws buses that the supply does not reach, so that nobody misses them', () => {
    const { plant } = reportDocument
    const cut = {
      ...reportDocument,
      plant: { ...plant, transformers: plant.transformers.filter(({ id }) => id !== 't1') },
    }
    const words = texts(drawn(cut)).map((item) => item.text)
    for (const tag of ['PCC', 'MV', 'LV', 'M1']) expect(words).toContain(tag)
    expect(words.some((text) => text.includes('no way to the supply'))).toBe(true)
  })

  test('of a large plant is parted into sheets that show every bus bar once and name where they go on', () => {
    const document = largePlant(6, 9)
    const scenes = singleLineSheets(document, { mostRows: 15 })
    expect(scenes.length).toBeGreaterThan(3)
    expect(scenes.flatMap(bars)).toHaveLength(document.plant.buses.length)
    const words = scenes.map((scene) => texts(scene).map((item) => item.text))
    expect(words[0]).toContain('C-B1 to B1')
    expect(words.slice(1).every((one) => one.some((text) => text.startsWith('from ')))).toBe(true)
    for (const scene of scenes) {
      expect(overlappingTexts(scene)).toEqual([])
      expect(textsOutside(scene)).toEqual([])
    }
  })

  test('stays on one sheet while its rows fit', () => {
    expect(singleLineSheets(demo, { mostRows: 30 })).toHaveLength(1)
  })

  test('is not drawn without a supply at a bus', () => {
    expect(singleLineDiagram({ ...reportDocument, plant: { ...reportDocument.plant, supplies: [] } })).toBeNull()
  })
})
