import type { MachineModel, MotorInput } from '../../engine/case-input'
import { ampere, kilogramSquareMetre, newtonMetre, perUnit, radianPerSecond, second, volt, watt } from '../../units/si'
import type { CaseRecord } from '../document/case-records'
import type { DrivenLoadRecord } from '../document/driven-load-record'
import type { MotorRecord } from '../document/machine-records'
import type { StudySettings } from '../document/study-document'
import { factorOn } from './case-changes'
import { scaleAdmittance } from './circuit-input'
import { ratedTorqueOf } from './nameplate-of-motor'
import { protectionInput, thermalInput } from './protection-input'

/**
 * Motor plus everything it turns at the motor shaft: J = J_motor + Σ J_i·(n_i/n)² + Σ 2·H_i·S_i/ω_r².
 */
export const inertiaAtShaft = (motor: MotorRecord, load: DrivenLoadRecord): number =>
  load.inertias.reduce((sum, { inertia, speedRatio }) => sum + inertia.si * speedRatio.si ** 2, motor.inertia.si) +
  load.inertiaConstants.reduce(
    (sum, { constant, power }) => sum + (2 * constant.si * power.si) / motor.ratedSpeed.si ** 2,
    0,
  )

/** What the maker declares, as far as the record has it, for the thermal state that the study judges. */
const declaredValues = (motor: MotorRecord, state: StudySettings['thermalState']): MotorInput['declared'] => {
  const permissible = state === 'hot' ? motor.permissibleHot : motor.permissibleCold
  const { lockedRotorCurrent, lockedRotorTorque } = motor
  return {
    lockedRotorCurrent: lockedRotorCurrent && ampere(lockedRotorCurrent.si),
    lockedRotorTorque: lockedRotorTorque && newtonMetre(lockedRotorTorque.si * ratedTorqueOf(motor)),
    pullUpTorque: motor.pullUpTorque && perUnit(motor.pullUpTorque.si),
    permissibleTime: permissible && { time: second(permissible.si), state },
    ...thermalInput(motor),
  }
}

/** A connected motor of a case, with the factors that the case puts on it. */
export const motorInput = (parts: {
  motor: MotorRecord
  load: DrivenLoadRecord
  circuit: MachineModel
  duty: MotorInput['duty']
  record: CaseRecord
  settings: StudySettings
}): MotorInput => {
  const { motor, load, circuit, duty, record, settings } = parts
  return {
    id: motor.id,
    busId: motor.bus,
    ratedVoltage: volt(motor.ratedVoltage.si),
    ratedPower: watt(motor.ratedPower.si),
    ratedSpeed: radianPerSecond(motor.ratedSpeed.si),
    ratedTorque: newtonMetre(ratedTorqueOf(motor)),
    poles: motor.poles,
    circuit: scaleAdmittance(circuit, factorOn(record, 'motor-admittance', motor.id)),
    torqueFactor: perUnit(factorOn(record, 'motor-torque', motor.id)),
    inertia: kilogramSquareMetre(inertiaAtShaft(motor, load) * factorOn(record, 'inertia', motor.id)),
    ...(load.shaft !== '' && { shaft: load.shaft }),
    duty,
    declared: declaredValues(motor, settings.thermalState),
    ...(duty.kind === 'starting' && protectionInput(motor, settings.thermalState)),
  }
}
