import type { LoadCurve } from '../../engine/case-input'
import { newtonMetre, radianPerSecond } from '../../units/si'
import type { LoadCurveRecord } from '../document/machine-records'

export const loadCurveInput = (curve: LoadCurveRecord): LoadCurve => {
  if (curve.kind === 'points')
    return {
      kind: 'points',
      speeds: curve.points.map(({ speed }) => radianPerSecond(speed.si)),
      torques: curve.points.map(({ torque }) => newtonMetre(torque.si)),
    }
  const { constant, atRated, ratedSpeed, exponent, breakaway } = curve
  return {
    kind: 'power',
    constant: newtonMetre(constant.si),
    atRated: newtonMetre(atRated.si),
    ratedSpeed: radianPerSecond(ratedSpeed.si),
    exponent: exponent.si,
    breakaway: breakaway && {
      torque: newtonMetre(breakaway.torque.si),
      until: radianPerSecond(breakaway.until.si),
    },
  }
}
