import { describe, expect, it } from 'vitest'
import type { CaseInput, InductionCircuit } from '@/lib/engine/case-input'
import { judge } from '@/lib/engine/criteria/judge'
import { judgeOverPlate } from '@/lib/engine/criteria/judge-over-plate'
import type { RuleInput } from '@/lib/engine/criteria/rule'
import { runCase } from '@/lib/engine/run-case'
import { runWithVariants } from '@/lib/engine/run-variants'
import { variantRanges } from '@/lib/study/variant-ranges'
import { ohm, perUnit, second } from '@/lib/units/si'
import { autotransformer, simpleMotor, simplePlant, singleCage, squareLoad, started } from '../support/simple-plant'

const weaker = (factor: number): InductionCircuit => ({
  ...singleCage,
  cages: singleCage.cages.map((cage) => ({ ...cage, resistance: ohm(cage.resistance * factor) })),
})

const plant = (load = 600): CaseInput =>
  simplePlant([simpleMotor('M', started({ kind: 'direct' }, squareLoad(load)))], 0.003)

const open = (models: readonly InductionCircuit[]): CaseInput => ({
  ...plant(),
  samePlate: [{ motorId: 'M', models }],
})

const timeRule = (limit: number): RuleInput => ({
  id: 'r',
  place: { kind: 'starting-motors' },
  quantity: 'run-up-time',
  instant: 'deepest',
  reference: 'rated',
  limit: { kind: 'value', value: limit },
  appliesTo: { caseIds: null, methods: null, motorIds: null },
  startClass: null,
})
const margins = { ofLimit: perUnit(0.01), voltage: perUnit(0.01) }
const often = { perDay: 1, perHour: 1 }

describe('a case whose machine is estimated', () => {
  it('is computed once more with each machine that meets the plate, itself unchanged', () => {
    const models = [weaker(0.8), weaker(1.3)]
    const { variants, peaks: _, ...own } = runWithVariants(open(models))
    expect(own).toEqual(runCase(plant()))
    expect(variants!.map(({ kind }) => kind)).toEqual(['same-plate', 'same-plate'])
    models.forEach((circuit, k) => {
      const input = plant()
      const alone = runCase({ ...input, motors: input.motors.map((motor) => ({ ...motor, circuit })) })
      const { series: __, ...summary } = alone
      expect(variants![k]!.result).toEqual(summary)
    })
  })

  it('is judged by the worst of them, with their number', () => {
    const input = open([weaker(0.8), weaker(1.3)])
    const result = runWithVariants(input)
    const [range] = variantRanges(result)
    expect(range!.count).toBe(3)
    expect(range!.runUp!.to).toBeGreaterThan(range!.runUp!.from * 1.05)
    const between = (range!.runUp!.to + result.motors[0]!.start!.timeToCriterion!) / 2
    const verdict = (limit: number) => judgeOverPlate(timeRule(limit), input, result, often, margins)!
    expect(verdict(between)).toMatchObject({ word: 'fails', circuits: 3, value: range!.runUp!.to })
    expect(verdict(2 * range!.runUp!.to).word).toBe('meets')
    const { variants: _, ...alone } = result
    expect(judgeOverPlate(timeRule(between), input, alone, often, margins)).toMatchObject({ word: 'meets' })
  })

  it('is judged by the worst of them under an envelope in time, though their curves are not kept', () => {
    const input = open([weaker(0.8), weaker(1.3)])
    const envelope: RuleInput = {
      ...timeRule(0),
      id: 'e',
      place: { kind: 'bus', busId: 'B' },
      quantity: 'voltage-change',
      reference: 'before',
      limit: {
        kind: 'envelope',
        steps: [
          { from: second(0), value: perUnit(0.5) },
          { from: second(1.4), value: perUnit(0.02) },
        ],
      },
    }
    const result = runWithVariants(input, [envelope])
    const own = judge(envelope, input, result, often, margins)!
    const alone = [weaker(0.8), weaker(1.3)].map((circuit) => {
      const one = { ...plant(), motors: plant().motors.map((motor) => ({ ...motor, circuit })) }
      return judge(envelope, one, runCase(one), often, margins)!
    })
    const least = Math.min(own.margin!, ...alone.map(({ margin }) => margin!))
    const verdict = judgeOverPlate(envelope, input, result, often, margins)!
    expect(least).toBeLessThan(own.margin!)
    expect(verdict).toMatchObject({ margin: least, circuits: 3 })
    expect(result.variants!.every((variant) => !('series' in variant.result))).toBe(true)
    // Results without those points are judged by the case alone, and say so by the missing count.
    const older = { ...result, variants: result.variants!.map(({ envelopes: _, ...variant }) => variant) }
    expect(judgeOverPlate(envelope, input, older, often, margins)).toEqual(own)
  })

  it('is judged by the worst of them in flicker', () => {
    const models = [weaker(0.8), weaker(1.3)]
    const input = { ...open(models), flicker: { busIds: ['B'], startsPerHour: 1 } }
    const result = runWithVariants(input)
    const severities = [result, ...result.variants!.map((variant) => variant.result)].map(
      ({ flicker }) => flicker![0]!.shortTerm.meter,
    )
    expect(new Set(severities).size).toBe(3)
    const flicker: RuleInput = {
      ...timeRule(100),
      place: { kind: 'bus', busId: 'B' },
      quantity: 'flicker-short-term',
    }
    expect(judgeOverPlate(flicker, input, result, often, margins)!.value).toBe(Math.max(...severities))
  })

  it('has no range where no machine but the estimated one meets the plate', () => {
    expect(runWithVariants(open([])).variants).toBeUndefined()
    expect(variantRanges(runCase(plant()))).toEqual([])
  })
})

describe('a start below 0.85 of rated voltage', () => {
  const tapped = (changes = {}) =>
    simplePlant([simpleMotor('M', started(autotransformer(0.65, { rpm: 1450 }), squareLoad(300)), changes)], 0.003)

  it('is computed once more with torque ∝ U^2.25, which takes an eighth of it at 0.6', () => {
    const result = runWithVariants(tapped())
    const [variant] = result.variants!
    expect(variant!.kind).toBe('low-voltage-torque')
    const [own, low] = [result.motors[0]!.start!, variant!.result.motors[0]!.start!]
    const u = low.standstill.motorVoltage / 400
    expect(
      low.standstill.torque /
        (own.standstill.torque * (low.standstill.motorVoltage / own.standstill.motorVoltage) ** 2),
    ).toBeCloseTo(u ** 0.25, 9)
    expect(low.timeToCriterion!).toBeGreaterThan(own.timeToCriterion!)
  })

  it('keeps exponents that somebody stated', () => {
    const stated = { current: 1.05, torque: 2.1, noneBelow: 0.02, fullFrom: 0.1 }
    expect(runWithVariants(tapped({ circuit: { ...singleCage, saturation: stated } })).variants).toBeUndefined()
  })

  it('is not asked for at full voltage', () => {
    expect(runWithVariants(plant()).variants).toBeUndefined()
  })
})
