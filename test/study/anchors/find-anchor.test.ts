import { describe, expect, test } from 'vitest'
import { parseAnchor } from '@/lib/study/anchors/anchor'
import { type AnchorGround, findAnchor } from '@/lib/study/anchors/find-anchor'
import { inputGroups } from '@/lib/study/anchors/input-list'
import { preIssueChecks } from '@/lib/study/pre-issue-checks'
import { runDocument } from '@/lib/study/run-document'
import { summarise } from '@/lib/study/summary'
import { example } from '../support/examples'

const document = example('one-motor')
const ground: AnchorGround = { document, summary: summarise(runDocument(document)), checks: preIssueChecks(document) }
const find = (text: string, where = ground) => findAnchor(parseAnchor(text)!, where)
const { cases, limits, plant } = document
const caseId = cases[0]!.id
const busId = plant.buses[0]!.id
const motor = plant.motors[0]!

describe('what an anchor leads to', () => {
  test('is the value as typed for an input', () => {
    const found = find(`record/motors/${motor.id}/ratedPower`)
    expect(found).toEqual({ label: `Motor ${motor.tag}, rated power`, value: motor.ratedPower.text })
  })

  test('is figure and word for a limit in a case', () => {
    expect(find(`limit/${limits[0]!.id}/case/${caseId}`)).toMatchObject({
      label: `Limit ${limits[0]!.tag} in case ${cases[0]!.tag}`,
      value: expect.stringMatching(/meets|close|fails|not assessed|does not apply/),
    })
  })

  test('is the voltage with its part of nominal for a place', () => {
    const place = ground.summary.cases[0]!.places.find((one) => one.busId === busId)!
    const percent = ((100 * place.deepest.voltage) / place.nominal).toFixed(2)
    expect(find(`case/${caseId}/place/${busId}/voltage/deepest`)?.value).toContain(percent)
  })

  test('is words without a value for a point, a section and the whole', () => {
    expect(find(`series/${caseId}/voltage/${busId}@1.250`)).toMatchObject({ value: null })
    expect(find('section/method')).toEqual({ label: 'Report, method', value: null })
    expect(find('revision')).toMatchObject({ value: null })
  })

  test('is nothing where record, case, limit or section are gone', () => {
    for (const text of [
      'record/motors/gone/ratedPower',
      `record/motors/${motor.id}/nothing`,
      'record/constructor/x',
      `limit/gone/case/${caseId}`,
      'case/gone',
      `case/${caseId}/place/gone/voltage/first`,
      `case/${caseId}/motor/gone/run-up-time`,
      `series/${caseId}/speed/gone@1`,
      'section/nowhere',
      'check/none',
    ])
      expect([text, find(text)]).toEqual([text, null])
  })

  test('stays the same when records change their order and their tags', () => {
    const tagged = { ...motor, tag: 'M-99' }
    const other = { ...document, plant: { ...plant, motors: [...plant.motors.slice(1), tagged] } }
    const text = `record/motors/${motor.id}/ratedSpeed`
    const found = find(text, { ...ground, document: other })
    expect(found).toEqual({ label: 'Motor M-99, rated speed', value: find(text)!.value })
  })
})

test('every input of a study is found again by its own anchor, with the text as typed', () => {
  const inputs = inputGroups(document).flatMap((group) => group.inputs)
  expect(inputs.length).toBeGreaterThan(30)
  for (const { anchor, text } of inputs) expect([anchor, find(anchor)?.value]).toEqual([anchor, text])
})
