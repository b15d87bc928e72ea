import type { SupplyRecord } from '../document/network-records'

/** The level of a supply as typed: `90 MVA`, `0.1 Ω + j 1.2 Ω`, `1 MVA generator`. */
export const levelText = ({ level }: Pick<SupplyRecord, 'level'>): string => {
  switch (level.form) {
    case 'power':
      return level.power.text
    case 'current':
      return level.current.text
    case 'impedance':
      return `${level.resistance.text} + j ${level.reactance.text}`
    case 'generator':
      return `${level.rating.text} generator`
  }
}

/** Whether a level is a short-circuit level that may contain a voltage factor and asks for X/R. */
export const isShortCircuitLevel = ({ level }: Pick<SupplyRecord, 'level'>): boolean =>
  level.form === 'power' || level.form === 'current'
