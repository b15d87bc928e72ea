import { type ProvenanceKind, provenanceMark } from '@/lib/quantity/provenance'

/** Drawn rather than set in type, so that the shapes do not depend on the reader's fonts. */
function Shape({ kind }: { kind: ProvenanceKind }) {
  if (kind === 'derived' || kind === 'assumed') return <>{provenanceMark[kind].mark}</>
  return (
    <svg viewBox="0 0 10 10" className="inline-block size-2.5 align-[-0.5px]" aria-hidden="true">
      <rect
        x="0.6"
        y="0.6"
        width="8.8"
        height="8.8"
        fill={kind === 'test' ? 'currentColor' : 'none'}
        stroke="currentColor"
      />
      {kind === 'guaranteed' && <rect x="2.8" y="2.8" width="4.4" height="4.4" fill="currentColor" />}
      {kind === 'typical' && <path d="M1 3.5h8M1 6.5h8" stroke="currentColor" strokeWidth="1.2" />}
    </svg>
  )
}

/** The mark before a value that says where it came from; a value without a source shows a gap of the same width. */
export function ProvenanceMark({ kind, source }: { kind: ProvenanceKind | null; source?: string }) {
  if (!kind) return <span className="inline-block w-4.5 shrink-0" aria-hidden="true" />
  const words = source ? `${provenanceMark[kind].meaning}: ${source}` : provenanceMark[kind].meaning
  return (
    <span className="inline-block w-4.5 shrink-0 text-left text-soft" title={words} role="img" aria-label={words}>
      <Shape kind={kind} />
    </span>
  )
}

/** What the marks mean, below a table that uses them. */
export function ProvenanceLegend() {
  const kinds: ProvenanceKind[] = ['test', 'guaranteed', 'typical', 'derived', 'assumed']
  return (
    <p className="m-0 flex flex-wrap gap-x-4 gap-y-0.5 text-label text-soft">
      {kinds.map((kind) => (
        <span key={kind}>
          <span className="inline-block w-3.5" aria-hidden="true">
            <Shape kind={kind} />
          </span>
          {provenanceMark[kind].meaning}
        </span>
      ))}
      <span>no mark: source not stated</span>
    </p>
  )
}
