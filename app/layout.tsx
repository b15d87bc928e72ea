import type { Metadata, Viewport } from 'next'
import localFont from 'next/font/local'
import { headers } from 'next/headers'
import type { ReactNode } from 'react'
import { StyleNonce } from '@/lib/ui/style-nonce'
import './globals.css'

const sourceSans = localFont({
  src: '../node_modules/source-sans/WOFF2/VF/SourceSans3VF-Upright.otf.woff2',
  variable: '--font-source-sans',
  weight: '200 900',
  display: 'swap',
})

export const metadata: Metadata = {
  title: { default: 'Breakaway', template: '%s · Breakaway' },
  description: 'Motor-starting studies on weak supplies, from plant records to the signed report.',
  icons: {
    icon: "data:image/svg+xml,%3Csvg xmlns='http://www.w3.org/2000/svg' viewBox='0 0 16 16'%3E%3Crect width='16' height='16' fill='%230B5A63'/%3E%3Cpath d='M2 4h3l2 8 3-6 4 2' fill='none' stroke='white' stroke-width='1.6'/%3E%3C/svg%3E",
  },
}

export const viewport: Viewport = { width: 'device-width', initialScale: 1, colorScheme: 'light dark' }

/** Reading the nonce makes every page dynamic, as the content security policy needs. */
export default async function RootLayout({ children }: { children: ReactNode }) {
  const nonce = (await headers()).get('x-nonce') ?? undefined
  return (
    <html lang="en" className={sourceSans.variable}>
      <body>
        <StyleNonce nonce={nonce}>{children}</StyleNonce>
      </body>
    </html>
  )
}
