import 'server-only'
import { publicKeyOf } from '@/app/(account)/_signing/public-key-of'
import { myCertificate } from '@/lib/server/people/queries'
import { listedCertificates } from '@/lib/server/signoff/queries'
import { ask, seek } from './ask'

/** The signing certificate of the signed-in person at an organisation. */
export interface CertificateInForce {
  fingerprint: string
  notAfter: string
  /** Public key, DER, base64: the browser finds the key that belongs to it. */
  spki: string
}

/** Null when the person has none there, or it has run out or was revoked. */
export const ownCertificate = async (organisationId: string): Promise<CertificateInForce | null> => {
  const own = await seek(myCertificate, { organisationId })
  if (!own) return null
  const listed = (await ask(listedCertificates, { organisationId })).find((one) => one.fingerprint === own.fingerprint)
  if (!listed) return null
  const { fingerprint, notAfter } = own
  return { fingerprint, notAfter, spki: publicKeyOf(listed.certificate) }
}
