import type { Metadata } from 'next'
import Link from 'next/link'
import { AskForLink } from './ask-for-link'

export const metadata: Metadata = { title: 'New password' }

export default function ForgottenPasswordPage() {
  return (
    <main className="mx-auto flex min-h-dvh max-w-sm flex-col justify-center gap-4 px-4 py-10">
      <h1 className="m-0 text-title font-semibold">Choose a new password</h1>
      <p className="m-0">A link to choose one is sent to the address of your account.</p>
      <AskForLink />
      <p className="m-0">
        <Link prefetch={false} className="link" href="/sign-in">
          Back to signing in
        </Link>
      </p>
    </main>
  )
}
