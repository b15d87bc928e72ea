import { describe, expect, test } from 'vitest'
import { filledText } from '@/lib/report/values/placeholders'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { runDocument } from '@/lib/study/run-document'
import { example } from '../study/support/examples'
import { reportFile, reportInput } from './support/demo-report'
import { pdfTool } from './support/pdf-tool'

const oneMotor = example('one-motor')
const input = { document: oneMotor, result: runDocument(oneMotor) }
const bus = oneMotor.plant.buses[0]!.tag
const one = oneMotor.cases[0]!.tag

const textOf = async (name: string, document: StudyDocument): Promise<string> => {
  const file = await reportFile(name, await reportInput(document, false))
  return pdfTool('pdftotext', ['-layout', file, '-'])
}

describe('names in braces in a text of the author', () => {
  test('are filled with the figures of the results', () => {
    const place = input.result.cases[0]!.places.find(({ busId }) => busId === oneMotor.plant.buses[0]!.id)!
    const change = (100 * (place.before - place.deepest.voltage)) / place.before
    const { text, unknown } = filledText(`It ${'{verdict}'}: {${one} change ${bus}}.`, input)
    expect(text).toBe(`It meets: ${change.toFixed(2)}\u2009%.`)
    expect(unknown).toEqual([])
  })

  test('stay as typed and are told apart where they name nothing', () => {
    const { text, unknown } = filledText(`{${one} change NOWHERE} and {nonsense} and {}`, input)
    expect(text).toBe(`{${one} change NOWHERE} and {nonsense} and {}`)
    expect(unknown).toEqual([`${one} change NOWHERE`, 'nonsense'])
  })

  test('find the longer of two tags that begin alike', () => {
    const document = example('one-motor')
    document.cases = [document.cases[0]!, { ...document.cases[0]!, id: 'second', tag: `${one} change` }]
    const [run] = input.result.cases
    const result = { ...input.result, cases: [run!, { ...run!, caseId: 'second' }] }
    expect(filledText(`{${one} change change ${bus}}`, { document, result }).unknown).toEqual([])
  })
})

describe('what the author decides about the report', () => {
  test('prints added texts at the end of their chapter', async () => {
    const document = example('one-motor')
    document.texts.added = [{ part: 'method', text: `Seen with the works: {${one} change ${bus}}, {no such}.` }]
    const text = await textOf('added', document)
    const at = text.indexOf('Seen with the works:')
    expect(at).toBeGreaterThan(text.lastIndexOf('Method'))
    expect(text.slice(at, at + 80)).toMatch(/\d\.\d\d.%, \{no such\}/)
    expect(text).toContain('name values that this study does not have: {no such}')
  }, 120_000)

  test('leaves parts out and says so, and keeps all others', async () => {
    const document = example('one-motor')
    document.texts.leftOut = ['plots', 'glossary', 'start-card']
    const text = await textOf('left-out', document)
    expect(text).not.toMatch(/^\s*[A-Z]\s+Glossary/m)
    expect(text).toMatch(/Start-count card\s+Left out by the author/)
    expect(text).toContain('Limits matrix')
    expect(text).not.toContain('Figure 1')
  }, 120_000)

  test('prints on Letter paper too, with nothing outside its margins', async () => {
    const document = example('one-motor')
    document.texts.paper = 'Letter'
    const file = await reportFile('letter', await reportInput(document, false))
    const sizes = pdfTool('pdfinfo', ['-f', '1', '-l', '99', file])
      .split('\n')
      .filter((line) => /^Page\s+\d+ size/.test(line))
    expect(new Set(sizes.map((line) => line.replace(/^Page\s+\d+ size:\s+/, '')))).toEqual(
      new Set(['612 x 792 pts (letter)', '792 x 612 pts (letter)']),
    )
  }, 120_000)
})
