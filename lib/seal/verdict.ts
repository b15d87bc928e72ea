/** What the whole file is worth; worst first. */
export type OverallVerdict = 'unreadable' | 'not-signed' | 'changed' | 'unknown-signer' | 'incomplete' | 'valid'

/** Whether the certificate counts: on the organisation's list and in force when the signature was made. */
export type Trust = 'trusted' | 'unknown' | 'expired' | 'revoked'

/** Each kind of defect that the check can find. */
export type FindingKind =
  | 'structure'
  | 'trailing-bytes'
  | 'unsigned-revision'
  | 'changed-page'
  | 'changed-object'
  | 'byte-range'
  | 'padding'
  | 'signature-form'
  | 'content-altered'
  | 'signature-value'
  | 'certificate-form'
  | 'look-alike'
  | 'missing-signer'
  | 'same-signer'
  | 'order'

/** One defect: its kind, one sentence, and where it is. */
export interface Finding {
  readonly kind: FindingKind
  readonly sentence: string
  readonly field?: string
  /** Pages, counted from 1, whose look the defect can change. */
  readonly pages?: readonly number[]
}

/** Who a certificate was issued to, as written in it. */
export interface CertificateSubject {
  readonly name: string
  readonly email: string
  readonly organisation: string
}

/** What one signature says and whether it still holds. */
export interface SignatureVerdict {
  readonly field: string
  /** The words of the block, for example "Prepared by". */
  readonly role: string
  readonly signer: CertificateSubject
  /** SHA-256 of the certificate, 64 lower-case hexadecimal digits. */
  readonly fingerprint: string
  /** The instant stated in the file (ISO 8601, UTC): it is the signing service's statement, not a time stamp. */
  readonly signedAt: string | null
  readonly reason: string
  readonly trust: Trust
  readonly trustSentence: string
  /** The bytes under this signature: the file up to and including its own revision. */
  readonly covers: {
    readonly bytes: number
    readonly ofBytes: number
    readonly revision: number
    readonly ofRevisions: number
  }
  /** The bytes under the signature are those that were signed. */
  readonly intact: boolean
  /** Intact, and nothing after it changed anything but the next signature's own field. */
  readonly stands: boolean
}

/** The result of checking one file. */
export interface ReportVerdict {
  readonly overall: OverallVerdict
  readonly sentence: string
  /** SHA-256 of the file, 64 lower-case hexadecimal digits. */
  readonly sha256: string
  /** The file is, byte for byte, one that the organisation has issued. */
  readonly registered: boolean
  readonly signatures: readonly SignatureVerdict[]
  readonly findings: readonly Finding[]
}
