'use client'

import { useState } from 'react'
import { Button } from './button'
import { Labelled } from './labelled'

/** A link that is shown this once, to be copied and sent. */
export function LinkOnce({ label, link }: { label: string; link: string }) {
  const [copied, setCopied] = useState<boolean | null>(null)
  const copy = async () => {
    const done = await navigator.clipboard?.writeText(link).then(
      () => true,
      () => false,
    )
    setCopied(done ?? false)
  }
  return (
    <div className="flex max-w-2xl flex-wrap items-end gap-2">
      <div className="min-w-0 flex-1 basis-72">
        <Labelled label={label} hint="Shown this once: it is not kept here.">
          {(control) => (
            <input {...control} className="control" readOnly value={link} onFocus={(event) => event.target.select()} />
          )}
        </Labelled>
      </div>
      <Button onClick={copy} className="mb-5">
        Copy link
      </Button>
      <span role="status" className="mb-5 text-soft">
        {copied === true ? 'Copied.' : copied === false ? 'Not copied: mark the link and copy it by hand.' : ''}
      </span>
    </div>
  )
}
