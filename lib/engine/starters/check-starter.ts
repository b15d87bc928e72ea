import { isTabulated, type MachineModel, type Starter } from '../case-input'
import type { ChangeOver, DriveStarter, SoftStarter, StartCapacitor } from '../starter-input'

const positive = (value: number): boolean => Number.isFinite(value) && value > 0
const notNegative = (value: number): boolean => Number.isFinite(value) && value >= 0
const isShare = (value: number): boolean => positive(value) && value <= 1
const isImpedance = ({ re, im }: { re: number; im: number }): boolean => notNegative(re) && Number.isFinite(im)

function changeOverProblem(changeOver: ChangeOver | null): string | null {
  if (changeOver === null) return null
  if (changeOver.kind === 'time' || changeOver.kind === 'speed') {
    return notNegative(changeOver.at) ? null : 'the change-over must lie at zero or later.'
  }
  const level = changeOver.kind === 'current' ? changeOver.below : changeOver.above
  return positive(level) ? null : 'the change-over needs a current or voltage above zero.'
}

/** What makes a starting device impossible to compute, or null. Slip rings need a circuit with one rotor branch. */
export function starterProblem(starter: Starter, circuit: MachineModel): string | null {
  switch (starter.kind) {
    case 'direct':
      return null
    case 'autotransformer':
    case 'star-delta': {
      if (!notNegative(starter.gap)) return 'the gap of the change-over must be zero or more.'
      if (starter.kind === 'star-delta') {
        const { transition } = starter
        const sound = !transition || (positive(transition.resistance) && positive(transition.time))
        return sound
          ? changeOverProblem(starter.changeOver)
          : 'the transition needs a resistance and a time above zero.'
      }
      if (!isShare(starter.tap)) return 'the tap must lie between 0 and 1.'
      if (!isImpedance(starter.impedance)) return 'the autotransformer needs an impedance of zero or more.'
      const { middle } = starter
      if (middle && !(isImpedance(middle.impedance) && positive(middle.time)))
        return 'the middle step needs an impedance of zero or more and a time above zero.'
      return changeOverProblem(starter.changeOver)
    }
    case 'reactor':
    case 'resistor':
      if (!isImpedance(starter.impedance) || Math.hypot(starter.impedance.re, starter.impedance.im) === 0)
        return 'the series impedance must be above zero.'
      return changeOverProblem(starter.changeOver)
    case 'soft-starter':
      return softStarterProblem(starter) ?? changeOverProblem(starter.bypass)
    case 'part-winding': {
      const shares = [starter.currentShare, starter.torqueShare, starter.windingShare]
      if (!shares.every(isShare)) return 'the shares of the part winding must lie between 0 and 1.'
      return changeOverProblem(starter.changeOver)
    }
    case 'rotor-resistance': {
      if (isTabulated(circuit) || circuit.cages.length !== 1)
        return 'a motor with slip rings has one rotor branch in its circuit.'
      if (!starter.steps.every(({ resistance }) => positive(resistance)))
        return 'each rotor step needs a resistance above zero.'
      return starter.steps.reduce<string | null>((found, one) => found ?? changeOverProblem(one.changeOver), null)
    }
    case 'captive-transformer':
      return positive(starter.ratio) && isImpedance(starter.impedance)
        ? null
        : 'the captive transformer needs a ratio above zero and an impedance of zero or more.'
    case 'drive':
      return driveProblem(starter) ?? changeOverProblem(starter.bypass)
  }
}

function softStarterProblem({ ramp, rampTime, kick, currentLimit }: SoftStarter): string | null {
  if (!positive(ramp.from) || ramp.to < ramp.from) return 'the ramp of the soft starter must rise from above zero.'
  if (ramp.kind === 'voltage' && ramp.to > 1) return 'the voltage ramp must end at the whole voltage or below.'
  if (!notNegative(rampTime)) return 'the ramp of the soft starter needs a time of zero or more.'
  if (kick !== null && !(isShare(kick.voltage) && positive(kick.time)))
    return 'the kick needs a voltage between 0 and 1 and a time above zero.'
  return currentLimit === null || positive(currentLimit) ? null : 'the current limit must be above zero.'
}

function driveProblem(drive: DriveStarter): string | null {
  if (!positive(drive.speed) || !positive(drive.rampTime)) return 'the drive needs a speed and a ramp time above zero.'
  if (!positive(drive.ratedCurrent) || !notNegative(drive.losses))
    return 'the drive needs the rated current of its motor and losses of zero or more.'
  if (!notNegative(drive.magnetising) || drive.magnetising >= 1)
    return 'the no-load current must lie between 0 and the rated current.'
  if (!notNegative(drive.ratedSlip) || drive.ratedSlip >= 1) return 'the rated slip must lie between 0 and 1.'
  if (!isShare(drive.displacementFactor) || !isShare(drive.totalFactor))
    return 'the power factors of the drive must lie between 0 and 1.'
  if (drive.totalFactor > drive.displacementFactor)
    return 'the total power factor of the drive cannot exceed that of the fundamental.'
  if (drive.torqueLimit !== null && !positive(drive.torqueLimit)) return 'the torque limit must be above zero.'
  if (drive.currentLimit !== null && drive.currentLimit <= drive.magnetising * drive.ratedCurrent)
    return 'the current limit of the drive must exceed the no-load current.'
  return drive.undervoltage === null || positive(drive.undervoltage) ? null : 'the undervoltage must be above zero.'
}

/** What makes the capacitors of a start impossible to compute, or null. */
export function capacitorsProblem(capacitors: readonly StartCapacitor[]): string | null {
  for (const { susceptance, on, off } of capacitors) {
    if (!positive(susceptance)) return 'each start capacitor needs a susceptance above zero.'
    const problem = changeOverProblem(on) ?? changeOverProblem(off)
    if (problem !== null) return problem
  }
  return null
}
