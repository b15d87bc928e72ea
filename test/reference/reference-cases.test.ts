import { readdirSync, readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, it } from 'vitest'
import { runCase } from '@/lib/engine/run-case'
import { figureOf } from './figure-of'
import { type ReferenceCase, toCase } from './to-case'

/**
 * Figures of two independent formulations outside this project (nodal matrix with quadrature over speed; admittance
 * matrix with an integrator of order 8). Data invented, conventions in each file's note.
 */
const folder = path.join(import.meta.dirname, 'cases')
const all = readdirSync(folder)
  .sort()
  .map((name): ReferenceCase => JSON.parse(readFileSync(path.join(folder, name), 'utf8')))

/** Machines by themselves at a voltage, in their own test. */
const machines = ['R07', 'R08']
/** A search for a level and transient starts, held in the tests of those. */
const elsewhere = ['R24', 'R25', 'R26']

const covered = all.filter(({ id }) => ![...machines, ...elsewhere].includes(id))

describe('reference cases', () => {
  it('are all here', () => {
    expect(all.map(({ id }) => id)).toEqual(Array.from({ length: 26 }, (_, i) => `R${String(i + 1).padStart(2, '0')}`))
    expect(covered).toHaveLength(21)
  })

  for (const reference of covered) {
    describe(`${reference.id}: ${reference.title}`, () => {
      const input = toCase(reference)
      const result = runCase(input)

      it('is computed to its end', () => {
        expect(result.outcome).toEqual({ kind: 'complete' })
        expect(result.counters.largestMismatch).toBeLessThan(1e-12)
      })

      for (const { quantity, value, tol_rel, tol_abs } of reference.expected) {
        it(`gives ${quantity} within its tolerance`, () => {
          const figure = figureOf(quantity, input, result)
          if (typeof value === 'boolean') {
            expect(figure).toBe(value)
            return
          }
          expect(Math.abs(Number(figure) - value)).toBeLessThanOrEqual(Math.max(tol_abs, tol_rel * Math.abs(value)))
        })
      }
    })
  }
})
