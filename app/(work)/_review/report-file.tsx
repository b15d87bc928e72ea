import Link from 'next/link'
import { formatNumber } from '@/lib/quantity/format-number'
import type { RevisionView } from '@/lib/server/revisions/view'
import { buttonLook } from '@/lib/ui/button'
import { Notice } from '@/lib/ui/notice'
import { RefreshWhile } from './refresh-while'

const size = (bytes: number): string =>
  bytes < 1e6
    ? `${formatNumber(bytes / 1e3, { decimals: 0 })}\u2009kB`
    : `${formatNumber(bytes / 1e6, { decimals: 1 })}\u2009MB`

/** The report of a revision: whether it is rendered, where to download it, and its hash. */
export function ReportFile({ revision, href }: { revision: RevisionView; href: string }) {
  const { report, renderState, renderFailure, state } = revision
  const waiting = renderState === 'queued' || renderState === 'running'
  return (
    <section aria-labelledby="report" className="flex flex-col gap-2">
      <h2 id="report" className="m-0 text-title font-semibold">
        Report
      </h2>
      <RefreshWhile waiting={waiting} />
      {waiting ? <Notice>The report is being rendered; this page shows it as soon as it is there.</Notice> : null}
      {renderState === 'failed' ? (
        <Notice tone="bad">
          {renderFailure ?? 'The report could not be rendered: tell whoever runs this service.'}
        </Notice>
      ) : null}
      {report ? (
        <>
          <div className="flex flex-wrap items-center gap-3">
            <a className={buttonLook(state === 'issued' ? 'main' : 'plain')} href={href} download>
              Download report
            </a>
            <span className="text-soft">
              PDF, {report.pages} pages, {size(report.bytes)}
              {state === 'issued' || state === 'superseded' || state === 'withdrawn' ? ', as signed' : ', not issued'}
            </span>
          </div>
          <p className="m-0 text-dense break-all">
            <span className="text-soft">SHA-256 </span>
            {report.sha256}
          </p>
          <p className="m-0 text-dense text-soft">
            The study’s own data is attached to the file.{' '}
            <Link prefetch={false} href="/verify" className="link">
              Verify a report
            </Link>{' '}
            checks signatures and recomputes the numbers in your browser.
          </p>
        </>
      ) : waiting ? null : (
        <p className="m-0 text-soft">No report has been rendered for this revision yet.</p>
      )}
    </section>
  )
}
