import type { Metadata } from 'next'
import Link from 'next/link'
import { SignInForm } from './sign-in-form'

export const metadata: Metadata = { title: 'Sign in' }

export default async function SignInPage({ searchParams }: PageProps<'/sign-in'>) {
  const { then } = await searchParams
  return (
    <main className="mx-auto flex min-h-dvh max-w-sm flex-col justify-center gap-5 px-4 py-10">
      <div>
        <h1 className="m-0 text-[1.75rem] leading-9 font-semibold">Breakaway</h1>
        <p className="m-0 text-soft">
          Motor-starting studies on weak supplies, from plant records to the signed report.
        </p>
      </div>
      {typeof then === 'string' && then !== 'close' && then !== '/projects' ? (
        <p className="m-0">Sign in to go on where you were. Text that was not saved is kept in this browser.</p>
      ) : null}
      <SignInForm then={typeof then === 'string' ? then : null} />
      <p className="m-0">
        <Link prefetch={false} href="/new-password" className="link">
          Forgot the password
        </Link>
      </p>
      <p className="m-0 border-t border-hair pt-3 text-label text-soft">
        This service supports the judgement of a licensed engineer and never replaces it. Local codes, the utility’s
        written acceptance and the maker’s data prevail.
      </p>
    </main>
  )
}
