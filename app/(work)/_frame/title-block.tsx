import type { ReactNode } from 'react'

export interface TitleCell {
  label: string
  value: ReactNode
  /** Part of the width, as on a drawing. */
  wide?: boolean
}

/** The block along the bottom of a drawing; on a narrow screen one line that opens. */
export function TitleBlock({ cells }: { cells: readonly TitleCell[] }) {
  const [first, second, third, fourth] = cells
  return (
    <section aria-label="Title block" className="sticky bottom-0 z-10 border-t-2 border-ink bg-sheet text-dense">
      <dl className="m-0 hidden md:flex">
        {cells.map(({ label, value, wide }) => (
          <div
            key={label}
            className={`min-w-0 border-l border-rule px-2.5 py-1 first:border-l-0 ${wide ? 'flex-[3]' : 'flex-1'}`}
          >
            <dt className="text-[0.6875rem] leading-3.5 text-soft">{label}</dt>
            <dd className="m-0 truncate font-semibold">{value}</dd>
          </div>
        ))}
      </dl>
      <details className="md:hidden">
        <summary className="truncate px-3 py-1.5">
          <span className="font-semibold">{first?.value}</span> · {third?.label.toLowerCase()} {third?.value} ·{' '}
          {fourth?.value}
        </summary>
        <dl className="m-0 grid grid-cols-2 gap-x-3 gap-y-1 px-3 pb-2">
          {[first, second, ...cells.slice(2)].map((cell) =>
            cell ? (
              <div key={cell.label} className={cell.wide ? 'col-span-2' : ''}>
                <dt className="text-[0.6875rem] leading-3.5 text-soft">{cell.label}</dt>
                <dd className="m-0 font-semibold break-words">{cell.value}</dd>
              </div>
            ) : null,
          )}
        </dl>
      </details>
    </section>
  )
}
