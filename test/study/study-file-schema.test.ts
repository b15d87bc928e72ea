import fs from 'node:fs'
import path from 'node:path'
import { expect, test } from 'vitest'
import { studyFileSchemaText } from '@/lib/study/study-file-schema'

const file = path.resolve(import.meta.dirname, '../../lib/study/study-file.schema.json')

/** Set WRITE=1 to write the file anew after a change of the document's shape. */
test('the published schema of the study file is the one that is read with', () => {
  const current = studyFileSchemaText()
  if (process.env.WRITE === '1') fs.writeFileSync(file, current)
  expect(fs.existsSync(file) ? fs.readFileSync(file, 'utf8') : '', 'run this test with WRITE=1').toBe(current)
})

test('every field that is not plain from its name is described in the schema', () => {
  const text = fs.readFileSync(file, 'utf8')
  expect(text.match(/"description":/g)?.length ?? 0).toBeGreaterThan(80)
  for (const words of ['Voltage factor c', 'Required with a power or current level', 'As a multiple of rated torque'])
    expect(text).toContain(words)
})
