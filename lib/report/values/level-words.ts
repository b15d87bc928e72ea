import type { SupplyRecord } from '@/lib/study/document/network-records'
import { isShortCircuitLevel, levelText } from '@/lib/study/words/level-text'

/** `90 MVA, X/R 2.5` as typed. */
export const levelWords = (supply: SupplyRecord): string =>
  supply.xOverR === null || !isShortCircuitLevel(supply)
    ? levelText(supply)
    : `${levelText(supply)}, X/R ${supply.xOverR.text}`
