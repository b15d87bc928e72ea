/** What a server action answers: done, or one sentence about why not. */
export type Outcome<Answer = unknown> =
  | ({ readonly ok: true } & Answer)
  | { readonly ok: false; readonly message: string }
