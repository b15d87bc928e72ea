export type VerdictWord = 'meets' | 'close' | 'fails' | 'not-assessed'

const words: Record<VerdictWord, string> = {
  meets: 'meets',
  close: 'close',
  fails: 'fails',
  'not-assessed': 'not assessed',
}

const colours: Record<VerdictWord, string> = {
  meets: 'text-meets',
  close: 'text-close',
  fails: 'text-fails',
  'not-assessed': 'text-soft',
}

/** The shape alone tells the verdict in a grey print: disc, half disc, barred triangle, dash. */
export function VerdictMark({ word }: { word: VerdictWord }) {
  return (
    <svg viewBox="0 0 12 12" className="inline-block size-3 shrink-0 align-[-1px]" aria-hidden="true">
      {word === 'meets' && <circle cx="6" cy="6" r="4.6" fill="currentColor" />}
      {word === 'close' && (
        <>
          <circle cx="6" cy="6" r="4.2" fill="none" stroke="currentColor" strokeWidth="1.2" />
          <path d="M6 1.8a4.2 4.2 0 0 0 0 8.4z" fill="currentColor" />
        </>
      )}
      {word === 'fails' && (
        <path
          d="M6 1.4 11 10.4H1zM6 4.6v3"
          fill="none"
          stroke="currentColor"
          strokeWidth="1.4"
          strokeLinejoin="round"
        />
      )}
      {word === 'not-assessed' && <path d="M2 6h8" stroke="currentColor" strokeWidth="1.4" />}
    </svg>
  )
}

/** Word, mark and colour, in that order of weight. */
export function Verdict({ word, reason, strong = false }: { word: VerdictWord; reason?: string; strong?: boolean }) {
  return (
    <span className={`inline-flex items-baseline gap-1 ${colours[word]} ${strong ? 'font-semibold' : ''}`}>
      <VerdictMark word={word} />
      <span>
        {words[word]}
        {reason ? <span className="text-soft">: {reason}</span> : null}
      </span>
    </span>
  )
}
