import path from 'node:path'
import type { StudyDocument } from '../study/document/study-document'
import { readStudyValue } from '../study/read/read-study'
import { benchEngine } from './bench-engine'
import { benchPages } from './bench-pages'
import { benchReport } from './bench-report'
import oneMotor from './examples/one-motor.json'
import velmoor from './examples/velmoor.json'
import type { Figure } from './figure'

const shipped = (value: unknown): StudyDocument => {
  const read = readStudyValue(value)
  if (!read.ok) throw read.error
  return read.value
}

const asTable = (figures: readonly Figure[]): string => {
  const width = Math.max(...figures.map(({ name }) => name.length))
  return figures
    .map(({ name, value, unit }) =>
      `${name.padEnd(width)}  ${String(value).padStart(9)} ${unit === '1' ? '' : unit}`.trimEnd(),
    )
    .join('\n')
}

/** The figures as one object: name to value and unit. */
const asJson = (figures: readonly Figure[]): string =>
  JSON.stringify({
    node: process.version,
    figures: Object.fromEntries(figures.map(({ name, value, unit }) => [name, { value, unit }])),
  })

const unknown = process.argv.slice(2).filter((argument) => argument !== '--json')
if (unknown.length > 0) {
  process.stderr.write(`${unknown[0]} is not known here; the one option is --json.\n`)
  process.exitCode = 2
} else {
  const demo = shipped(velmoor)
  const figures = [
    ...benchEngine(demo),
    ...(await benchReport('report of the demo study', demo)),
    ...(await benchReport('report of the one-motor study', shipped(oneMotor))),
    // The bundle lies in a folder of the project's root.
    ...benchPages(path.resolve(import.meta.dirname, '..')),
  ]
  process.stdout.write(`${process.argv.includes('--json') ? asJson(figures) : asTable(figures)}\n`)
}
