import { VerdictMark } from '@/lib/ui/verdict'
import type { SignatureLine } from './verify-answer'

/** Every signature: who, as what, when, by which certificate, over which part of the file, and whether it stands. */
export function SignatureTable({ signatures }: { signatures: readonly SignatureLine[] }) {
  return (
    <section aria-labelledby="signatures" className="grid gap-2">
      <h2 id="signatures" className="m-0 text-body font-semibold">
        Signatures
      </h2>
      <div className="overflow-x-auto">
        <table className="dense bg-sheet">
          <thead>
            <tr>
              <th scope="col">Sign-off</th>
              <th scope="col">Signer</th>
              <th scope="col">Stated time</th>
              <th scope="col">Certificate</th>
              <th scope="col">Covers</th>
              <th scope="col">Signature</th>
            </tr>
          </thead>
          <tbody>
            {signatures.map((line) => (
              <SignatureRow line={line} key={line.field} />
            ))}
          </tbody>
        </table>
      </div>
    </section>
  )
}

function SignatureRow({ line }: { line: SignatureLine }) {
  const { role, signer, signedAt, trust, trustSentence, fingerprint, covers, stands, intact } = line
  return (
    <tr>
      <th scope="row">{role}</th>
      <td>
        {signer.name}
        <span className="block text-soft">
          {signer.email}
          {signer.organisation ? `, ${signer.organisation}` : ''}
        </span>
      </td>
      <td className="whitespace-nowrap">
        {signedAt ? <time dateTime={signedAt}>{`${signedAt.slice(0, 16).replace('T', ' ')} UTC`}</time> : 'none'}
      </td>
      <td>
        <span className={trust === 'trusted' ? '' : 'text-fails'}>{trustSentence}</span>
        <span className="block text-soft" title={fingerprint ? `SHA-256 ${fingerprint}` : undefined}>
          {shortPrint(fingerprint)}
        </span>
      </td>
      <td>{coverage(covers)}</td>
      <td className={`whitespace-nowrap ${stands ? 'text-meets' : 'text-fails'}`}>
        <VerdictMark word={stands ? 'meets' : 'fails'} /> {stands ? 'stands' : intact ? 'overtaken' : 'broken'}
      </td>
    </tr>
  )
}

const shortPrint = (fingerprint: string) => (fingerprint.slice(0, 16).toUpperCase().match(/.{4}/g) ?? []).join(' ')

function coverage({ bytes, ofBytes, revision, ofRevisions }: SignatureLine['covers']): string {
  if (bytes === ofBytes) return 'the whole file'
  return `the file up to its state ${revision} of ${ofRevisions}`
}
