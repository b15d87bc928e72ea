import { beforeAll, describe, expect, test } from 'vitest'
import { caseRecord } from '@/lib/study/document/case-records'
import { example } from '../study/support/examples'
import { reportFile, reportInput } from './support/demo-report'
import { pdfTool } from './support/pdf-tool'

let text: string

beforeAll(async () => {
  const document = example('one-motor')
  document.cases = document.cases.map((one) => caseRecord.parse({ ...one, model: 'fifth-order', switchingAngle: '90' }))
  const file = await reportFile('transient-cases', await reportInput(document, false))
  text = pdfTool('pdftotext', ['-layout', file, '-'])
}, 240_000)

describe('the report of a case by the fifth-order model', () => {
  test('says which model gave the numbers, at which switching angle, and what the quasi-static one gives', () => {
    const part = text.slice(text.lastIndexOf('Models beside each other'))
    expect(part.replace(/\s+/g, ' ')).toMatch(
      /by the fifth-order model, switched on at 90\.0° of the voltage of phase a/,
    )
    expect(part).toMatch(/MF1: run-up to the criterion\s+\d+\.\d+ s\s+\d+\.\d+ s\s+\d+\.\d %/)
    expect(part).toMatch(/MF1: largest instantaneous current\s+\d[\d\s.]* A\s+–/)
  })

  test('draws its first periods and envelopes, and says its method', () => {
    expect(text).toContain('Torque over the start: mean over a period')
    expect(text).toContain('Models with transients')
  })
})
