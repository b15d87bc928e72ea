import type { Verdict } from '@/lib/engine/criteria/rule'
import type { LimitRecord } from '@/lib/study/document/limit-record'
import { type CaseFigure, motorOf, placeOf } from './case-figure'
import type { LimitSpec } from './plot/line-plot-spec'

type Step = { from: number; to: number; value: number }

/** Part of the plot that a limit on the first instant or on the settled state is drawn over. */
const stub = 0.2

const motorsUnder = ({ document, result }: CaseFigure, rule: LimitRecord, busId: string) =>
  result.motors
    .filter((motor) => (rule.place.kind === 'starting-motors' ? motor.start : motor.running) !== null)
    .map((motor) => motorOf(document, motor.motorId))
    .filter((motor) => motor.bus === busId)

/** Volts that one part of the reference stands for at this bus; null where the rule is not about it. */
const referenceAt = (figure: CaseFigure, rule: LimitRecord, busId: string): number | null => {
  const place = placeOf(figure.result, busId)
  if (!place) return null
  if (rule.place.kind === 'bus' && rule.place.bus !== busId) return null
  const aboutMotors = rule.place.kind === 'starting-motors' || rule.place.kind === 'running-motors'
  const motor = aboutMotors ? motorsUnder(figure, rule, busId)[0] : undefined
  if (aboutMotors && !motor) return null
  if (rule.reference === 'rated') return motor?.ratedVoltage.si ?? null
  return rule.reference === 'before' ? place.before : place.nominal
}

const stretches = (rule: LimitRecord, window: readonly [number, number]): readonly Step[] => {
  const [start, end] = window
  const length = end - start
  if (rule.limit.kind === 'envelope') {
    const steps = rule.limit.steps
    return steps.map((step, i) => ({ from: step.from.si, to: steps[i + 1]?.from.si ?? end, value: step.value.si }))
  }
  const value = rule.limit.value.si
  if (rule.instant === 'first') return [{ from: start, to: start + stub * length, value }]
  if (rule.instant === 'deepest') return [{ from: start, to: end, value }]
  return [{ from: end - stub * length, to: end, value }]
}

const words = { 'voltage-change': 'change', 'remaining-voltage': 'remaining', 'highest-voltage': 'highest' } as const

const isVoltage = (quantity: LimitRecord['quantity']): quantity is keyof typeof words => quantity in words

const nameOf = (rule: LimitRecord, quantity: keyof typeof words): string => {
  const value = rule.limit.kind === 'envelope' ? 'envelope' : rule.limit.value.text
  const settled = rule.instant === 'deepest' ? '' : ` ${rule.instant === 'first' ? 'first' : 'settled'}`
  return `${rule.tag}${settled} ${words[quantity]} ${value}`
}

const holds = (verdict: Verdict, rule: LimitRecord, caseId: string): boolean =>
  verdict.ruleId === rule.id && verdict.caseId === caseId && verdict.inUse

/** Levels in volts of every voltage limit in use that applies to the bus in this case. */
export const voltageLimits = (
  figure: CaseFigure,
  busId: string,
  window: readonly [number, number],
): readonly LimitSpec[] =>
  figure.document.limits.flatMap((rule) => {
    const { quantity } = rule
    if (!isVoltage(quantity) || !figure.verdicts.some((one) => holds(one, rule, figure.result.caseId))) return []
    const reference = referenceAt(figure, rule, busId)
    if (reference === null) return []
    const level = (value: number) => reference * (quantity === 'voltage-change' ? 1 - value : value)
    return [
      {
        name: nameOf(rule, quantity),
        forbidden: quantity === 'highest-voltage' ? 'above' : 'below',
        steps: stretches(rule, window).map((step) => ({ ...step, value: level(step.value) })),
      },
    ]
  })
