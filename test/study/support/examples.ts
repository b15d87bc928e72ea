import fs from 'node:fs'
import path from 'node:path'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { readStudy } from '@/lib/study/read/read-study'

/** The text of a shipped example. */
export const exampleText = (name: string): string =>
  fs.readFileSync(path.resolve(import.meta.dirname, '../../../lib/cli/examples', `${name}.json`), 'utf8')

/** A shipped example as a checked document; each call gives a copy of its own. */
export const example = (name: 'velmoor' | 'velmoor-envelope' | 'one-motor'): StudyDocument => {
  const read = readStudy(exampleText(name))
  if (!read.ok) throw new Error(JSON.stringify(read.error.issues, null, 1))
  return read.value
}
