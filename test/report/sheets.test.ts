import { beforeAll, describe, expect, test } from 'vitest'
import { example } from '../study/support/examples'
import { reportFile, reportInput } from './support/demo-report'
import { pdfTool } from './support/pdf-tool'

let text: string

beforeAll(async () => {
  const document = example('velmoor')
  const [supply] = document.plant.supplies
  supply!.letter = ''
  supply!.voltageFactor = { kind: 'unknown' }
  const file = await reportFile('sheets', await reportInput(document, false))
  text = pdfTool('pdftotext', ['-layout', file, '-'])
}, 240_000)

/** The lines of a chapter, from the last mention of its title (an earlier one stands in the contents). */
const chapter = (title: string): string => {
  const from = text.lastIndexOf(title)
  return text.slice(from, from + 6000)
}

describe('the comparison of starting methods', () => {
  test('puts cases side by side that differ in the method alone', () => {
    const part = chapter('Comparison of starting methods')
    expect(part).toMatch(/M4 on “weakest”, Last pump, Valve closed, then open/)
    expect(part).toMatch(/C1\s+direct-on-line\s+7\.92/)
    expect(part).toMatch(/C2\s+by autotransformer at 65 % \(transfer\s+3\.48/)
  })

  test('leaves sensitivities out, which differ in more', () => {
    const part = chapter('Comparison of starting methods')
    expect(part.slice(0, part.indexOf('Conclusions'))).not.toMatch(/^\s*C20\s/m)
  })

  test('names the limit that decides a case as the verdict does', () =>
    expect(chapter('Comparison of starting methods')).toMatch(/C2 .*R1: 3\.48/))
})

describe('the measurements to take', () => {
  test('set what the model says beside room for what is found', () => {
    const part = chapter('Measurements that would validate the model')
    expect(part).toMatch(/Voltage at PCC before the start\s+32\.40.kV/)
    expect(part).toMatch(/Lowest voltage at PCC, and when\s+31\.27.kV, 0\.30.s/)
    expect(part).toMatch(/Time to 98 % of rated speed\s+10\.32.s/)
  })
})

describe('the data sheet for the utility', () => {
  test('flags what is blank and what is unknown, and asks for it', () => {
    const part = chapter('Data sheet for the utility')
    expect(part).toContain('To be confirmed by Ostrand Rural Distribution')
    expect(part).toMatch(/Letter\s+blank – please state/)
    expect(part).toMatch(/Voltage factor[^\n]*unknown – please state/)
  })

  test('does not ask for the open-circuit voltage where the voltage at the bus is stated', () => {
    const part = chapter('Data sheet for the utility')
    expect(part).toMatch(/Open-circuit voltage\s+–\s+–\s+–/)
  })
})

describe('the start-count card', () => {
  test('says what the maker allows and how the motor is started', () => {
    const part = chapter('Start-count card')
    expect(part).toMatch(/M4\s+2\s+1\s+2\s+by autotransformer at 65/)
    expect(part).toMatch(/Date\s+Time\s+Motor/)
  })
})
