import type { Metadata } from 'next'
import { VerifyUpload } from './verify-upload'

export const metadata: Metadata = { title: 'Verify a report' }

/** Anybody can check a report here, without an account. */
export default function VerifyPage() {
  return (
    <main className="mx-auto grid max-w-4xl gap-5 px-4 py-6">
      <header className="grid gap-2">
        <h1 className="m-0 text-title font-semibold">Verify a report</h1>
        <p className="m-0 max-w-2xl text-soft">
          Drop a signed study report to see who signed it, whether anything was changed since, and whether its revision
          is still in force. The file is checked and not kept.
        </p>
      </header>
      <VerifyUpload />
      <footer className="max-w-2xl text-dense text-soft">
        A valid file shows that these people of the organisation signed exactly these bytes. It is not a qualified
        electronic signature, not a professional seal, and says nothing about whether the study suits your case: that
        stays the judgement of a licensed engineer under your local codes.
      </footer>
    </main>
  )
}
