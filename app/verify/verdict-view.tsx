import { VerdictMark, type VerdictWord } from '@/lib/ui/verdict'
import { RecomputeSlot } from './recompute'
import { SignatureTable } from './signature-table'
import type { OverallWord, VerifyAnswer } from './verify-answer'

const marks: Record<OverallWord, { mark: VerdictWord; colour: string; words: string }> = {
  valid: { mark: 'meets', colour: 'text-meets', words: 'Valid' },
  incomplete: { mark: 'close', colour: 'text-close', words: 'Not complete' },
  'unknown-signer': { mark: 'fails', colour: 'text-fails', words: 'Signed by others' },
  changed: { mark: 'fails', colour: 'text-fails', words: 'Changed' },
  'not-signed': { mark: 'not-assessed', colour: 'text-soft', words: 'Not signed' },
  unreadable: { mark: 'not-assessed', colour: 'text-soft', words: 'Cannot be read' },
}

/** What the check says of one file: the verdict, what was found, who signed, and the data inside. */
export function VerdictView({ name, answer }: { name: string; answer: VerifyAnswer }) {
  const { mark, colour, words } = marks[answer.overall]
  const { standing, findings, signatures, study, results } = answer
  return (
    <>
      <section aria-labelledby="verdict" className="grid gap-2 border border-rule bg-sheet px-4 py-3">
        <h2 id="verdict" className={`m-0 flex items-baseline gap-2 text-title font-semibold ${colour}`}>
          <VerdictMark word={mark} />
          {words}
        </h2>
        <p className="m-0">{answer.sentence}</p>
        {standing ? (
          <p className={`m-0 ${standing.current ? '' : 'font-semibold text-close'}`}>{standing.sentence}</p>
        ) : null}
        {findings.length > 0 ? (
          <ul className="m-0 grid gap-1 pl-5">
            {findings.map(({ sentence }) => (
              <li key={sentence}>{sentence}</li>
            ))}
          </ul>
        ) : null}
        <dl className="m-0 grid grid-cols-[auto_minmax(0,1fr)] gap-x-3 text-dense text-soft">
          <dt>File</dt>
          <dd className="m-0 break-words">{name}</dd>
          <dt>SHA-256</dt>
          <dd className="m-0 break-all">{answer.sha256}</dd>
          <dt>Register</dt>
          <dd className="m-0">{answer.registered ? 'byte for byte an issued file' : 'not among the issued files'}</dd>
        </dl>
      </section>
      {signatures.length > 0 ? <SignatureTable signatures={signatures} /> : null}
      {study === null ? null : <RecomputeSlot study={study} results={results} />}
    </>
  )
}
