import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { readStudyFile } from '@/lib/exchange/read-study-file'
import { exampleText } from '../study/support/examples'

const bytes = (text: string) => new TextEncoder().encode(text)
const refusal = (file: Uint8Array) => {
  const read = readStudyFile(file)
  if (read.ok) throw new Error('the file was accepted')
  return read.error
}

describe('a study file', () => {
  test('is read, with or without a byte order mark', () => {
    const text = exampleText('one-motor')
    const read = readStudyFile(bytes(text))
    const marked = readStudyFile(bytes(`\uFEFF${text}`))
    expect(read.ok && read.value.head.documentNumber).toBe('EX-001')
    expect(marked).toEqual(read)
  })

  test('of more than 20 MB is refused before it is looked at', () => {
    const error = refusal(new Uint8Array(100 * 1024 * 1024))
    expect(error.code).toBe('too-large')
    expect(error.message).toBe('A study file is at most 20 MB, and this one has 100 MB.')
  })

  test.each([
    ['empty', new Uint8Array(), /empty; choose a study file/],
    ['a PDF', bytes('%PDF-1.7 …'), /PDF; take the study file out of its attachments/],
    ['a packed folder', bytes('PK\u0003\u0004'), /packed folder or a spreadsheet/],
    ['not UTF-8', Uint8Array.of(0x7b, 0xff, 0xfe), /not UTF-8 text/],
    ['not JSON', bytes('{"format": breakaway}'), /not written as JSON.*correct it there/],
    ['JSON of another kind', bytes('{"format":"other"}'), /not a study file/],
    ['a list', bytes('[]'), /not a study file/],
  ])('that is %s is refused with what to do', (_kind, file, message) => {
    expect(refusal(file).message).toMatch(message)
  })

  test('of a newer version asks for a newer program', () => {
    const newer = exampleText('one-motor').replace('"formatVersion": 1', '"formatVersion": 99')
    expect(refusal(bytes(newer))).toMatchObject({ code: 'unsupported' })
  })

  test('nested without end is refused, and brackets inside texts do not count', () => {
    expect(refusal(bytes('['.repeat(1_000_000))).message).toMatch(/nested too deeply/)
    expect(refusal(bytes(`{"a":"${'['.repeat(100)}"}`)).message).toMatch(/not a study file/)
    expect(refusal(bytes(`{"a":"\\"${'{'.repeat(100)}"}`)).message).toMatch(/not a study file/)
  })

  test('with a wrong value names the field and says what to do', () => {
    const wrong = exampleText('one-motor').replace('"3.2 kA"', '"3.2 kW"')
    const [issue] = refusal(bytes(wrong)).issues
    expect(issue?.path).toEqual(['plant', 'supplies', 0, 'level', 'current'])
    expect(issue?.message).toBe('kW is not a unit of current; write for example 651 A.')
  })

  test('of any bytes whatever is read or refused, never a failure', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 200 }), (file) => {
        expect(readStudyFile(file).ok).toBe(false)
      }),
      { numRuns: 1000 },
    )
  })
})
