import type { Metadata } from 'next'
import { NewPasswordForm } from './new-password-form'

export const metadata: Metadata = { title: 'New password', referrer: 'no-referrer', robots: { index: false } }

export default async function NewPasswordPage({ params }: PageProps<'/new-password/[token]'>) {
  const { token } = await params
  return (
    <main className="mx-auto flex min-h-dvh max-w-sm flex-col justify-center gap-4 px-4 py-10">
      <h1 className="m-0 text-title font-semibold">Choose a new password</h1>
      <p className="m-0">Every session of yours ends with it.</p>
      <NewPasswordForm token={token} />
    </main>
  )
}
