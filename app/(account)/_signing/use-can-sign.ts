'use client'

import { useSyncExternalStore } from 'react'

const never = () => () => undefined

/** Whether this page may use the browser's cryptography, which exists on this computer's own address and over HTTPS only. */
export function useCanSign(): boolean {
  return useSyncExternalStore(
    never,
    () => window.isSecureContext && 'indexedDB' in window,
    () => true,
  )
}
