import { type NextRequest, NextResponse } from 'next/server'

const contentSecurityPolicy = (nonce: string, development: boolean): string =>
  [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${development ? " 'unsafe-eval'" : ''}`,
    // The development tools inject style elements without a nonce.
    development ? "style-src 'self' 'unsafe-inline'" : `style-src 'self' 'nonce-${nonce}'`,
    // Attributes written by the server's own rendering; they cannot run anything.
    "style-src-attr 'unsafe-inline'",
    "img-src 'self' blob: data:",
    "font-src 'self'",
    `connect-src 'self'${development ? ' ws:' : ''}`,
    "worker-src 'self' blob:",
    "object-src 'none'",
    "base-uri 'self'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ')

/** Gives each page a nonce of its own: scripts without it do not run. The framework reads it from the request's header. */
export function proxy(request: NextRequest) {
  const nonce = btoa(String.fromCharCode(...crypto.getRandomValues(new Uint8Array(16))))
  const policy = contentSecurityPolicy(nonce, process.env.NODE_ENV === 'development')
  const headers = new Headers(request.headers)
  headers.set('x-nonce', nonce)
  // Where to come back to after signing in; a page does not know its own address.
  headers.set('x-path', request.nextUrl.pathname + request.nextUrl.search)
  headers.set('content-security-policy', policy)
  const response = NextResponse.next({ request: { headers } })
  response.headers.set('content-security-policy', policy)
  return response
}

// Uploads and the interface for programs stay outside: a matched request has its body held in memory and cut.
export const config = { matcher: [{ source: '/((?!api|_next/static|_next/image).*)' }] }
