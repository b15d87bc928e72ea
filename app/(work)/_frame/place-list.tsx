'use client'

import Link from 'next/link'
import { usePathname } from 'next/navigation'
import type { Place } from './places'

/** The column of places; on a narrow screen a row that scrolls. */
export function PlaceList({ label, places }: { label: string; places: readonly Place[] }) {
  const path = usePathname()
  return (
    <nav aria-label={label} className="overflow-x-auto">
      <ul className="m-0 flex list-none gap-1 p-0 md:flex-col md:gap-0">
        {places.map(({ label, href, within, count }) => {
          const base = within ?? href
          const here = path === base || path.startsWith(`${base}/`)
          return (
            <li key={href}>
              <Link
                prefetch={false}
                href={href}
                aria-current={here ? 'page' : undefined}
                className={`block border-b-2 px-3 py-1.5 whitespace-nowrap no-underline md:border-b-0 md:border-l-4 ${
                  here ? 'border-accent bg-sheet font-semibold text-ink' : 'border-transparent text-ink hover:bg-tint'
                }`}
              >
                {label}
                {count === undefined ? null : <span className="font-normal text-soft"> {count}</span>}
              </Link>
            </li>
          )
        })}
      </ul>
    </nav>
  )
}
