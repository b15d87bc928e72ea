'use client'

import Link from 'next/link'
import { usePathname } from 'next/navigation'

interface TabLinksProps {
  label: string
  links: readonly { label: string; href: string }[]
}

/** Pages of one place, side by side. */
export function TabLinks({ label, links }: TabLinksProps) {
  const path = usePathname()
  return (
    <nav aria-label={label} className="overflow-x-auto border-b border-rule">
      <ul className="m-0 flex list-none gap-1 p-0">
        {links.map(({ label, href }) => (
          <li key={href}>
            <Link
              prefetch={false}
              href={href}
              aria-current={path === href ? 'page' : undefined}
              className={`block border-b-2 px-2.5 py-1 whitespace-nowrap no-underline ${
                path === href ? 'border-accent font-semibold text-ink' : 'border-transparent text-ink hover:bg-tint'
              }`}
            >
              {label}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  )
}
