import { isTabulated, type LeakageSaturation, type MachineModel } from '../case-input'
import type { MachineTable } from './machine-table'

export const saturationOf = (model: MachineModel): LeakageSaturation | null =>
  isTabulated(model) ? null : (model.saturation ?? null)

/** How much of the saturation acts at a slip: none at running speed, all of it from breakdown on. */
export function saturationShare({ noneBelow, fullFrom }: LeakageSaturation, slip: number): number {
  const s = Math.abs(slip)
  if (s >= fullFrom) return 1
  return s <= noneBelow ? 0 : (s - noneBelow) / (fullFrom - noneBelow)
}

/**
 * Lets current and torque of machine i fall with their own powers of the voltage, after `evaluateMachine`.
 *
 * Current ∝ u^α and airgap power ∝ u^β; the input covers the airgap power and losses that go with the square of the
 * current, which sets the power factor. Above rated voltage nothing changes. Exponents act from breakdown slip on and
 * fade to 1 and 2 towards rated slip. Typical 1.05 to 1.15 and 2.1 to 2.3 (common practice, no source).
 *
 * @param voltage winding voltage in parts of rated
 */
export function saturate(
  table: MachineTable,
  i: number,
  saturation: LeakageSaturation,
  slip: number,
  voltage: number,
): void {
  const share = saturationShare(saturation, slip)
  if (share === 0 || !(voltage < 1) || voltage <= 0) return
  const current = voltage ** (share * (saturation.current - 1))
  const torque = voltage ** (share * (saturation.torque - 2))
  const re = table.admittance[2 * i]!
  const im = table.admittance[2 * i + 1]!
  const airgap = table.airgap[i]!
  const size = Math.hypot(re, im) * current
  const real = Math.min(size, airgap * torque + (re - airgap) * current * current)
  table.admittance[2 * i] = real
  table.admittance[2 * i + 1] = Math.sign(im) * Math.sqrt(size * size - real * real)
  table.airgap[i] = airgap * torque
}
