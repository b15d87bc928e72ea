import type { CloseMargins, RuleInput, StartClass, StartFrequency } from '@/lib/engine/criteria/rule'
import { perUnit, second } from '@/lib/units/si'

/** The limits sheet R1 to R13 of the Velmoor station and its second sheet, typed straight from the data sheet. */

const everyStart = { caseIds: null, methods: null, motorIds: null }

const startClass = (bounds: Partial<StartClass>): StartClass => ({
  moreThanPerDay: null,
  atMostPerDay: null,
  moreThanPerHour: null,
  atMostPerHour: null,
  ...bounds,
})

const rule = (
  id: string,
  quantity: RuleInput['quantity'],
  place: RuleInput['place'],
  value: number,
  more: Partial<RuleInput> = {},
): RuleInput => ({
  id,
  place,
  quantity,
  instant: 'deepest',
  reference: 'nominal',
  limit: { kind: 'value', value },
  appliesTo: everyStart,
  startClass: null,
  ...more,
})

const bus = (busId: string): RuleInput['place'] => ({ kind: 'bus', busId })
const starting: RuleInput['place'] = { kind: 'starting-motors' }
const before = { reference: 'before' as const }

export const velmoorRules: readonly RuleInput[] = [
  rule('R1', 'voltage-change', bus('PCC'), 0.04, {
    ...before,
    startClass: startClass({ moreThanPerDay: 4, atMostPerHour: 2 }),
  }),
  rule('R2', 'voltage-change', bus('PCC'), 0.06, { ...before, startClass: startClass({ atMostPerDay: 4 }) }),
  rule('R3', 'voltage-change', bus('PCC'), 0.03, { ...before, startClass: startClass({ moreThanPerHour: 2 }) }),
  rule('R4', 'voltage-change', bus('PCC'), 0.03, { ...before, instant: 'settled-after-process' }),
  rule('R5', 'remaining-voltage', bus('PCC'), 0.9),
  rule('R6', 'remaining-voltage', bus('MV'), 0.8),
  rule('R7', 'remaining-voltage', bus('LV'), 0.8),
  rule('R8', 'remaining-voltage', { kind: 'running-motors' }, 0.8, { reference: 'rated' }),
  rule('R9', 'remaining-voltage', starting, 0.8, {
    instant: 'first',
    reference: 'rated',
    appliesTo: { caseIds: null, methods: ['direct'], motorIds: null },
  }),
  rule('R10', 'accelerating-torque', starting, 0.1),
  rule('R11', 'run-up-time', starting, 20),
  rule('R12', 'heat-used', starting, 0.6),
  rule('R13', 'highest-voltage', { kind: 'every-bus' }, 1.1),
]

/** 10 % for 0.1 s, 6 % to 2 s, then 3 %. */
export const velmoorEnvelope: RuleInput = rule('E1', 'voltage-change', bus('PCC'), 0, {
  ...before,
  limit: {
    kind: 'envelope',
    steps: [
      { from: second(0), value: perUnit(0.1) },
      { from: second(0.1), value: perUnit(0.06) },
      { from: second(2), value: perUnit(0.03) },
    ],
  },
})

/** Six starts a day, at most one an hour. */
export const velmoorStarts: StartFrequency = { perDay: 6, perHour: 1 }

export const velmoorMargins: CloseMargins = { ofLimit: perUnit(0.1), voltage: perUnit(0.01) }
