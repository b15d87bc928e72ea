import { chooseDisplayUnit, type DisplayUnit, displayUnits, namedDisplayUnit, type UnitSystem } from './display-units'
import { formatNumber, type NumberFormat } from './format-number'
import type { QuantityName } from './quantity-name'

export interface PrintOptions extends NumberFormat {
  /** A unit label such as `kV`, `%`, `lb·ft`; without it the size of the value decides. */
  unit?: string
  system?: UnitSystem
}

/** The unit for a value as it will be rounded, so that 999.9999 V does not print as 1000 V. */
const unitFor = (si: number, quantity: QuantityName, options: PrintOptions): DisplayUnit => {
  if (options.unit !== undefined) {
    const named = namedDisplayUnit(quantity, options.unit)
    if (!named) throw new RangeError(`${quantity} is not printed in ${options.unit}`)
    return named
  }
  const units = displayUnits(quantity, options.system ?? 'SI')
  const rounded = Number(si.toPrecision(options.digits ?? 6))
  return chooseDisplayUnit(rounded, units)
}

/**
 * A value in SI as a reader sees it, for example `11 kV`, `−5 %`, `10 589 N·m`: number, thin space, unit.
 * Throws a RangeError when asked for a unit that the quantity is not printed in; `–` stands for a value that is not finite.
 */
export const printQuantity = (si: number, quantity: QuantityName, options: PrintOptions = {}): string => {
  if (!Number.isFinite(si)) return '–'
  const unit = unitFor(si, quantity, options)
  const number = formatNumber(si / unit.factor, options)
  return unit.label === '' ? number : `${number}\u2009${unit.label}`
}
