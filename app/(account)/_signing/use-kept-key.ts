'use client'

import { useEffect, useState } from 'react'
import type { KeyFile } from './key-file'
import { findKeyFile } from './key-store'

/** The wrapped key of a public key from this browser's storage: undefined while looking, null if it is not there. */
export function useKeptKey(spki: string | null): [KeyFile | null | undefined, (file: KeyFile) => void] {
  const [file, setFile] = useState<KeyFile | null | undefined>(undefined)
  useEffect(() => {
    let current = true
    const look = async () => (spki === null ? null : ((await findKeyFile(spki)) ?? null))
    look()
      // Storage can be switched off altogether: then the key is simply not here.
      .catch(() => null)
      .then((found) => current && setFile(found))
    return () => {
      current = false
    }
  }, [spki])
  return [file, setFile]
}
