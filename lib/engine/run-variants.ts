import { ampere } from '../units/si'
import { synchronousSpeed } from '../units/speed'
import { type CaseInput, isTabulated, type MachineModel } from './case-input'
import type { CaseResult, CaseVariant, Notice } from './case-result'
import { appliesTo } from './criteria/applies'
import type { EnvelopePoint } from './criteria/envelope'
import { figures } from './criteria/judge'
import { cutsIn, followsResidual } from './criteria/only-transient'
import type { RuleInput } from './criteria/rule'
import { type DirectStartPeaks, directStartPeaks } from './direct-start-peaks'
import { chosenModel } from './dynamic/chosen-model'
import { fifthOrderCase } from './dynamic/fifth-order-case'
import { startFlicker } from './flicker/start-flicker'
import { breakdownSlip } from './machines/breakdown-slip'
import { protectOnce, runProtected } from './run-protected'

/** Power of the voltage that torque follows in the low-voltage variant (upper half of the typical 2.1 to 2.3). */
export const lowVoltageExponent = 2.25

const quasiStatic = { kind: 'quasi-static' } as const

const withoutCurves = ({ series: _, variants: __, ...result }: CaseResult): CaseVariant['result'] => result

/** Adds flicker and rapid change where the input asks for them and the run went to its end. */
function withFlicker(input: CaseInput, result: CaseResult): CaseResult {
  const asked = new Set(input.flicker?.busIds ?? [])
  if (!input.flicker || asked.size === 0 || result.outcome.kind !== 'complete') return result
  const { startsPerHour } = input.flicker
  const flicker = result.places.flatMap(({ busId, nominal, before, deepest, settledAfterStart }) => {
    const voltage = result.series.busVoltage[busId]
    if (!asked.has(busId) || !voltage || voltage.length < 2) return []
    const { time } = result.series
    const course = { busId, nominal, before, deepest: deepest.voltage, settled: settledAfterStart, time, voltage }
    return [startFlicker(course, startsPerHour, input.frequency)]
  })
  return flicker.length > 0 ? { ...result, flicker } : result
}

/** Delay in s below which a stage may act on the direct-current part of the first cycles. */
const undelayed = 0.1

/** Stages of relays without delay that lie below the first cycles of a direct start. */
const belowOffset = ({ motors }: CaseInput, peaks: readonly DirectStartPeaks[]): Notice[] =>
  peaks.flatMap(({ motorId, peakCurrent }) => {
    const offset = ampere(peakCurrent.current / Math.SQRT2)
    const elements = motors.find(({ id }) => id === motorId)?.protection?.elements ?? []
    return elements.flatMap((element): Notice[] =>
      element.kind === 'definite' && element.delay < undelayed && element.pickUp < offset
        ? [{ kind: 'stage-below-offset', motorId, pickUp: element.pickUp, offset }]
        : [],
    )
  })

/** Adds the peaks of direct starts by the transient model. */
function withPeaks(input: CaseInput, result: CaseResult): CaseResult {
  if (result.outcome.kind !== 'complete' || result.peaks) return result
  const peaks = directStartPeaks(input)
  return peaks.length > 0 ? { ...result, peaks, notices: [...result.notices, ...belowOffset(input, peaks)] } : result
}

const withModels = (input: CaseInput, models: ReadonlyMap<string, MachineModel>): CaseInput => ({
  ...input,
  motors: input.motors.map((motor) => ({ ...motor, circuit: models.get(motor.id) ?? motor.circuit })),
})

/** The case with the k-th machine of every estimated motor; a motor with fewer goes round them again. */
const samePlate = (input: CaseInput): readonly CaseInput[] => {
  const open = (input.samePlate ?? []).filter(({ models }) => models.length > 0)
  const most = Math.max(0, ...open.map(({ models }) => models.length))
  return Array.from({ length: most }, (_, k) =>
    withModels(input, new Map(open.map(({ motorId, models }) => [motorId, models[k % models.length]!]))),
  )
}

/** The case with the torque of every motor that started at low voltage falling faster; null where none did. */
const lowVoltageTorque = (input: CaseInput, { notices }: CaseResult): CaseInput | null => {
  const low = new Set(notices.flatMap((one) => (one.kind === 'reduced-voltage-torque' ? [one.motorId] : [])))
  const models = new Map<string, MachineModel>()
  for (const motor of input.motors) {
    const { circuit } = motor
    // Curves and exponents that somebody stated stay as they are.
    if (!low.has(motor.id) || isTabulated(circuit) || circuit.saturation) continue
    const synchronous = synchronousSpeed(input.frequency, motor.poles)
    const noneBelow = Math.max(1e-4, 1 - motor.ratedSpeed / synchronous)
    const fullFrom = Math.max(2 * noneBelow, breakdownSlip(circuit, synchronous))
    models.set(motor.id, {
      ...circuit,
      saturation: { current: 1, torque: lowVoltageExponent, noneBelow, fullFrom },
    })
  }
  return models.size > 0 ? withModels(input, models) : null
}

