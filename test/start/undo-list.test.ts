import { expect, test } from 'vitest'
import { undoList } from '@/lib/start/undo-list.mjs'

test('what was started last is ended first, once, and a failing part does not keep the others running', async () => {
  const order: string[] = []
  const said: string[] = []
  const undo = undoList((line) => said.push(line))
  undo.add(async () => void order.push('database'))
  undo.add(async () => {
    order.push('worker')
    throw new Error('does not answer')
  })
  undo.add(async () => void order.push('web'))
  await Promise.all([undo.end(), undo.end()])
  expect(order).toEqual(['web', 'worker', 'database'])
  expect(said).toEqual(['While stopping: does not answer'])
})
