import type { Nameplate } from './nameplate'

/** Why no circuit can belong to a plate. */
export type PlateRefusal =
  | 'bad-value'
  | 'speed-not-below-synchronous'
  | 'efficiency-above-slip'
  | 'breakdown-not-above-rated'
  | 'locked-rotor-current-not-above-rated'
  | 'locked-rotor-torque-above-input'

/** What does not fit together on a plate and still leaves a circuit that comes near. */
export type PlateContradiction =
  /** Rated current against P/(√3·U·η·cos φ). */
  | 'rated-current'
  /** Rated torque against P/ω. */
  | 'rated-torque'
  /** Locked-rotor current against the range of the code letter. */
  | 'locked-rotor-code'
  | 'breakdown-below-locked-rotor'
  /** The least torque between standstill and breakdown cannot exceed the torque at either end. */
  | 'pull-up-above-locked-rotor'
  | 'pull-up-above-breakdown'

/** Plates round efficiency, power factor and current to three digits each: 1.5 % is still the same motor. */
const rounding = 0.015

const percent = (value: number): string => `${(100 * value).toFixed(2)} %`

const isPart = (value: number): boolean => value > 0 && value < 1

const isPositive = (value: number | null): boolean => value === null || (value > 0 && Number.isFinite(value))

/** The reason and one sentence that says what to check; null where the plate may belong to a motor. */
export const refusePlate = (plate: Nameplate): { cause: PlateRefusal; detail: string } | null => {
  const { ratedPower, ratedVoltage, frequency, poles, ratedSpeed, efficiency, powerFactor } = plate
  const magnitudes = [ratedPower, ratedVoltage, frequency, poles, ratedSpeed, plate.lockedRotorCurrent]
  const optional = [
    plate.ratedCurrent,
    plate.lockedRotorTorque,
    plate.breakdownTorque,
    plate.ratedTorque ?? null,
    plate.pullUpTorque ?? null,
  ]
  const lockedPowerFactor = plate.lockedRotorPowerFactor
  const parts = [efficiency, powerFactor, ...(lockedPowerFactor === null ? [] : [lockedPowerFactor])]
  if (![...magnitudes, ...optional].every(isPositive) || !parts.every(isPart) || poles % 2 !== 0)
    return {
      cause: 'bad-value',
      detail: 'Every value must be above zero, efficiency and power factors below 1, poles even.',
    }

  const synchronous = (4 * Math.PI * frequency) / poles
  const slip = 1 - ratedSpeed / synchronous
  if (!(slip > 0 && slip < 0.3)) {
    const rpm = ((synchronous * 30) / Math.PI).toFixed(0)
    return {
      cause: 'speed-not-below-synchronous',
      detail: `Rated speed must lie a little below the synchronous ${rpm} r/min; check speed, poles and frequency.`,
    }
  }
  if (efficiency >= 1 - slip)
    return {
      cause: 'efficiency-above-slip',
      detail: `Efficiency ${percent(efficiency)} is not possible at slip ${percent(slip)}: the rotor alone loses as much as the slip; check efficiency and rated speed.`,
    }
  const ratedTorque = ratedPower / ratedSpeed
  if (plate.breakdownTorque !== null && plate.breakdownTorque <= ratedTorque)
    return {
      cause: 'breakdown-not-above-rated',
      detail: 'Breakdown torque must be above rated torque; check its unit or multiple.',
    }
  const input = ratedPower / (efficiency * powerFactor)
  const lockedInput = Math.sqrt(3) * ratedVoltage * plate.lockedRotorCurrent
  if (lockedInput <= 1.5 * input)
    return {
      cause: 'locked-rotor-current-not-above-rated',
      detail: 'Locked-rotor current must be well above rated current; check its unit or multiple.',
    }
  const airgap = (plate.lockedRotorTorque ?? 0) * synchronous
  if (airgap >= lockedInput * (lockedPowerFactor ?? 1))
    return {
      cause: 'locked-rotor-torque-above-input',
      detail:
        'Locked-rotor torque needs more power than the motor draws at standstill; check torque, current and power factor at locked rotor.',
    }
  return null
}

const differs = (value: number | null | undefined, from: number): boolean =>
  (value ?? null) !== null && Math.abs(value! / from - 1) > rounding

/**
 * Which of the values given cannot all be true: the usual six, of which the sixth, an efficiency at or above 1 − slip,
 * is refused beforehand. Rounding of a plate, 1.5 %, is no contradiction.
 */
export const plateContradictions = (plate: Nameplate): readonly PlateContradiction[] => {
  const { ratedPower, ratedSpeed, ratedVoltage, lockedRotorTorque: locked, breakdownTorque: breakdown } = plate
  const pullUp = plate.pullUpTorque ?? null
  const code = plate.lockedRotorCode ?? null
  const lockedInput = Math.sqrt(3) * ratedVoltage * plate.lockedRotorCurrent
  const current = ratedPower / (Math.sqrt(3) * ratedVoltage * plate.efficiency * plate.powerFactor)
  const above = (value: number | null, other: number | null): boolean =>
    value !== null && other !== null && value > other * (1 + 1e-9)
  const found: readonly (readonly [PlateContradiction, boolean])[] = [
    ['rated-current', differs(plate.ratedCurrent, current)],
    ['rated-torque', differs(plate.ratedTorque, ratedPower / ratedSpeed)],
    [
      'locked-rotor-code',
      code !== null &&
        (lockedInput < code.from * (1 - rounding) ||
          (code.below !== null && lockedInput >= code.below * (1 + rounding))),
    ],
    ['breakdown-below-locked-rotor', above(locked, breakdown)],
    ['pull-up-above-locked-rotor', above(pullUp, locked)],
    ['pull-up-above-breakdown', above(pullUp, breakdown)],
  ]
  return found.flatMap(([kind, holds]) => (holds ? [kind] : []))
}