/** At its first instant a machine without flux has no torque: the locked rotor is that of the steady circuit, but for the voltage. */
function withLockedRotor(result: CaseResult, steady: CaseResult): CaseResult {
  const motors = result.motors.map((motor) => {
    const locked = steady.motors.find(({ motorId }) => motorId === motor.motorId)?.start?.standstill
    if (!motor.start || !locked) return motor
    const { motorVoltage } = motor.start.standstill
    return { ...motor, start: { ...motor.start, standstill: { ...locked, motorVoltage } } }
  })
  return { ...result, motors }
}

/** A case by the model that it asks for, beside it what the quasi-static model gives; where the model does not fit, that alone. */
function runByModel(input: CaseInput): { result: CaseResult; steady: CaseResult | null } {
  const model = chosenModel(input)
  if (model.kind === 'third-order') {
    const steady = runProtected({ ...input, model: quasiStatic })
    return { result: withLockedRotor(runProtected(input), steady), steady }
  }
  const steady = runProtected(input)
  if (model.kind === 'quasi-static') return { result: steady, steady: null }
  const found = fifthOrderCase(input, steady, model.switchingAngle)
  const notices = steady.notices.concat(
    input.motors.flatMap((motor) => (cutsIn(motor, input) ? [{ kind: 'cuts-in' as const, motorId: motor.id }] : [])),
  )
  if (found.ok) return { result: protectOnce(input, { ...found.result, notices }), steady }
  return {
    result: { ...steady, notices: [...notices, { kind: 'transient-model-unfit', cause: found.cause }] },
    steady: null,
  }
}

const isPoint = (point: ReturnType<typeof figures>[number]): point is EnvelopePoint => 'limit' in point

/** The worst points of a run under the envelopes that apply to it, found while its curves are there. */
function underEnvelopes(
  input: CaseInput,
  result: CaseResult,
  rules: readonly RuleInput[],
): Pick<CaseVariant, 'envelopes'> {
  if (result.outcome.kind !== 'complete') return {}
  const envelopes = rules
    .filter((rule) => rule.limit.kind === 'envelope' && appliesTo(rule, input))
    .map((rule) => ({ ruleId: rule.id, points: figures(rule, input, result).filter(isPoint) }))
    .filter(({ points }) => points.length > 0)
  return envelopes.length > 0 ? { envelopes } : {}
}

/** Another machine on the same plate, with all that limits are held against and without its curves. */
function onSamePlate(input: CaseInput, rules: readonly RuleInput[]): CaseVariant {
  const result = withFlicker(input, runByModel(input).result)
  return { kind: 'same-plate', result: withoutCurves(result), ...underEnvelopes(input, result, rules) }
}

/** A case that closes on residual voltages by the third-order model, with all that limits are held against. */
function withFluxes(input: CaseInput, rules: readonly RuleInput[]): CaseVariant {
  const moving: CaseInput = { ...input, model: { kind: 'third-order' } }
  const result = withFlicker(moving, runProtected(moving))
  return { kind: 'third-order', result: withoutCurves(result), ...underEnvelopes(moving, result, rules) }
}

/**
 * A case with the variants that its input and its own result call for.
 *
 * @param rules limits of the study; envelopes among them are held against every machine that meets the plate
 */
export function runWithVariants(input: CaseInput, rules: readonly RuleInput[] = []): CaseResult {
  const { result: plain, steady } = runByModel(input)
  const result = withPeaks(input, withFlicker(input, plain))
  const low = lowVoltageTorque(input, result)
  const variants: CaseVariant[] = [
    ...samePlate(input).map((each) => onSamePlate(each, rules)),
    ...(low === null
      ? []
      : [{ kind: 'low-voltage-torque' as const, result: withoutCurves(runProtected({ ...low, model: quasiStatic })) }]),
    ...(result.model === 'quasi-static' && followsResidual(input, result) ? [withFluxes(input, rules)] : []),
    ...(steady === null ? [] : [{ kind: 'quasi-static' as const, result: withoutCurves(steady) }]),
  ]
  return variants.length === 0 ? result : { ...result, variants }
}
