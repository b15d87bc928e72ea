import { formatNumber } from '@/lib/quantity/format-number'
import { printQuantity } from '@/lib/quantity/print-quantity'

/** Figures of results, each at the digits that a table of this trade shows. */
export const voltage = (value: number): string => printQuantity(value, 'voltage', { digits: 4 })
export const current = (value: number): string => printQuantity(value, 'current', { digits: 4 })
export const percent = (value: number, decimals = 2): string => `${formatNumber(100 * value, { decimals })}\u2009%`
export const perUnit = (value: number): string => `${formatNumber(value, { decimals: 3 })}\u2009pu`
export const seconds = (value: number): string => printQuantity(value, 'time', { unit: 's', decimals: 2 })
export const speed = (value: number): string => printQuantity(value, 'speed', { decimals: 0 })
export const torque = (value: number): string => printQuantity(value, 'torque', { digits: 4 })
export const activePower = (value: number): string => printQuantity(value, 'active-power', { unit: 'MW', decimals: 3 })
export const reactivePower = (value: number): string =>
  printQuantity(value, 'reactive-power', { unit: 'Mvar', decimals: 3 })
export const energy = (value: number): string => `${formatNumber(value / 1e6, { decimals: 3 })}\u2009MJ`
export const currentSquaredTime = (value: number): string => `${formatNumber(value / 1e6, { decimals: 4 })}\u2009MA²s`

/** A figure, or a dash where the state was not reached. */
export const orDash = (value: number | null | undefined, print: (value: number) => string): string =>
  value === null || value === undefined ? '–' : print(value)
