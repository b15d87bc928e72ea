import type { Starter } from '../../engine/case-input'
import type { ChangeOver } from '../../engine/starter-input'
import { ohm, perUnit, radianPerSecond, second } from '../../units/si'
import type { StarterRecord } from '../document/case-records'
import type { MotorRecord } from '../document/machine-records'
import { impedanceByAngle } from './impedance-by-angle'

const changeOverInput = ({ changeOver }: Exclude<StarterRecord, { kind: 'direct' }>): ChangeOver =>
  changeOver.kind === 'time'
    ? { kind: 'time', at: second(changeOver.at.si) }
    : { kind: 'speed', at: radianPerSecond(changeOver.at.si) }

/** A starting device; an autotransformer's own impedance converts with the rated voltage of the motor it starts. */
export const starterInput = (starter: StarterRecord, motor: MotorRecord): Starter => {
  if (starter.kind === 'direct') return { kind: 'direct' }
  const changeOver = changeOverInput(starter)
  const gap = second(starter.gap.si)
  if (starter.kind === 'star-delta') return { kind: 'star-delta', changeOver, gap }
  const { own, tap } = starter
  const impedance = own
    ? impedanceByAngle((own.impedance.si * motor.ratedVoltage.si ** 2) / own.rating.si, own.xOverR.si)
    : { re: ohm(0), im: ohm(0) }
  return { kind: 'autotransformer', tap: perUnit(tap.si), impedance, changeOver, gap }
}
