import Link from 'next/link'

export default function NotFound() {
  return (
    <main className="mx-auto max-w-xl px-4 py-16">
      <h1 className="m-0 mb-2 text-title font-semibold">This page is not there</h1>
      <p className="m-0">
        Nothing is kept under this address, or it is not shared with you: check the address, ask whoever sent it, or go
        to{' '}
        <Link prefetch={false} href="/projects" className="link">
          your projects
        </Link>
        .
      </p>
    </main>
  )
}
