import fs from 'node:fs'
import { PDFArray, PDFDict, PDFDocument, PDFName, type PDFObject, PDFRef, PDFString } from '@cantoo/pdf-lib'
import { beforeAll, describe, expect, test } from 'vitest'
import { judgeStudy } from '@/lib/engine/run-study'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { studyRunInput } from '@/lib/study/to-engine/study-run-input'
import { second } from '@/lib/units/si'
import { example } from '../../study/support/examples'
import { reportFile, reportInput } from '../support/demo-report'
import { pdfTool } from '../support/pdf-tool'
import { overlaps, textBoxes } from '../support/text-boxes'
import { worksStudy } from '../support/works-study'

/** Boards × motors a board, how many are started, and how weak the supply is. */
const studies: Record<string, () => StudyDocument> = {
  'the station of the demo': () => example('velmoor'),
  'one motor behind one transformer': () => example('one-motor'),
  'a supply on which no motor breaks away': () =>
    worksStudy({
      boards: 2,
      motorsPerBoard: 2,
      started: 2,
      level: '60 MVA',
      breakaway: '4300 N·m',
      constantPower: 0.4,
    }),
  'a network that has no solution': () =>
    worksStudy({
      boards: 6,
      motorsPerBoard: 1,
      started: 2,
      level: '7 MVA',
      breakaway: '300 N·m',
      constantPower: 1,
    }),
  '42 motors on 58 buses with names of sixty letters': () =>
    worksStudy({
      boards: 14,
      motorsPerBoard: 3,
      started: 12,
      level: '250 MVA',
      breakaway: '300 N·m',
      constantPower: 0.4,
    }),
  'tables of 400 rows': () =>
    worksStudy({
      boards: 200,
      motorsPerBoard: 1,
      started: 1,
      level: '2500 MVA',
      breakaway: '300 N·m',
      constantPower: 0.4,
    }),
}

/** Where the internal links of a PDF lead: names and pages, as written in the annotations. */
async function brokenLinks(file: string): Promise<readonly string[]> {
  const pdf = await PDFDocument.load(fs.readFileSync(file), { updateMetadata: false })
  const pages = new Set(pdf.getPages().map((page) => page.ref.toString()))
  const names = new Map<string, PDFObject>()
  const collect = (node: PDFObject | undefined): void => {
    if (!(node instanceof PDFDict)) return
    const kids = node.lookup(PDFName.of('Kids'))
    if (kids instanceof PDFArray) for (let i = 0; i < kids.size(); i++) collect(kids.lookup(i))
    const pairs = node.lookup(PDFName.of('Names'))
    if (pairs instanceof PDFArray)
      for (let i = 0; i + 1 < pairs.size(); i += 2) {
        const key = pairs.lookup(i)
        if (key instanceof PDFString) names.set(key.decodeText(), pairs.lookup(i + 1)!)
      }
  }
  const tree = pdf.catalog.lookup(PDFName.of('Names'))
  if (tree instanceof PDFDict) collect(tree.lookup(PDFName.of('Dests')))
  const leads = (target: PDFObject | undefined): boolean => {
    if (target instanceof PDFDict) return leads(target.lookup(PDFName.of('D')))
    if (target instanceof PDFString) return leads(names.get(target.decodeText()))
    if (!(target instanceof PDFArray)) return false
    const page = target.get(0)
    return page instanceof PDFRef && pages.has(page.toString())
  }
  const broken: string[] = []
  let found = 0
  for (const [i, page] of pdf.getPages().entries()) {
    const annotations = page.node.Annots()
    for (let k = 0; annotations && k < annotations.size(); k++) {
      const each = annotations.lookup(k)
      if (!(each instanceof PDFDict) || each.lookup(PDFName.of('Subtype')) !== PDFName.of('Link')) continue
      found++
      const action = each.lookup(PDFName.of('A'))
      const target =
        each.lookup(PDFName.of('Dest')) ?? (action instanceof PDFDict ? action.lookup(PDFName.of('D')) : undefined)
      if (!leads(target)) broken.push(`page ${i + 1}: ${String(target)}`)
    }
  }
  return found === 0 ? ['no link at all'] : broken
}

describe.each(Object.entries(studies))('a report of %s', (name, study) => {
  const document = study()
  let file: string

  beforeAll(async () => {
    file = await reportFile(`proof-${name.replace(/\W+/g, '-')}`, await reportInput(document, false))
  }, 240_000)

  test('has no word on another', () => {
    const found = textBoxes(file).flatMap(overlaps)
    expect(found.map(([a, b]) => `page ${a.page}: ${a.text} and ${b.text}`)).toEqual([])
  })

  test('has nothing outside its margins', () => {
    const outside = textBoxes(file).flatMap(({ width, height, words }) =>
      words.filter(
        ({ left, top, right, bottom }) => left < 24 || right > width - 24 || top < 14 || bottom > height - 14,
      ),
    )
    expect(outside.map(({ page, text }) => `page ${page}: ${text}`)).toEqual([])
  })

  test('has links that all lead to a page of it', async () => {
    expect(await brokenLinks(file)).toEqual([])
  })

  test('embeds its fonts', () => {
    const fonts = pdfTool('pdffonts', [file]).trim().split('\n').slice(2)
    expect(fonts.length).toBeGreaterThan(0)
    for (const font of fonts) expect(font.trim().split(/\s+/).at(-5), font).toBe('yes')
  })

  test('has no page with next to nothing on it', () => {
    const words = textBoxes(file).map((sheet) => sheet.words.length)
    expect(words.filter((count) => count < 20)).toEqual([])
  })
})

describe('a report of a start that does not succeed', () => {
  const textOf = async (name: string) => {
    const file = await reportFile('proof-outcome', await reportInput(studies[name]!(), false))
    return pdfTool('pdftotext', [file, '-']).replace(/\s+/g, ' ')
  }

  test('says on its first pages that the motor does not turn', async () => {
    const text = await textOf('a supply on which no motor breaks away')
    expect(text).toMatch(/R2 in C1: run-up .*? not reached \(at most 20/)
    expect(text).toContain('never turned')
  })

  test('says that the network has no solution', async () => {
    const text = await textOf('a network that has no solution')
    expect(text).toMatch(/C1: The network has no solution before the start; \S+ is the weakest place/)
    expect(text).toContain('not assessed, the case has no solution before the start (at most 4')
    expect(text).toContain('No limit in use has a figure, so none governs.')
  })

  test('says where and when the voltage collapses, and fails the limits', async () => {
    const document = example('one-motor')
    const input = await reportInput(document, false)
    const bus = document.plant.buses[0]!
    const cases = input.result.cases.map((each) => ({
      ...each,
      outcome: { kind: 'collapsed' as const, at: second(1.25), busId: bus.id },
    }))
    const result = judgeStudy(studyRunInput(document), cases)
    expect(result.overall.word).toBe('fails')
    const file = await reportFile('proof-collapse', { ...input, result })
    const text = pdfTool('pdftotext', [file, '-']).replace(/\s+/g, ' ')
    expect(text).toContain(`The voltage collapses at ${bus.tag} 1.25 s after the first switching-on`)
    expect(text).toContain('the voltage collapses during the start (at ')
  })
})
