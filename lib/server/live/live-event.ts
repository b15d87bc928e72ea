/** What an open page learns of something that happened: who did what to what, never the text of it. */
export interface LiveEvent {
  /** Place in the project's chain; also the id by which a browser says what it has seen. */
  sequence: number
  action: string
  by: string
  actorId: string | null
  subject: { kind: string; id: string }
  /** The revision it concerns; null where it concerns live records, a study or the project. */
  revisionId: string | null
}

/** Somebody who has a page of the project open. */
export interface Presence {
  /** One open page. */
  connection: string
  userId: string
  name: string
  /** `revision/…` or `study/…`; empty for other pages. */
  where: string
}
