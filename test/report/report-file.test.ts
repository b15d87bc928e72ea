import fs from 'node:fs'
import path from 'node:path'
import { PDFDocument } from '@cantoo/pdf-lib'
import { beforeAll, describe, expect, test } from 'vitest'
import { canonicalJson } from '@/lib/study/canonical-json'
import { example } from '../study/support/examples'
import { reportFile, reportInput } from './support/demo-report'
import { pdfTool } from './support/pdf-tool'

const document = example('velmoor')
let final: string
let text: string

beforeAll(async () => {
  final = await reportFile('final', await reportInput(document, false))
  text = pdfTool('pdftotext', ['-layout', final, '-'])
}, 240_000)

describe('the final report of the demo study', () => {
  test('embeds every font it uses', () => {
    const fonts = pdfTool('pdffonts', [final]).trim().split('\n').slice(2)
    expect(fonts.length).toBeGreaterThan(0)
    // columns from the right: object ID (two numbers), unicode map, subset, embedded
    for (const font of fonts) expect(font.trim().split(/\s+/).at(-5), font).toBe('yes')
  })

  test('holds its chapters, the verdict first', () => {
    const chapters = [
      'Verdict',
      'Acceptance criteria',
      'Input data',
      'Assumptions',
      'Method',
      'Cases',
      'Results',
      'Limits matrix',
      'Limitations',
      'Hand check',
    ]
    const places = chapters.map((chapter) => text.indexOf(chapter))
    expect(
      places.every((place) => place >= 0),
      chapters.filter((_, i) => places[i] === -1).join(', '),
    ).toBe(true)
  })

  test('prints the demo’s figures as the reference calculation gives them', () => {
    for (const figure of ['3.48', '7.92', '10.32', '247.7', '381.1', '16.0']) expect(text, figure).toContain(figure)
  })

  test('numbers its pages, each with the count of all', () => {
    const pages = Number(pdfTool('pdfinfo', [final]).match(/Pages:\s+(\d+)/)?.[1])
    const numbers = [...text.matchAll(/Page (\d+) of (\d+)/g)].map((match) => [Number(match[1]), Number(match[2])])
    expect(numbers).toEqual(Array.from({ length: pages }, (_, i) => [i + 1, pages]))
  })

  test('carries the study as it was frozen', () => {
    const folder = path.join(path.dirname(final), 'attached')
    fs.rmSync(folder, { recursive: true, force: true })
    fs.mkdirSync(folder)
    pdfTool('pdfdetach', ['-saveall', '-o', folder, final])
    const attached: unknown = JSON.parse(fs.readFileSync(path.join(folder, 'study.json'), 'utf8'))
    expect(canonicalJson(attached)).toBe(canonicalJson(document))
  })

  test('is a sound file', () => {
    expect(pdfTool('qpdf', ['--check', final], 'qpdf')).toContain('No syntax or stream encoding errors found')
  })

  test('keeps every word inside the sheet', () => {
    const boxes = pdfTool('pdftotext', ['-bbox', final, '-'])
    let [width, height] = [0, 0]
    for (const line of boxes.split('\n')) {
      const page = line.match(/<page width="([\d.]+)" height="([\d.]+)"/)
      if (page) [width, height] = [Number(page[1]), Number(page[2])]
      const word = line.match(/xMin="([-\d.]+)" yMin="([-\d.]+)" xMax="([-\d.]+)" yMax="([-\d.]+)">(.*)</)
      if (!word) continue
      const [left, top, right, bottom] = word.slice(1, 5).map(Number) as [number, number, number, number]
      expect(
        left > 15 && top > 10 && right < width - 15 && bottom < height - 10,
        `${word[5]} at ${word.slice(1, 5)}`,
      ).toBe(true)
    }
  })

  test('leaves a field for each signature and for a seal, all empty', async () => {
    const pdf = await PDFDocument.load(fs.readFileSync(final), { updateMetadata: false })
    const names = pdf
      .getForm()
      .getFields()
      .map((field) => field.getName())
    for (const name of ['Prepared', 'Checked', 'Approved', 'Seal']) expect(names).toContain(name)
  })
})

test('attaches the bytes that were frozen, also where the document was brought up to date since', async () => {
  const document = example('one-motor')
  const frozen = new TextEncoder().encode('{"as":"frozen"}')
  const file = await reportFile('frozen', { ...(await reportInput(document, true)), frozenDocument: frozen })
  const folder = path.join(path.dirname(file), 'attached-frozen')
  fs.rmSync(folder, { recursive: true, force: true })
  fs.mkdirSync(folder)
  pdfTool('pdfdetach', ['-saveall', '-o', folder, file])
  expect(fs.readFileSync(path.join(folder, 'study.json'), 'utf8')).toBe('{"as":"frozen"}')
}, 120_000)

test('Greek, relations and powers print as they are', async () => {
  const document = example('one-motor')
  document.texts.recommendation = 'Ω ≤ ² Δ φ − × ½ ∠'
  const file = await reportFile('letters', await reportInput(document, true))
  expect(pdfTool('pdftotext', [file, '-']).replace(/\s/g, '')).toContain('Ω≤²Δφ−×½∠')
}, 120_000)

test('a draft has no signature field and says that it is one', async () => {
  const draft = await reportFile('draft', await reportInput(example('one-motor'), true))
  const pdf = await PDFDocument.load(fs.readFileSync(draft), { updateMetadata: false })
  expect(pdf.getForm().getFields()).toEqual([])
  expect(pdfTool('pdftotext', [draft, '-']).toLowerCase()).toContain('draft')
}, 120_000)

test('the same revision gives the same bytes, whenever and however often it is rendered', async () => {
  const document = example('one-motor')
  const [first, second] = [
    await reportFile('once', await reportInput(document, false)),
    await reportFile('again', await reportInput(document, false)),
  ]
  expect(fs.readFileSync(first).equals(fs.readFileSync(second))).toBe(true)
}, 120_000)

test('a letter that no embedded font has is refused with its place, before anything is printed', async () => {
  const strange = example('one-motor')
  strange.head.title = 'Study 𒀀'
  await expect(reportFile('strange', await reportInput(strange, true))).rejects.toMatchObject({ code: 'unsupported' })
}, 60_000)
