import type { Wording } from '../wording/en'

/** `12 May 2026` of an ISO date or instant. */
export const printDate = (iso: string, { frame }: Wording): string => {
  const [year = '', month = '1', day = '1'] = iso.slice(0, 10).split('-')
  return `${Number(day)} ${frame.months[Number(month) - 1] ?? ''} ${year}`
}

/** `12 May 2026, 09:30 UTC` of an ISO instant. */
export const printInstant = (iso: string, words: Wording): string => {
  const utc = new Date(iso).toISOString()
  return `${printDate(utc, words)}, ${utc.slice(11, 16)} UTC`
}
