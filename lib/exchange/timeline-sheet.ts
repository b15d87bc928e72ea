import { csvText } from './csv-text'

/** An event as a file lists it. */
export interface SheetEvent {
  sequence: number
  at: string
  by: string
  action: string
  subject: { kind: string; id: string }
  payload: unknown
  hash: string
}

/** Events of a project as comma-separated values; the hash of each lets a reader see that none was changed since. */
export const timelineCsv = (events: readonly SheetEvent[]): string =>
  csvText(
    {
      name: 'timeline',
      heads: ['sequence', 'at', 'by', 'what', 'kind', 'id', 'detail', 'hash'],
      rows: events.map(({ sequence, at, by, action, subject, payload, hash }) => [
        sequence,
        at,
        by,
        action,
        subject.kind,
        subject.id,
        JSON.stringify(payload),
        hash,
      ]),
    },
    true,
  )
