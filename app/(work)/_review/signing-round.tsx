import type { CertificateInForce } from '@/app/_action/own-certificate'
import { signOffWords } from '@/app/_words/state-words'
import type { RevisionView } from '@/lib/server/revisions/view'
import { signOffRoles } from '@/lib/study/states'
import { Moment } from '@/lib/ui/moment'
import { SignHere } from './sign-here'

interface SigningRoundProps {
  revision: RevisionView
  /** Of the person who looks. */
  certificate: CertificateInForce | null
}

/** Who signs as what, who has, and the button of whoever is due. */
export function SigningRound({ revision, certificate }: SigningRoundProps) {
  const { revisionId, signoffs, expectedSigners, allowed } = revision
  const due = signOffRoles.find((role) => allowed.includes(`sign-${role}`))
  return (
    <section aria-labelledby="sign-offs" className="flex flex-col gap-2">
      <h2 id="sign-offs" className="m-0 text-title font-semibold">
        Sign-offs
      </h2>
      <table className="dense w-fit max-w-full border border-hair bg-sheet">
        <caption className="sr-only">Signatures of this revision</caption>
        <thead>
          <tr>
            <th scope="col">As</th>
            <th scope="col">Person</th>
            <th scope="col">Signed</th>
            <th scope="col">Certificate</th>
          </tr>
        </thead>
        <tbody>
          {signOffRoles.map((role) => {
            const given = signoffs.find((one) => one.role === role)
            const expected = expectedSigners.find((one) => one.role === role)
            return (
              <tr key={role}>
                <th scope="row">{signOffWords[role]}</th>
                <td>{given?.person ?? expected?.person ?? 'not known yet'}</td>
                <td>{given ? <Moment at={given.at} /> : 'not yet'}</td>
                <td className="font-normal">
                  {given ? (
                    <span title={`SHA-256 ${given.certificate}`}>{given.certificate.slice(0, 16)}…</span>
                  ) : expected?.person && !expected.hasCertificate ? (
                    'no signing key yet'
                  ) : (
                    '–'
                  )}
                </td>
              </tr>
            )
          })}
        </tbody>
      </table>
      <SignHere revisionId={revisionId} due={due ?? null} spki={certificate?.spki ?? null} />
      <p className="m-0 max-w-3xl text-label text-soft">
        Each signature is made with the signer’s own key in their own browser. It shows integrity and who stands behind
        the report within this organisation; it is not a qualified electronic signature and not a professional seal.
      </p>
    </section>
  )
}
