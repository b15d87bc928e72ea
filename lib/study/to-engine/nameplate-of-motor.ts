import type { Nameplate } from '../../engine/estimate/nameplate'
import { ampere, hertz, newtonMetre, radianPerSecond, volt, voltAmpere, watt } from '../../units/si'
import type { MotorRecord } from '../document/machine-records'
import { codeLetterRange, horsepower, isCodeLetter } from '../nameplate/code-letter'

/** Rated torque P/ω of a motor, in N·m. */
export const ratedTorqueOf = (motor: MotorRecord): number => motor.ratedPower.si / motor.ratedSpeed.si

/** Locked-rotor apparent power between the ends of the plate's code letter; null without one. */
const lockedRotorCode = ({ codeLetter: letter, ratedPower }: MotorRecord): Nameplate['lockedRotorCode'] => {
  if (!isCodeLetter(letter)) return null
  const { from, below } = codeLetterRange(letter)
  const apparent = (kvaPerHp: number) => voltAmpere((kvaPerHp * 1000 * ratedPower.si) / horsepower)
  return { from: apparent(from), below: below === null ? null : apparent(below) }
}

/** What the estimator reads of a motor's record; null where the record lacks what it cannot do without. */
export const nameplateOf = (motor: MotorRecord, frequency: number): Nameplate | null => {
  const { efficiency, powerFactor, lockedRotorCurrent } = motor
  if (!efficiency || !powerFactor || !lockedRotorCurrent) return null
  const torque = (multiple: MotorRecord['lockedRotorTorque']) =>
    multiple && newtonMetre(multiple.si * ratedTorqueOf(motor))
  return {
    ratedPower: watt(motor.ratedPower.si),
    ratedVoltage: volt(motor.ratedVoltage.si),
    frequency: hertz(frequency),
    poles: motor.poles,
    ratedSpeed: radianPerSecond(motor.ratedSpeed.si),
    efficiency: efficiency.si,
    powerFactor: powerFactor.si,
    ratedCurrent: motor.ratedCurrent && ampere(motor.ratedCurrent.si),
    lockedRotorCurrent: ampere(lockedRotorCurrent.si),
    lockedRotorTorque: torque(motor.lockedRotorTorque),
    breakdownTorque: torque(motor.breakdownTorque),
    lockedRotorPowerFactor: motor.lockedRotorPowerFactor?.si ?? null,
    ratedTorque: motor.ratedTorque && newtonMetre(motor.ratedTorque.si),
    pullUpTorque: torque(motor.pullUpTorque),
    lockedRotorCode: lockedRotorCode(motor),
  }
}
