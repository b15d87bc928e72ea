import type { LoadCurve } from '../../engine/case-input'
import { newtonMetre, radianPerSecond } from '../../units/si'
import { toRpm } from '../../units/speed'
import type { DrivenLoadRecord, LoadCurveRecord } from '../document/driven-load-record'
import { parseFormula } from '../formula/formula'
import { type SampledCurve, sampleCurve } from '../formula/sample-formula'

type Of<K extends LoadCurveRecord['kind']> = Extract<LoadCurveRecord, { kind: K }>
type Breakaway = Of<'power'>['breakaway']

const breakawayInput = (breakaway: Breakaway) =>
  breakaway && { torque: newtonMetre(breakaway.torque.si), until: radianPerSecond(breakaway.until.si) }

const pointsInput = (points: Of<'points'>['points']) => ({
  speeds: points.map(({ speed }) => radianPerSecond(speed.si)),
  torques: points.map(({ torque }) => newtonMetre(torque.si)),
})

/** The points that a typed formula is computed with; null where it cannot be read or has no value. */
export const sampledFormula = ({ formula, ratedSpeed, from, upTo }: Of<'formula'>): SampledCurve | null => {
  const parsed = parseFormula(formula)
  if (!parsed.ok) return null
  const rated = ratedSpeed.si
  return sampleCurve((speed) => parsed.formula(toRpm(radianPerSecond(speed)), speed / rated), from?.si ?? 0, upTo.si)
}

/** Speed at which the check valve of a pump opens: where its shut head has grown to the static head. */
export const openingSpeed = ({ ratedSpeed, staticHead, shutHead }: Of<'pump-open'>): number =>
  ratedSpeed.si * Math.sqrt(staticHead.si / shutHead.si)

const curveAtItsShaft = (curve: LoadCurveRecord): LoadCurve => {
  switch (curve.kind) {
    case 'points':
      return { kind: 'points', ...pointsInput(curve.points), ...(curve.active && { active: true }) }
    case 'power':
      return {
        kind: 'power',
        constant: newtonMetre(curve.constant.si),
        atRated: newtonMetre(curve.atRated.si),
        ratedSpeed: radianPerSecond(curve.ratedSpeed.si),
        exponent: curve.exponent.si,
        breakaway: breakawayInput(curve.breakaway),
      }
    case 'pump-closed':
      return {
        kind: 'power',
        constant: newtonMetre(curve.friction.si),
        atRated: newtonMetre(curve.shut.si),
        ratedSpeed: radianPerSecond(curve.ratedSpeed.si),
        exponent: 2,
        breakaway: breakawayInput(curve.breakaway),
      }
    case 'pump-open':
      return {
        kind: 'check-valve',
        friction: newtonMetre(curve.friction.si),
        shut: newtonMetre(curve.shut.si),
        ratedSpeed: radianPerSecond(curve.ratedSpeed.si),
        breakaway: breakawayInput(curve.breakaway),
        opensAt: radianPerSecond(openingSpeed(curve)),
        ...pointsInput(curve.points),
      }
    case 'constant-power': {
      const torque = newtonMetre(curve.power.si / curve.from.si)
      return {
        kind: 'power',
        constant: newtonMetre(0),
        atRated: torque,
        ratedSpeed: radianPerSecond(curve.from.si),
        exponent: -1,
        breakaway: {
          torque: curve.standstill ? newtonMetre(curve.standstill.si) : torque,
          until: radianPerSecond(curve.from.si),
        },
      }
    }
    case 'formula': {
      const sampled = sampledFormula(curve)
      if (sampled === null) throw new RangeError(`formula of ${curve.id} was not checked`)
      return {
        kind: 'points',
        speeds: sampled.at.map(radianPerSecond),
        torques: sampled.values.map(newtonMetre),
        ...(curve.active && { active: true }),
      }
    }
  }
}

/** A curve seen through a gear: speeds divided by i, torques times i/η, i the load's speed over the motor's. */
const throughGear = (curve: LoadCurve, ratio: number, efficiency: number): LoadCurve => {
  const speed = (value: number) => radianPerSecond(value / ratio)
  // An active load that drives the gear loses in it as well: less of its torque arrives.
  const torque = (value: number) => newtonMetre(value >= 0 ? (value * ratio) / efficiency : value * ratio * efficiency)
  const breakaway = (one: { torque: number; until: number } | null) =>
    one && { torque: torque(one.torque), until: speed(one.until) }
  switch (curve.kind) {
    case 'points':
      return { ...curve, speeds: curve.speeds.map(speed), torques: curve.torques.map(torque) }
    case 'power':
      return {
        ...curve,
        constant: torque(curve.constant),
        atRated: torque(curve.atRated),
        ratedSpeed: speed(curve.ratedSpeed),
        breakaway: breakaway(curve.breakaway),
      }
    case 'check-valve':
      return {
        ...curve,
        friction: torque(curve.friction),
        shut: torque(curve.shut),
        ratedSpeed: speed(curve.ratedSpeed),
        breakaway: breakaway(curve.breakaway),
        opensAt: speed(curve.opensAt),
        speeds: curve.speeds.map(speed),
        torques: curve.torques.map(torque),
      }
  }
}

/** A load curve at the motor shaft; the gear of its record, where there is one, refers it. */
export const loadCurveInput = (curve: LoadCurveRecord, gear: DrivenLoadRecord['gear'] = null): LoadCurve =>
  gear === null
    ? curveAtItsShaft(curve)
    : throughGear(curveAtItsShaft(curve), gear.speedRatio.si, gear.efficiency?.si ?? 1)
