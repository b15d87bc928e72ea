import type { Metadata } from 'next'
import Link from 'next/link'
import { byLink } from '@/app/_action/by-link'
import { signOffWords } from '@/app/_words/state-words'
import { openShare } from '@/lib/server/share/open-share'
import { Button } from '@/lib/ui/button'
import { Labelled } from '@/lib/ui/labelled'
import { Moment } from '@/lib/ui/moment'
import { Notice } from '@/lib/ui/notice'
import { isRefusal, refusals } from './refusals'
import { ShareStanding } from './share-standing'

export const metadata: Metadata = { title: 'Shared report', referrer: 'no-referrer', robots: { index: false } }

export default async function SharePage({ params, searchParams }: PageProps<'/share/[token]'>) {
  const { token } = await params
  const { refused } = await searchParams
  const shared = await byLink(() => openShare(token))
  const { organisation, title, documentNumber, number, signers, report, recipient, expiresAt } = shared
  const { downloadsLeft, asksPassphrase } = shared
  return (
    <main className="mx-auto flex min-h-dvh max-w-2xl flex-col justify-center gap-4 px-4 py-10">
      <div>
        <h1 className="m-0 text-title font-semibold">{title}</h1>
        <p className="m-0 text-soft">
          {documentNumber}, revision {number}. {organisation} shares it with {recipient}.
        </p>
      </div>
      <ShareStanding shared={shared} />
      {signers.length > 0 ? (
        <ul aria-label="Signed by" className="m-0 list-none p-0">
          {signers.map(({ role, person, at }) => (
            <li key={role}>
              {signOffWords[role]}: {person}, <Moment at={at} />
            </li>
          ))}
        </ul>
      ) : null}
      {isRefusal(refused) ? <Notice tone="bad">{refusals[refused]}</Notice> : null}
      {downloadsLeft === 0 ? (
        <Notice tone="caution">{refusals.used}</Notice>
      ) : (
        <form method="post" action={`/share/${token}/file`} className="flex max-w-sm flex-col gap-3">
          {asksPassphrase ? (
            <Labelled label="Passphrase">
              {(control) => (
                <input
                  {...control}
                  className="control"
                  name="passphrase"
                  type="password"
                  autoComplete="off"
                  maxLength={128}
                  required
                />
              )}
            </Labelled>
          ) : null}
          <div>
            <Button type="submit" tone="main">
              Download report
            </Button>
          </div>
        </form>
      )}
      <p className="m-0 text-dense text-soft">
        This link works until <Moment at={expiresAt} />
        {downloadsLeft === null ? '' : `; downloads left: ${downloadsLeft}`}. Each download is logged.
      </p>
      {report ? (
        <p className="m-0 text-dense break-all">
          <span className="text-soft">PDF, {report.pages} pages, SHA-256 </span>
          {report.sha256}
        </p>
      ) : null}
      <p className="m-0 text-dense">
        <Link prefetch={false} className="link" href="/verify">
          Verify a report
        </Link>{' '}
        checks the signatures in the file and recomputes its numbers, without an account.
      </p>
      <p className="m-0 border-t border-hair pt-3 text-label text-soft">
        The report supports the judgement of a licensed engineer and never replaces it. Local codes, the utility’s
        written acceptance and the maker’s data prevail.
      </p>
    </main>
  )
}
