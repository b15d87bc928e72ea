'use client'

import { Button } from '@/lib/ui/button'

/** Something is broken on our side. What was typed is kept in the browser and comes back with the page. */
export default function Broken({ error, retry }: { error: Error & { digest?: string }; retry: () => void }) {
  return (
    <main className="mx-auto max-w-xl px-4 py-16" role="alert">
      <h1 className="m-0 mb-2 text-title font-semibold">This page could not be shown</h1>
      <p className="m-0 mb-3">
        Something went wrong on our side. Text that you had not saved is kept in this browser and will be there again:
        show the page again, and if it stays broken tell whoever runs this service
        {error.digest ? <> the number {error.digest}</> : null}.
      </p>
      <Button tone="main" onClick={retry}>
        Show the page again
      </Button>
    </main>
  )
}
