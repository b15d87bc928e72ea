import type { SupplyRecord } from '@/lib/study/document/network-records'

/** `90 MVA, X/R 2.5` as typed. */
export const levelWords = ({ level, xOverR }: SupplyRecord): string => {
  const size =
    level.form === 'power'
      ? level.power.text
      : level.form === 'current'
        ? level.current.text
        : `${level.resistance.text} + j ${level.reactance.text}`
  return xOverR === null ? size : `${size}, X/R ${xOverR.text}`
}
