import { Anchored } from '@/app/(work)/_comments/anchored'
import type { KeptCheck } from '@/lib/server/revisions/kept-checks'

/** What reviewers always ask, asked before they do. */
export function PreIssueChecks({ checks }: { checks: readonly KeptCheck[] }) {
  if (checks.length === 0) return null
  const open = checks.filter(({ passed }) => !passed)
  const passed = checks.filter((check) => check.passed)
  return (
    <section aria-labelledby="checks">
      <h2 id="checks" className="m-0 mb-1 text-title font-semibold">
        Pre-issue checks
      </h2>
      <ul className="m-0 list-none border border-hair bg-sheet p-0">
        {open.map(({ id, sentence, issues }) => (
          <li key={id} className="border-b border-hair px-3 py-1.5">
            <details>
              <summary>
                <span className="font-semibold text-close">to answer</span>{' '}
                <Anchored on={`check/${id}`}>{sentence}</Anchored>
                {issues.length > 1 ? <span className="text-soft"> ({issues.length})</span> : null}
              </summary>
              <ul className="m-0 list-disc pl-8 text-dense text-soft">
                {issues.map(({ message }) => (
                  <li key={message}>{message}</li>
                ))}
              </ul>
            </details>
          </li>
        ))}
        <li className="px-3 py-1.5">
          <details>
            <summary>
              <span className="font-semibold text-meets">clear</span> {passed.length} of {checks.length} checks
            </summary>
            <ul className="m-0 list-disc pl-8 text-dense text-soft">
              {passed.map(({ id, sentence }) => (
                <li key={id}>{sentence}</li>
              ))}
            </ul>
          </details>
        </li>
      </ul>
    </section>
  )
}
