import { describe, expect, test } from 'vitest'
import type { CaseFigure } from '@/lib/drawing/case-figure'
import { transientPlots } from '@/lib/drawing/transient-plots'
import { caseRecord } from '@/lib/study/document/case-records'
import { runDocument } from '@/lib/study/run-document'
import { example } from '../study/support/examples'
import { overlappingTexts, texts, textsOutside } from './support/scene-geometry'

const figure = (model: string): CaseFigure => {
  const document = example('one-motor')
  document.cases = document.cases.map((one) => caseRecord.parse({ ...one, model }))
  const { cases, verdicts } = runDocument(document)
  return { document, result: cases[0]!, verdicts }
}

describe('the figures of a start by the fifth-order model', () => {
  const shown = figure('fifth-order')

  test('are current and torque of the first periods and of the whole start', () => {
    const titles = transientPlots(shown).map(({ title }) => title)
    expect(titles.map((title) => title.split(' of ')[0])).toEqual([
      'C1: current in the first periods',
      'C1: torque in the first periods',
      'C1: current',
      'C1: torque',
    ])
  })

  test('have no label over another and none outside the sheet', () => {
    for (const size of [{}, { width: 174, height: 46 }, { width: 125, height: 78 }])
      for (const scene of transientPlots(shown, size)) {
        expect(overlappingTexts(scene)).toEqual([])
        expect(textsOutside(scene)).toEqual([])
        expect(texts(scene).some(({ text }) => text.includes(' period') || text === 'peak')).toBe(true)
      }
  })

  test('are none for a quasi-static case', () => expect(transientPlots(figure('quasi-static'))).toEqual([]))
})
