import Papa from 'papaparse'
import { describe, expect, test } from 'vitest'
import { type CsvFile, resultsCsv, seriesCsv } from '@/lib/exchange/results-csv'
import { resultsJson } from '@/lib/exchange/results-json'
import { runDocument } from '@/lib/study/run-document'
import { summarise } from '@/lib/study/summary'
import { example } from '../study/support/examples'

const document = example('one-motor')
const results = runDocument(document)
const summary = summarise(results)
const files = resultsCsv(document, summary)

const rowsOf = (file: CsvFile | undefined): Record<string, string>[] => {
  if (!file) throw new Error('the file is not there')
  return Papa.parse<Record<string, string>>(file.text, { header: true, skipEmptyLines: true }).data
}
const table = (name: string) => rowsOf(files.find((file) => file.name === `${name}.csv`))

describe('results as tables', () => {
  test('each table that has rows is a file, and no other', () => {
    expect(files.map(({ name }) => name)).toEqual(['cases.csv', 'voltages.csv', 'starts.csv', 'limits.csv'])
  })

  test('every row has as many cells as there are heads', () => {
    for (const { text } of files) {
      const rows = Papa.parse<string[]>(text, { skipEmptyLines: true }).data
      expect(new Set(rows.map((row) => row.length)).size).toBe(1)
    }
  })

  test('voltages have each place at each instant with its three references by name', () => {
    const rows = table('voltages')
    expect(rows).toHaveLength(results.cases.length * document.plant.buses.length * 4)
    const deepest = rows.find((row) => row.place === 'PCC' && row.instant === 'deepest')!
    const place = results.cases[0]!.places.find(({ busId }) => busId === 'pcc')!
    const { before, nominal, deepest: found } = place
    expect(Number(deepest['voltage, kV'])).toBeCloseTo(found.voltage / 1000, 6)
    expect(Number(deepest['change, % of the voltage before'])).toBeCloseTo((100 * (before - found.voltage)) / before, 6)
    expect(Number(deepest['change, % of nominal'])).toBeCloseTo((100 * (before - found.voltage)) / nominal, 6)
    expect(Number(deepest['remaining, % of nominal'])).toBeCloseTo((100 * found.voltage) / nominal, 6)
    expect(Number(deepest['at, s'])).toBeCloseTo(found.at, 6)
  })

  test('starts have the outcome in words and the figures of the engine in the unit of their head', () => {
    const [row] = table('starts')
    const start = results.cases[0]!.motors.find((motor) => motor.start)!.start!
    expect(row!.outcome).toBe('started')
    expect(Number(row!['line current at standstill, A'])).toBeCloseTo(start.standstill.lineCurrent, 5)
    expect(Number(row!['settled speed, r/min'])).toBeCloseTo((start.settledSpeed! * 30) / Math.PI, 4)
    expect(Number(row!['rotor slip energy, kJ'])).toBeCloseTo(start.slipEnergy / 1000, 3)
  })

  test('limits carry the verdict and the figures as they print', () => {
    const rows = table('limits')
    expect(rows).toHaveLength(results.verdicts.length)
    for (const row of rows) {
      expect(['meets', 'close', 'fails', 'not assessed']).toContain(row.verdict)
      if (row.value !== '') expect(Number.isFinite(Number(row.value))).toBe(true)
      expect(Number.isFinite(Number(row['limit value']))).toBe(true)
    }
  })

  test('the run of a case has one row an instant and a column each place and motor figure', () => {
    const { caseId, series } = results.cases[0]!
    const file = seriesCsv(document, caseId, series)
    expect(file.name).toBe(`run-${caseId}.csv`)
    const rows = rowsOf(file)
    expect(rows).toHaveLength(series.time.length)
    const places = Object.keys(series.busVoltage).length
    expect(Object.keys(rows[0]!)).toHaveLength(1 + places + 8 * Object.keys(series.motors).length)
    expect(Number(rows.at(-1)!['PCC voltage, kV'])).toBeCloseTo(series.busVoltage.pcc!.at(-1)! / 1000, 6)
  })

  test('a tag that would run as a formula is made harmless in rows and heads', () => {
    const evil = structuredClone(document)
    for (const bus of evil.plant.buses) bus.tag = `=cmd ${bus.id}`
    const texts = [...resultsCsv(evil, summary), seriesCsv(evil, results.cases[0]!.caseId, results.cases[0]!.series)]
    for (const { text } of texts)
      for (const row of Papa.parse<string[]>(text).data)
        for (const cell of row) expect(cell.startsWith('=')).toBe(false)
  })
})

describe('results as JSON', () => {
  const text = resultsJson(document, summary)

  test('the same results give the same bytes, members in the order of their names', () => {
    expect(resultsJson(structuredClone(document), structuredClone(summary))).toBe(text)
    const keys = Object.keys(JSON.parse(text))
    expect(keys).toEqual([...keys].sort())
  })

  test('a difference beyond the ninth digit does not show', () => {
    const nudged = structuredClone(summary)
    const supply = nudged.cases[0]!.supply!
    Object.assign(supply, { emf: supply.emf * (1 + 1e-13) })
    expect(resultsJson(document, nudged)).toBe(text)
  })

  test('it names the study, the engine and every record that results speak of', () => {
    const value = JSON.parse(text)
    expect(value).toMatchObject({
      format: 'breakaway-results',
      engineVersion: results.engineVersion,
      document: { documentNumber: 'EX-001' },
      tags: { buses: { pcc: 'PCC' } },
    })
    expect(value.verdicts[0].printed.limit).toMatch(/^[\d.]+$/)
    expect(value.cases[0]).not.toHaveProperty('series')
  })
})
