import { formatNumber } from '@/lib/quantity/format-number'
import { printQuantity } from '@/lib/quantity/print-quantity'
import { radianPerSecond } from '@/lib/units/si'
import { toRpm } from '@/lib/units/speed'

/** Stands where there is no figure. */
export const dash = '–'

export const decimals = (value: number | null, places: number): string =>
  value === null ? dash : formatNumber(value, { decimals: places })

export const percent = (value: number | null, places = 2): string =>
  value === null ? dash : formatNumber(100 * value, { decimals: places })

export const withPercent = (value: number, places = 2): string => `${percent(value, places)}\u2009%`

export const seconds = (value: number | null, places = 2): string => decimals(value, places)

export const withSeconds = (value: number, places = 2): string => `${seconds(value, places)}\u2009s`

/** Revolutions a minute of a speed in rad/s. */
export const rpm = (value: number | null): string =>
  value === null ? dash : formatNumber(toRpm(radianPerSecond(value)), { decimals: 0 })

/** Four significant digits, whole from a thousand on. */
export const current = (value: number): string => formatNumber(value, { digits: 4 })

export const volts = (value: number): string => printQuantity(value, 'voltage', { digits: 4 })

/** `3.80 + j 1.54` in mega of its unit. */
export const complexMega = ({ re, im }: { re: number; im: number }): string =>
  `${formatNumber(re / 1e6, { decimals: 2 })} ${im < 0 ? '−' : '+'} j\u2009${formatNumber(Math.abs(im) / 1e6, { decimals: 2 })}`
