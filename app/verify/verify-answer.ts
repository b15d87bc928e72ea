/** One signature as the page shows it. */
export interface SignatureLine {
  readonly field: string
  readonly role: string
  readonly signer: { readonly name: string; readonly email: string; readonly organisation: string }
  readonly fingerprint: string
  readonly signedAt: string | null
  readonly trust: 'trusted' | 'unknown' | 'expired' | 'revoked'
  readonly trustSentence: string
  readonly covers: {
    readonly bytes: number
    readonly ofBytes: number
    readonly revision: number
    readonly ofRevisions: number
  }
  readonly intact: boolean
  readonly stands: boolean
}

export type OverallWord = 'unreadable' | 'not-signed' | 'changed' | 'unknown-signer' | 'incomplete' | 'valid'

/** What became of the revision whose file this is, in one sentence; null where the file is not registered. */
export interface StandingLine {
  readonly current: boolean
  readonly sentence: string
}

/** What the check answers: everything that the page shows, and the data that travel inside the file. */
export interface VerifyAnswer {
  readonly overall: OverallWord
  readonly sentence: string
  readonly sha256: string
  readonly registered: boolean
  readonly organisation: string | null
  readonly standing: StandingLine | null
  readonly signatures: readonly SignatureLine[]
  readonly findings: readonly { readonly sentence: string }[]
  readonly study: string | null
  readonly results: string | null
}

/** A refused check: one sentence that says what to do. */
export interface VerifyRefusal {
  readonly message: string
}
