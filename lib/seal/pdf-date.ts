/** An instant as a PDF date in UTC, to the second. Source: ISO 32000-1, section 7.9.4. */
export function printPdfDate(at: Date): string {
  return `D:${at.toISOString().slice(0, 19).replace(/[-:T]/g, '')}Z`
}

/** Reads the one form that `printPdfDate` writes; undefined for any other text. */
export function readPdfDate(text: string): Date | undefined {
  const parts = /^D:(\d{4})(\d\d)(\d\d)(\d\d)(\d\d)(\d\d)Z$/.exec(text)
  if (!parts) return undefined
  const [, year, month, day, hour, minute, second] = parts
  const at = new Date(`${year}-${month}-${day}T${hour}:${minute}:${second}Z`)
  return Number.isNaN(at.getTime()) || printPdfDate(at) !== text ? undefined : at
}
