import { beforeAll, describe, expect, test } from 'vitest'
import { studyDocument } from '@/lib/study/document/study-document'
import { example } from '../study/support/examples'
import { reportFile, reportInput } from './support/demo-report'
import { pdfTool } from './support/pdf-tool'
import { overlaps, textBoxes } from './support/text-boxes'

let file: string
let text: string

beforeAll(async () => {
  const study = example('one-motor')
  const motors = study.plant.motors.map((motor) => ({
    ...motor,
    coolingStopped: '90 min',
    thermalLimits: [{ state: 'hot' as const, current: '1000 A', time: '2 min' }],
    permissibleHot: '14 s',
    protection: {
      relay: 'by the panel builder',
      measures: 'motor' as const,
      currentTransformer: { primary: '1000 A', secondary: '1 A' },
      settingsIn: 'secondary' as const,
      elements: [
        { kind: 'inverse' as const, curve: 'very-inverse' as const, pickUp: '0.55 A', multiplier: '2' },
        { kind: 'definite' as const, name: 'instantaneous', pickUp: '6 A', delay: '0.05 s' },
        {
          kind: 'thermal-image' as const,
          base: '0.44 A',
          factor: '1.1',
          heating: '15 min',
          cooling: '45 min',
          inhibit: '70 %',
        },
      ],
    },
  }))
  const document = studyDocument.parse({ ...study, plant: { ...study.plant, motors } })
  file = await reportFile('protection', await reportInput(document, false))
  text = pdfTool('pdftotext', ['-layout', file, '-'])
}, 240_000)

describe('a report on a motor with a relay', () => {
  test('sets the start against the relay and the held rotor against the permissible time', () => {
    const part = text.slice(text.lastIndexOf('Relay against start and thermal limit'))
    expect(part.slice(0, 3000)).toMatch(/Permissible, s/)
    expect(part.slice(0, 3000)).toContain('the work of a licensed engineer')
  })

  test('prints the settings as typed with the side they are meant for, and the thermal data', () => {
    expect(text).toMatch(/IEC very inverse, pick-up\s+0\.55.A/)
    expect(text).toContain('(secondary values)')
    expect(text).toMatch(/1000 A \/ 1 A/)
    expect(text).toMatch(/hot 1000 A: 2 min/)
  })

  test('draws time against current with its own caption, and explains the integral', () => {
    expect(text).toContain('against the elements of its relay and the thermal limits of the motor')
    expect(text).toContain('motor limit hot')
    expect(text).toContain('Protection and heat of starts')
  })

  test('says how many starts an hour are allowed and who says so', () =>
    expect(text.slice(text.lastIndexOf('Heat of starts and starts allowed'))).toMatch(/Starts an hour\s+allowed/))

  test('has no word on another', () => {
    const found = textBoxes(file).flatMap(overlaps)
    expect(found.map(([a, b]) => `page ${a.page}: ${a.text} and ${b.text}`)).toEqual([])
  })
})
