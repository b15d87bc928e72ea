/** Work with a known number of steps; `label` says what is being done. */
export function ProgressBar({ label, done, of }: { label: string; done: number; of: number }) {
  const share = of > 0 ? Math.min(1, done / of) : 0
  return (
    <div>
      <p className="m-0 mb-1 text-dense text-soft">{label}</p>
      <div
        role="progressbar"
        aria-label={label}
        aria-valuemin={0}
        aria-valuemax={of}
        aria-valuenow={done}
        className="h-2 border border-rule bg-sheet"
      >
        <div className="h-full bg-accent" style={{ width: `${share * 100}%` }} />
      </div>
    </div>
  )
}
