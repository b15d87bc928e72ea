/** A certificate on the organisation's append-only list. */
export interface ListedCertificate {
  /** The certificate itself, DER. */
  readonly certificate: Uint8Array
  /** When it was put on the list: a sign-off made before does not count. */
  readonly listedAt: Date
  /** When it was revoked, if it was: what was signed before stands. */
  readonly revokedAt?: Date | undefined
}

/** What the check trusts. Names are never trusted. */
export interface VerificationContext {
  /** SHA-256 of each file that the organisation has issued, lower-case hexadecimal; at least that of the file in question if it is known. */
  readonly registered: readonly string[]
  readonly listed: readonly ListedCertificate[]
  /** The fields that must be signed, in the order of signing. */
  readonly expected: readonly string[]
  /** The instant of the check. */
  readonly now: Date
}
