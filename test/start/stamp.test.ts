import fs from 'node:fs'
import path from 'node:path'
import { expect, test } from 'vitest'
import { stampOf } from '@/lib/start/stamp.mjs'
import { ownFolder } from '../support/own-folder'

function twoFiles(): string {
  const folder = ownFolder()
  fs.mkdirSync(path.join(folder, 'source/deep'), { recursive: true })
  fs.writeFileSync(path.join(folder, 'source/a.ts'), 'one')
  fs.writeFileSync(path.join(folder, 'source/deep/b.ts'), 'two')
  return folder
}

test('a stamp stays when files are only touched', () => {
  const folder = twoFiles()
  const before = stampOf({ paths: ['source'] }, folder)
  fs.utimesSync(path.join(folder, 'source/a.ts'), new Date(0), new Date(0))
  expect(stampOf({ paths: ['source'] }, folder)).toBe(before)
})

test.each([
  [
    'the content of a file deep in a folder',
    (folder: string) => fs.writeFileSync(path.join(folder, 'source/deep/b.ts'), 'Two'),
  ],
  [
    'the name of a file',
    (folder: string) => fs.renameSync(path.join(folder, 'source/a.ts'), path.join(folder, 'source/c.ts')),
  ],
  ['a file more', (folder: string) => fs.writeFileSync(path.join(folder, 'source/new.ts'), '')],
  ['a file less', (folder: string) => fs.rmSync(path.join(folder, 'source/a.ts'))],
])('a stamp changes with %s', (_, change) => {
  const folder = twoFiles()
  const before = stampOf({ paths: ['source'] }, folder)
  change(folder)
  expect(stampOf({ paths: ['source'] }, folder)).not.toBe(before)
})

test('text that moves from one file to the next changes the stamp', () => {
  const folder = twoFiles()
  const before = stampOf({ paths: ['source'] }, folder)
  fs.writeFileSync(path.join(folder, 'source/a.ts'), 'onetwo')
  fs.writeFileSync(path.join(folder, 'source/deep/b.ts'), '')
  expect(stampOf({ paths: ['source'] }, folder)).not.toBe(before)
})

test('a stamp changes with a word such as the version of Node', () => {
  const folder = twoFiles()
  expect(stampOf({ paths: ['source'], words: ['20'] }, folder)).not.toBe(
    stampOf({ paths: ['source'], words: ['22'] }, folder),
  )
})

test('what is excepted does not count, and what is missing is no error', () => {
  const folder = twoFiles()
  const paths = ['source', 'not-there']
  const before = stampOf({ paths, except: ['source/deep'] }, folder)
  fs.writeFileSync(path.join(folder, 'source/deep/b.ts'), 'changed')
  expect(stampOf({ paths, except: ['source/deep'] }, folder)).toBe(before)
})
