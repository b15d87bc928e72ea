'use client'

import { CSPProvider } from '@base-ui/react/csp-provider'
import type { ReactNode } from 'react'

/** Hands the page's nonce to the components that add a style element of their own. */
export function StyleNonce({ nonce, children }: { nonce: string | undefined; children: ReactNode }) {
  return <CSPProvider nonce={nonce}>{children}</CSPProvider>
}
