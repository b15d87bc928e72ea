import type { Starter } from '../../engine/case-input'
import type { ChangeOver, StartCapacitor, StarterDuty } from '../../engine/starter-input'
import { ampere, hertz, newtonMetre, ohm, perUnit, radianPerSecond, second, siemens, volt, watt } from '../../units/si'
import { synchronousSpeed } from '../../units/speed'
import type { MotorRecord } from '../document/machine-records'
import type { ChangeOverRecord, StartCapacitorRecord, StarterRecord } from '../document/starter-record'
import { impedanceByAngle } from './impedance-by-angle'
import { ratedTorqueOf } from './nameplate-of-motor'

const changeOverInput = (changeOver: ChangeOverRecord): ChangeOver => {
  const { si } = changeOver.at
  switch (changeOver.kind) {
    case 'time':
      return { kind: 'time', at: second(si) }
    case 'speed':
      return { kind: 'speed', at: radianPerSecond(si) }
    case 'current':
      return { kind: 'current', below: ampere(si) }
    case 'voltage':
      return { kind: 'voltage', above: volt(si) }
  }
}

const orNull = (changeOver: ChangeOverRecord | null): ChangeOver | null => changeOver && changeOverInput(changeOver)
const ohms = (re: number, im: number) => ({ re: ohm(re), im: ohm(im) })

/**
 * A starting device; an autotransformer's own impedance converts with the rated voltage of the motor it starts, torques
 * in parts of that motor's rated torque.
 *
 * @param frequency Hz
 */
export const starterInput = (starter: StarterRecord, motor: MotorRecord, frequency: number): Starter => {
  switch (starter.kind) {
    case 'direct':
      return { kind: 'direct' }
    case 'autotransformer': {
      const { own, tap, middle } = starter
      return {
        kind: 'autotransformer',
        tap: perUnit(tap.si),
        impedance: own
          ? impedanceByAngle((own.impedance.si * motor.ratedVoltage.si ** 2) / own.rating.si, own.xOverR.si)
          : ohms(0, 0),
        changeOver: changeOverInput(starter.changeOver),
        gap: second(starter.gap.si),
        ...(middle && { middle: { impedance: ohms(0, middle.reactance.si), time: second(middle.time.si) } }),
      }
    }
    case 'star-delta': {
      const { transition } = starter
      return {
        kind: 'star-delta',
        changeOver: changeOverInput(starter.changeOver),
        gap: second(starter.gap.si),
        ...(transition && {
          transition: { resistance: ohm(transition.resistance.si), time: second(transition.time.si) },
        }),
      }
    }
    case 'reactor':
      return {
        kind: 'reactor',
        impedance: ohms(starter.resistance?.si ?? 0, starter.reactance.si),
        changeOver: changeOverInput(starter.changeOver),
      }
    case 'resistor':
      return {
        kind: 'resistor',
        impedance: ohms(starter.resistance.si, 0),
        changeOver: changeOverInput(starter.changeOver),
      }
    case 'soft-starter': {
      const { ramp, rampTime, kick, currentLimit, bypass } = starter
      const torque = (part: number) => newtonMetre(part * ratedTorqueOf(motor))
      return {
        kind: 'soft-starter',
        ramp:
          ramp.kind === 'voltage'
            ? { kind: 'voltage', from: perUnit(ramp.from.si), to: perUnit(ramp.to.si) }
            : { kind: 'torque', from: torque(ramp.from.si), to: torque(ramp.to.si) },
        rampTime: second(rampTime.si),
        kick: kick && { voltage: perUnit(kick.voltage.si), time: second(kick.time.si) },
        currentLimit: currentLimit && ampere(currentLimit.si),
        bypass: orNull(bypass),
      }
    }
    case 'part-winding':
      return {
        kind: 'part-winding',
        currentShare: perUnit(starter.currentShare.si),
        torqueShare: perUnit(starter.torqueShare.si),
        windingShare: perUnit(starter.windingShare.si),
        changeOver: changeOverInput(starter.changeOver),
      }
    case 'rotor-resistance':
      return {
        kind: 'rotor-resistance',
        steps: starter.steps.map(({ resistance, changeOver }) => ({
          resistance: ohm(resistance.si),
          changeOver: changeOverInput(changeOver),
        })),
      }
    case 'captive-transformer': {
      const { primary, secondary, rating, impedance, xOverR } = starter
      return {
        kind: 'captive-transformer',
        ratio: perUnit(secondary.si / primary.si),
        impedance: impedanceByAngle((impedance.si * primary.si ** 2) / rating.si, xOverR.si),
      }
    }
    case 'drive':
      return driveInput(starter, motor, frequency)
  }
}

const driveInput = (
  starter: Extract<StarterRecord, { kind: 'drive' }>,
  motor: MotorRecord,
  frequency: number,
): Starter => ({
  kind: 'drive',
  speed: radianPerSecond(starter.speed.si),
  rampTime: second(starter.rampTime.si),
  torqueLimit: starter.torqueLimit && newtonMetre(starter.torqueLimit.si * ratedTorqueOf(motor)),
  currentLimit: starter.currentLimit && ampere(starter.currentLimit.si),
  ratedCurrent: ampere(starter.motorCurrent.si),
  magnetising: perUnit(starter.magnetising.si),
  losses: watt(motor.ratedPower.si * (1 / starter.efficiency.si - 1)),
  ratedSlip: perUnit(1 - motor.ratedSpeed.si / synchronousSpeed(hertz(frequency), motor.poles)),
  displacementFactor: perUnit(starter.displacementFactor.si),
  totalFactor: perUnit(starter.totalFactor.si),
  undervoltage: starter.undervoltage && volt(starter.undervoltage.si),
  bypass: orNull(starter.bypass),
})

/** Capacitors switched with a start, each by its own rated voltage. */
export const startCapacitorInput = ({ power, ratedVoltage, on, off }: StartCapacitorRecord): StartCapacitor => ({
  susceptance: siemens(power.si / ratedVoltage.si ** 2),
  on: orNull(on),
  off: orNull(off),
})

/** What a device may be asked for, beside what the study plans; undefined where the record has no figures. */
export const starterDutyInput = (starter: StarterRecord, plannedPerHour: number): StarterDuty | undefined => {
  if (!('dutyLimits' in starter) || starter.dutyLimits === null) return undefined
  const { secondsPerStart, startsPerHour } = starter.dutyLimits
  return { secondsPerStart: secondsPerStart && second(secondsPerStart.si), startsPerHour, plannedPerHour }
}
