'use client'

import { Button } from '@/lib/ui/button'
import { Notice } from '@/lib/ui/notice'
import { saveFile } from '../_signing/save-file'

/** Codes for the day on which the authenticator app is lost; shown this once. */
export function RecoveryCodes({ codes }: { codes: readonly string[] }) {
  const save = () =>
    saveFile('recovery-codes.txt', `Recovery codes for Breakaway, each for one sign-in:\n${codes.join('\n')}\n`)
  return (
    <div className="flex flex-col gap-2">
      <Notice tone="caution">
        Keep these recovery codes apart from the app: each opens the account once, and they are not shown again. Codes
        made earlier no longer work.
      </Notice>
      <ul aria-label="Recovery codes" className="m-0 grid max-w-sm list-none grid-cols-2 gap-x-4 p-0 font-semibold">
        {codes.map((code) => (
          <li key={code}>{code}</li>
        ))}
      </ul>
      <div>
        <Button onClick={save}>Save codes as a file</Button>
      </div>
    </div>
  )
}
