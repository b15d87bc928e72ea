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
export type PlateContradiction = 'rated-current' | 'breakdown-below-locked-rotor'

const percent = (value: number): string => `${(100 * value).toFixed(2)} %`

const isPart = (value: number): boolean => value > 0 && value < 1

const isPositive = (value: number | null): boolean => value === null || (value > 0 && Number.isFinite(value))

/** The reason and one sentence that says what to check; null where the plate may belong to a motor. */
export const refusePlate = (plate: Nameplate): { cause: PlateRefusal; detail: string } | null => {
  const { ratedPower, ratedVoltage, frequency, poles, ratedSpeed, efficiency, powerFactor } = plate
  const magnitudes = [ratedPower, ratedVoltage, frequency, poles, ratedSpeed, plate.lockedRotorCurrent]
  const optional = [plate.ratedCurrent, plate.lockedRotorTorque, plate.breakdownTorque]
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

/** What a reader must be told beside the circuit. */
export const plateContradictions = (plate: Nameplate): readonly PlateContradiction[] => {
  const found: PlateContradiction[] = []
  const current = plate.ratedPower / (Math.sqrt(3) * plate.ratedVoltage * plate.efficiency * plate.powerFactor)
  // Plates round efficiency, power factor and current to three digits each, so 1.5 % is still the same motor.
  if (plate.ratedCurrent !== null && Math.abs(plate.ratedCurrent / current - 1) > 0.015) found.push('rated-current')
  if (
    plate.breakdownTorque !== null &&
    plate.lockedRotorTorque !== null &&
    plate.breakdownTorque < plate.lockedRotorTorque
  )
    found.push('breakdown-below-locked-rotor')
  return found
}
