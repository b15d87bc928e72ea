import Link from 'next/link'
import type { ReactNode } from 'react'
import { seek } from '@/app/_action/ask'
import { signedIn } from '@/app/_action/signed-in'
import { Live, type LiveProps } from '@/app/(work)/_live/live'
import { unreadNotices } from '@/lib/server/reviews/queries'
import { PersonMenu } from './person-menu'
import { TitleBlock, type TitleCell } from './title-block'

interface PathStep {
  label: string
  href?: string
}

interface WorkFrameProps {
  path: readonly PathStep[]
  /** Left column; absent where there is only one place. */
  places?: ReactNode
  cells?: readonly TitleCell[]
  /** The page follows what happens in its project. */
  live?: LiveProps
  children: ReactNode
}

/** The sheet that all work is done on: path on top, places at the left, title block along the bottom. */
export async function WorkFrame({ path, places, cells, live, children }: WorkFrameProps) {
  const actor = await signedIn()
  return (
    <div className="flex min-h-dvh flex-col">
      <a
        href="#work"
        className="sr-only focus:not-sr-only focus:fixed focus:top-1 focus:left-1 focus:z-50 focus:bg-sheet focus:px-2 focus:py-1"
      >
        Skip to the work
      </a>
      <header className="flex items-center justify-between gap-3 border-b border-rule px-3 py-1">
        <nav aria-label="Path" className="min-w-0">
          <ol className="m-0 flex min-w-0 list-none flex-wrap items-center gap-x-1.5 p-0 text-dense">
            {path.map(({ label, href }, index) => (
              <li
                key={`${href}${label}`}
                className={`min-w-0 items-center gap-1.5 ${index < path.length - 2 ? 'hidden md:flex' : 'flex'}`}
              >
                {index > 0 ? (
                  <span aria-hidden="true" className="text-soft">
                    /
                  </span>
                ) : null}
                {href ? (
                  <Link prefetch={false} href={href} className="link truncate">
                    {label}
                  </Link>
                ) : (
                  <span aria-current="page" className="truncate font-semibold">
                    {label}
                  </span>
                )}
              </li>
            ))}
          </ol>
        </nav>
        <div className="flex shrink-0 items-center gap-3">
          {live ? <Live {...live} /> : null}
          <PersonMenu name={actor.name} unread={(await seek(unreadNotices, {})) ?? 0} />
        </div>
      </header>
      {actor.initialPassword ? (
        <p className="m-0 border-b border-close bg-sheet px-3 py-1.5">
          Your password was handed to you by somebody else:{' '}
          <Link prefetch={false} href="/profile" className="link">
            replace it with one of your own
          </Link>
          .
        </p>
      ) : null}
      <div className="flex min-w-0 flex-1 flex-col md:flex-row">
        {places ? (
          <div className="shrink-0 border-b border-hair md:w-44 md:border-r md:border-b-0 md:py-3">{places}</div>
        ) : null}
        <main id="work" className="min-w-0 flex-1 px-3 py-4 md:px-5">
          {children}
        </main>
      </div>
      {cells ? <TitleBlock cells={cells} /> : null}
    </div>
  )
}
