import { mkdir, readFile, stat } from 'node:fs/promises'
import path from 'node:path'
import { computeStudy } from '../compute/node'
import type { StudyResult } from '../engine/study-run'
import { DomainError } from '../errors'
import { readStudyFile } from '../exchange/read-study-file'
import type { StudyDocument } from '../study/document/study-document'
import { writeReport } from './write-report'
import { writeResults } from './write-results'

export interface ComputeFileOptions {
  file: string
  out: string
  report: boolean
  /** Year-month-day printed in the report; null: the day on which the file was last changed. */
  date: string | null
  /** Folder of the bundled thread programs. */
  programs: string
  say: (line: string) => void
}

export interface ComputedFile {
  document: StudyDocument
  result: StudyResult
}

const missing = (file: string) => new DomainError('not-found', `There is no readable file ${file}: check the path.`)

const largest = 20 * 1024 * 1024

async function readDocument(file: string): Promise<StudyDocument> {
  const known = await stat(file).catch(() => null)
  if (!known?.isFile()) throw missing(file)
  // refused by its size before it is read: a mistaken file may be larger than memory
  if (known.size > largest)
    throw new DomainError(
      'too-large',
      `A study file is at most 20 MB, and this one has ${Math.ceil(known.size / 1048576)} MB.`,
    )
  const read = readStudyFile(await readFile(file))
  if (!read.ok) throw read.error
  return read.value
}

/** Reads, checks and computes a study file and writes results, plots and report. What is wrong with the file is a DomainError. */
export async function computeFile(options: ComputeFileOptions): Promise<ComputedFile> {
  const { file, out, report, programs, say } = options
  const document = await readDocument(file)
  const date = options.date ?? (await stat(file)).mtime.toISOString().slice(0, 10)
  await mkdir(out, { recursive: true }).catch(() => {
    throw new DomainError('unavailable', `The folder ${out} cannot be made: choose another with --out.`)
  })
  const result = await computeStudy(document, {
    entry: path.join(programs, 'compute.js'),
    onProgress: (done, of) => say(`Computed ${done} of ${of} cases`),
  })
  const names = await writeResults(out, document, result)
  say(`Wrote ${names.length} files with results and plots`)
  if (report) {
    await writeReport(out, document, result, { date, entry: path.join(programs, 'render.js') })
    say('Wrote report.pdf')
  }
  return { document, result }
}
