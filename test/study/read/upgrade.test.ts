import { expect, test } from 'vitest'
import { upgrade } from '@/lib/study/read/upgrade'

const steps = {
  1: (document: Record<string, unknown>) => ({ ...document, second: `${document.first} moved` }),
  2: (document: Record<string, unknown>) => ({ ...document, third: `${document.second} twice` }),
}

test('an old file is brought up step by step, each step seeing what the one before left', () => {
  const upgraded = upgrade({ format: 'breakaway-study', formatVersion: 1, first: 'value' }, 3, steps)
  expect(upgraded).toEqual({
    ok: true,
    value: {
      format: 'breakaway-study',
      formatVersion: 3,
      first: 'value',
      second: 'value moved',
      third: 'value moved twice',
    },
  })
})

test('a file of the current version stays as it is', () => {
  const file = { format: 'breakaway-study', formatVersion: 3, anything: 1 }
  expect(upgrade(file, 3, steps)).toEqual({ ok: true, value: file })
})

test('a step that was forgotten is a bug, not a refusal', () => {
  expect(() => upgrade({ format: 'breakaway-study', formatVersion: 1 }, 3, { 2: steps[2] })).toThrow(/no step/)
})
